import { TestBed } from '@angular/core/testing';
import type { PlanPath } from '#contracts';
import type { Machine, Rack } from '#engine';
import { TablePlan } from './table-plan';

const MACHINE = {
  travel: { x: [0, 1300], y: [0, 2650], z: [-220, 0] },
  zones: [],
} as unknown as Machine;
const RACK = {
  fork: { width: 60, reach: 20, thickness: 8, below: 7 },
  bodies: [],
  pockets: [{ number: 1, grip: { x: 100, y: 2560, z: -125 }, opens: '-y' }],
} as unknown as Rack;
const PATH: PlanPath = {
  tolerance: 0.1,
  truncated: true,
  runs: [
    { tool: 4, kind: 'rapid', fromLine: 5, points: [0, 0, 400, 300] },
    { tool: 4, kind: 'feed', fromLine: 9, points: [400, 300, 500, 300] },
    { tool: 7, kind: 'feed', fromLine: 20, points: [900, 900, 950, 900] },
  ],
};

async function show(inputs: Record<string, unknown> = {}) {
  const fixture = TestBed.createComponent(TablePlan);
  const all = {
    machine: MACHINE,
    rack: RACK,
    work: { G54: { x: 30, y: 40 } },
    path: PATH,
    ...inputs,
  };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return { fixture, host: fixture.nativeElement as HTMLElement };
}

test('draws a path for each tool and kind, and names the tools', async () => {
  const { host } = await show();
  expect(host.querySelectorAll('.path')).toHaveLength(3);
  const legend = [...host.querySelectorAll('.legend button')].map((each) =>
    each.textContent.trim(),
  );
  expect(legend).toEqual(['T4', 'T7']);
});

test('a spindle without a tool, or with one nobody knows, has no tool number', async () => {
  const runs = [null, 0].map((tool, index) => ({ ...PATH.runs[1]!, tool, fromLine: index + 1 }));
  const { host } = await show({ path: { ...PATH, runs } });
  const legend = [...host.querySelectorAll('.legend button')].map((each) =>
    each.textContent.trim(),
  );
  expect(legend).toEqual(['spindle as found', 'no tool']);
});

test('says in a table what it draws, in the person’s unit', async () => {
  const { host } = await show({ units: 'inch' });
  const row = host.querySelector('tbody tr')!.textContent;
  expect(row).toContain('T4');
  // 400 mm / 25.4
  expect(row).toContain('15.74803 in');
});

test('says that a cut-off path is not all of it', async () => {
  const { host } = await show();
  expect(host.textContent).toContain('its end is not drawn');
});

test('a tool can be shown alone, and all again', async () => {
  const { fixture, host } = await show();
  const button = host.querySelector<HTMLButtonElement>('.legend button')!;
  button.click();
  await fixture.whenStable();
  expect(button.getAttribute('aria-pressed')).toBe('true');
  expect(host.querySelectorAll('.path.back')).toHaveLength(1);
  button.click();
  await fixture.whenStable();
  expect(host.querySelectorAll('.path.back')).toHaveLength(0);
});

test('marks the place a finding speaks of, in words', async () => {
  const mark = { line: 9, severity: 'stop', words: '34.2 mm past travel', axis: 'x', at: 500 };
  const { host } = await show({ mark });
  expect(host.querySelector('.mark')!.textContent).toContain('34.2 mm past travel');
  expect(host.querySelector('.marked.stop')).not.toBeNull();
});

test('zooms by its buttons and keys, and shows all again', async () => {
  const { fixture, host } = await show();
  const moved = () => host.querySelector('svg > g')!.getAttribute('transform');
  const before = moved();
  host.querySelector<HTMLButtonElement>('[aria-label="Zoom in"]')!.click();
  await fixture.whenStable();
  expect(moved()).toContain('scale(1.5)');
  const frame = host.querySelector('.frame')!;
  frame.dispatchEvent(new KeyboardEvent('keydown', { key: '0' }));
  await fixture.whenStable();
  expect(moved()).toBe(before);
});
