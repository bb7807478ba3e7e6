import type { CheckProgress } from '#contracts';
import { CHECK, EAST, aCheck } from '../testing/records';
import {
  countNeedingSomeone,
  newestEach,
  partChecks,
  percentRead,
  withProgress,
} from './bench-lists';

const other = '00000000-0000-4000-8000-0000000000d2';

describe('newestEach', () => {
  it('keeps the newest check of a program on each machine', () => {
    const checks = [aCheck(), aCheck({ id: other }), aCheck({ id: other, machineId: EAST })];
    expect(newestEach(checks)).toEqual([checks[0], checks[2]]);
  });
});

describe('partChecks', () => {
  it('parts checks by what they ask of a person', () => {
    const on = (machineId: string, change: Parameters<typeof aCheck>[0]) =>
      aCheck({ machineId, ...change });
    const lists = partChecks([
      on('1', { state: 'queued', verdict: null }),
      on('2', { state: 'running', verdict: null }),
      on('3', { state: 'failed', verdict: null }),
      on('4', { verdict: 'stopped' }),
      on('5', { verdict: 'held' }),
      on('6', { verdict: 'clear' }),
      on('7', { verdict: 'clear', outOfDate: true }),
    ]);
    const machines = (checks: readonly { machineId: string }[]) =>
      checks.map((check) => check.machineId).join(' ');
    expect(machines(lists.running)).toBe('1 2');
    expect(machines(lists.failed)).toBe('3');
    expect(machines(lists.stopped)).toBe('4');
    expect(machines(lists.held)).toBe('5');
    expect(machines(lists.clear)).toBe('6');
    expect(machines(lists.outOfDate)).toBe('7');
  });
});

describe('withProgress', () => {
  const said = (change: Partial<CheckProgress>): ReadonlyMap<string, CheckProgress> =>
    new Map([
      [
        CHECK,
        { checkId: CHECK, state: 'running', linesRead: 40, lines: 80, verdict: null, ...change },
      ],
    ]);
  const running = aCheck({ state: 'running', linesRead: 20, verdict: null });

  it('lays newer word over the list', () => {
    expect(withProgress([running], said({}))[0]?.linesRead).toBe(40);
  });
  it('never goes back from done to running', () => {
    const done = aCheck({ verdict: 'stopped' });
    expect(withProgress([done], said({}))).toEqual([done]);
  });
  it('never goes back in lines', () => {
    expect(withProgress([running], said({ linesRead: 10 }))).toEqual([running]);
  });
  it('keeps the known number of lines when the event has none', () => {
    expect(withProgress([running], said({ lines: 0 }))[0]?.lines).toBe(80);
  });
});

describe('percentRead', () => {
  it.each([
    [0, 0, 0],
    [1, 3, 33],
    [3, 3, 100],
    [4, 3, 100],
  ])('says %i of %i lines is %i per cent', (linesRead, lines, percent) => {
    expect(percentRead({ linesRead, lines })).toBe(percent);
  });
});

describe('countNeedingSomeone', () => {
  it('counts a check once that is stopped and out of date, and none that is clear', () => {
    const lists = partChecks([
      aCheck({ machineId: '1', verdict: 'stopped', outOfDate: true }),
      aCheck({ machineId: '2', verdict: 'held' }),
      aCheck({ machineId: '3', state: 'failed', verdict: null }),
      aCheck({ machineId: '4', verdict: 'clear' }),
      aCheck({ machineId: '5', state: 'running', verdict: null }),
    ]);
    expect(countNeedingSomeone(lists)).toBe(3);
  });
});
