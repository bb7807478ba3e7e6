import { TestBed } from '@angular/core/testing';
import type { Loading, Rack, Tool } from '#engine';
import { RackStrip } from './rack-strip';

const RACK: Rack = {
  name: 'back edge',
  edge: 'back',
  slideOut: 60,
  gripTolerance: { xy: 0.2, z: 0.5 },
  fork: { width: 60, reach: 20, thickness: 8, below: 7 },
  bodies: [],
  pockets: [1, 2].map((number) => ({
    number,
    grip: { x: number * 150, y: 2560, z: -125 },
    opens: '-y',
    largestDiameter: 50,
    longest: 190,
    taper: 'ISO30',
    kind: 'fork',
  })),
};
const TOOL: Tool = {
  number: 4,
  name: '6 mm compression',
  kind: 'compression',
  diameter: 6.35,
  shank: 6.35,
  stickOut: 40,
  fluteLength: 22,
  gaugeLength: 92.4,
  holder: { taper: 'ISO30', diameter: 50, above: 72, steps: [] },
  maxRpm: 24000,
  turns: 'cw',
  used: 0,
  measured: null,
  touched: null,
  sisterOf: null,
};
const LOADING: Loading = { pockets: [{ pocket: 1, tool: 4 }], inSpindle: null, byHand: [] };

async function show(inputs: Record<string, unknown> = {}) {
  const fixture = TestBed.createComponent(RackStrip);
  const all = { rack: RACK, loading: LOADING, tools: [TOOL], ...inputs };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  const host = fixture.nativeElement as HTMLElement;
  return { fixture, host, slots: [...host.querySelectorAll<SVGGElement>('.slot')] };
}

test('draws every pocket and says the same in a table', async () => {
  const { host, slots } = await show({ units: 'inch' });
  expect(slots.map((slot) => slot.getAttribute('aria-label'))).toEqual([
    'Pocket 1: T4, 6 mm compression.',
    'Pocket 2: empty.',
  ]);
  const rows = [...host.querySelectorAll('tbody tr')].map((row) => row.textContent);
  expect(rows).toHaveLength(2);
  expect(rows[0]).toContain('0.25 in');
});

test('marks are written out beside their colour', async () => {
  const { slots } = await show({ marks: [{ tool: 4, severity: 'stop', word: 'too wide' }] });
  expect(slots[0]!.textContent).toContain('too wide');
  expect(slots[0]!.classList).toContain('stop');
});

test('tells which pocket has the focus, and that it left', async () => {
  const { fixture, slots } = await show();
  const seen: (number | null)[] = [];
  fixture.componentInstance.pocketFocused.subscribe((pocket) => seen.push(pocket));
  slots[0]!.dispatchEvent(new FocusEvent('focus'));
  slots[0]!.dispatchEvent(new FocusEvent('blur'));
  expect(seen).toEqual([1, null]);
});

test('a pocket can be chosen by click and by key only where that does something', async () => {
  const { fixture, slots } = await show();
  const chosen: number[] = [];
  fixture.componentInstance.pocketChosen.subscribe((pocket) => chosen.push(pocket));
  slots[1]!.dispatchEvent(new MouseEvent('click'));
  expect(chosen).toEqual([]);

  fixture.componentRef.setInput('canChoose', true);
  await fixture.whenStable();
  expect(slots[1]!.getAttribute('role')).toBe('button');
  slots[1]!.dispatchEvent(new MouseEvent('click'));
  slots[0]!.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
  expect(chosen).toEqual([2, 1]);
});
