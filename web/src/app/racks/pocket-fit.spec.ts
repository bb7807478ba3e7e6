import type { Pocket, Rack, Tool } from '#engine';
import { wordMisfit } from './misfit-words';
import { findMisfits } from './pocket-fit';

const pocket = (number: number, x: number): Pocket => ({
  number,
  grip: { x, y: 0, z: 0 },
  opens: '-y',
  largestDiameter: 80,
  longest: 150,
  taper: 'ISO30',
  kind: 'fork',
  heaviest: 3,
});
const RACK: Rack = {
  name: 'back',
  edge: 'back',
  slideOut: 60,
  gripTolerance: { xy: 0.2, z: 0.5 },
  fork: { width: 60, reach: 20, thickness: 8, below: 7 },
  bodies: [],
  pockets: [pocket(1, 0), pocket(2, 70)],
};
const tool = (number: number, change: Partial<Tool> = {}): Tool => ({
  number,
  name: `tool ${number}`,
  kind: 'end-mill',
  diameter: 12.7,
  shank: 12.7,
  stickOut: 40,
  fluteLength: 22,
  gaugeLength: 92,
  holder: { taper: 'ISO30', diameter: 50, above: 72, steps: [] },
  maxRpm: 24000,
  turns: 'cw',
  used: 0,
  measured: null,
  touched: null,
  sisterOf: null,
  ...change,
});

function misfits(candidate: Tool, neighbour = tool(9)) {
  return findMisfits(candidate, RACK.pockets[0]!, {
    rack: RACK,
    loading: { pockets: [{ pocket: 2, tool: 9 }], inSpindle: null, byHand: [] },
    tools: new Map([[9, neighbour]]),
  });
}

describe('a tool against a pocket', () => {
  it('fits with nothing said, however its taper is written', () => {
    expect(misfits(tool(4))).toEqual([]);
    const lower = tool(4, { holder: { taper: 'iso 30', diameter: 50, above: 72, steps: [] } });
    expect(misfits(lower)).toEqual([]);
  });
  it('exactly at a limit still fits', () => {
    expect(misfits(tool(4, { gaugeLength: 150, mass: 3 }))).toEqual([]);
  });
  it('is refused for another taper family', () => {
    const [found] = misfits(
      tool(4, { holder: { taper: 'BT30', diameter: 46, above: 72, steps: [] } }),
    );
    expect(found?.severity).toBe('refused');
    expect(wordMisfit(found!, 'mm')).toBe('Its holder is BT30, pocket 1 is cut for ISO30.');
  });
  it('is too wide, too long or too heavy with the figures in the person’s unit', () => {
    const found = misfits(tool(4, { diameter: 88.9, gaugeLength: 165.1, mass: 3.5 }), tool(4));
    expect(found.map((each) => wordMisfit(each, 'inch')).slice(0, 3)).toEqual([
      'Too wide: 3.5 in, and the pocket takes 3.14961 in.',
      'Too long: 6.5 in, and the pocket takes 5.90551 in.',
      'Heavy: 3.5 kg, and the pocket carries 3 kg.',
    ]);
  });
  it('meets a neighbour that stands too near', () => {
    // Two 3 in (76.2 mm) cutters side by side touch below a pitch of 76.2 mm: sum of the radii.
    const [found] = misfits(tool(4, { diameter: 76.2 }), tool(9, { diameter: 76.2 }));
    expect(found).toMatchObject({
      severity: 'stop',
      what: 'neighbour',
      data: { is: 76.2, limit: 70 },
    });
    // 76.2 beside a 50 mm holder needs 63.1 between the axes and fits 70.
    expect(misfits(tool(4, { diameter: 76.2 }))).toEqual([]);
  });
});
