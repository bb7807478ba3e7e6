import type { Loading, Opening, Rack, Tool } from '#engine';
import { layOutRack, mouthOf, orderPockets, type RackToDraw } from './lay-out-rack';

function rack(edge: Rack['edge'], places: [number, number, number, Opening][]): Rack {
  return {
    name: edge,
    edge,
    slideOut: 60,
    gripTolerance: { xy: 0.2, z: 0.5 },
    fork: { width: 60, reach: 20, thickness: 8, below: 7 },
    bodies: [],
    pockets: places.map(([number, x, y, opens]) => ({
      number,
      grip: { x, y, z: -125 },
      opens,
      largestDiameter: 50,
      longest: 190,
      taper: 'ISO30',
      kind: 'fork',
    })),
  };
}
function tool(number: number, more: Partial<Tool> = {}): Tool {
  return {
    number,
    name: `tool ${number}`,
    kind: 'upcut',
    diameter: 6,
    shank: 6,
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
    ...more,
  };
}
const BACK = rack('back', [
  [2, 250, 2560, '-y'],
  [1, 100, 2560, '-y'],
  [3, 400, 2560, '-y'],
]);
function draw(change: Partial<RackToDraw> & { loaded?: Partial<Loading> }) {
  const { loaded, ...rest } = change;
  return layOutRack({
    rack: BACK,
    loading: {
      pockets: [
        { pocket: 1, tool: 4 },
        { pocket: 3, tool: 7 },
      ],
      inSpindle: null,
      byHand: [],
      ...loaded,
    },
    tools: [tool(4), tool(7), tool(9)],
    callOrder: [],
    marks: [],
    available: 1000,
    ...rest,
  });
}

describe('the order in which pockets stand', () => {
  test('a back rack goes left to right by x, whatever the pocket numbers', () => {
    expect(orderPockets(BACK).map((pocket) => pocket.number)).toEqual([1, 2, 3]);
  });

  // X right, Y away from the operator (ISO 841 for this machine form): who faces −X has +Y at the
  // right hand, who faces +X has it at the left.
  test('a right-hand rack is seen from the right, with the front of the machine on the left', () => {
    const right = rack('right', [
      [1, 1300, 900, '-x'],
      [2, 1300, 100, '-x'],
    ]);
    expect(orderPockets(right).map((pocket) => pocket.number)).toEqual([2, 1]);
    expect(draw({ rack: right }).view).toContain('its front on your left');
    expect(draw({ rack: right }).view).toContain('forks open away from you');
  });

  test('a left-hand rack is seen from the left, with the back of the machine on the left', () => {
    const left = rack('left', [
      [1, 10, 100, '+x'],
      [2, 10, 900, '+x'],
    ]);
    expect(orderPockets(left).map((pocket) => pocket.number)).toEqual([2, 1]);
    expect(draw({ rack: left })).toMatchObject({ leftEnd: 'back', rightEnd: 'front' });
  });

  const mouths: [Rack['edge'], Opening, string][] = [
    ['back', '-y', 'toward'],
    ['back', '+y', 'away'],
    ['front', '-y', 'toward'],
    ['front', '+x', 'right'],
    ['right', '-x', 'away'],
    ['right', '+x', 'toward'],
    ['right', '+y', 'right'],
    ['left', '+x', 'away'],
    ['left', '-y', 'right'],
  ];
  test.each(mouths)(
    'on the %s edge a fork that opens %s opens %s for who looks',
    (edge, opens, mouth) => {
      const one = rack(edge, [[1, 0, 0, opens]]);
      expect(mouthOf(one, one.pockets[0]!)).toBe(mouth);
    },
  );

  test('says that forks open as drawn when they differ', () => {
    const mixed = rack('back', [
      [1, 0, 0, '-y'],
      [2, 100, 0, '+x'],
    ]);
    expect(draw({ rack: mixed }).view).toContain('forks open as drawn');
  });
});

describe('what stands in each pocket', () => {
  test('an empty pocket, a loaded one and the fork of the tool in the spindle differ', () => {
    const { slots, remarks } = draw({ loaded: { inSpindle: 4 } });
    expect(slots.map((slot) => slot.state)).toEqual(['in-spindle', 'empty', 'loaded']);
    expect(slots[1]).toMatchObject({ label: 'empty', drawing: null, sentence: 'Pocket 2: empty.' });
    expect(slots[0]!.sentence).toContain('this fork stands empty');
    expect(remarks).toEqual(['T4 is in the spindle; its fork stands empty now.']);
  });

  test('says so when nobody knows what the spindle holds', () => {
    expect(draw({ loaded: { inSpindle: 'unknown' } }).remarks[0]).toContain('not known');
  });

  test('a tool that the tool list does not have is named, without a silhouette', () => {
    const { slots } = draw({ tools: [tool(7)] });
    expect(slots[0]).toMatchObject({
      label: 'T4',
      drawing: null,
      toolName: 'not in the tool list',
    });
  });
});

describe('the order of call', () => {
  test('numbers called tools and steps the others back', () => {
    const { slots } = draw({ callOrder: [7] });
    expect(slots.map((slot) => slot.order)).toEqual([null, null, 1]);
    expect(slots.map((slot) => slot.dimmed)).toEqual([true, true, false]);
  });

  test('without a program nothing steps back', () => {
    expect(draw({}).slots.some((slot) => slot.dimmed)).toBe(false);
  });

  test('a called tool that is in no pocket stands after the last one', () => {
    const { slots } = draw({ callOrder: [9, 4] });
    expect(slots.at(-1)).toMatchObject({ tool: 9, pocket: null, order: 1, state: 'not-in-rack' });
  });

  test('a called tool that is fitted by hand says so', () => {
    const { slots } = draw({ callOrder: [9], loaded: { byHand: [9] } });
    expect(slots.at(-1)).toMatchObject({ state: 'by-hand', place: 'fitted by hand' });
  });
});

describe('marks', () => {
  test('a mark at a tool stands at its pocket, in words, and keeps it from stepping back', () => {
    const { slots } = draw({
      callOrder: [7],
      marks: [{ tool: 4, severity: 'stop', word: 'too long' }],
    });
    expect(slots[0]!.marks).toHaveLength(1);
    expect(slots[0]!.dimmed).toBe(false);
    expect(slots[0]!.sentence).toContain('too long');
    expect(slots[2]!.marks).toEqual([]);
  });

  test('a mark at a pocket stands there whatever it holds', () => {
    const { slots } = draw({ marks: [{ pocket: 2, severity: 'hold', word: 'look' }] });
    expect(slots.map((slot) => slot.marks.length)).toEqual([0, 1, 0]);
  });
});

describe('scale', () => {
  test('one scale for all: twice the gauge length hangs twice as deep', () => {
    const { slots } = draw({
      tools: [tool(4, { gaugeLength: 80 }), tool(7, { gaugeLength: 160, stickOut: 100 })],
    });
    expect(slots[2]!.drawing!.bottom).toBeCloseTo(2 * slots[0]!.drawing!.bottom, 6);
  });

  test('no silhouette is wider than its place, and none reaches the labels', () => {
    const wide = tool(4, { diameter: 140 });
    for (const available of [300, 700, 1400]) {
      const { slots, slotWidth, gaugeLine, labels } = draw({ tools: [wide, tool(7)], available });
      for (const slot of slots) {
        expect(slot.drawing?.width ?? 0).toBeLessThanOrEqual(slotWidth);
        expect(gaugeLine + (slot.drawing?.bottom ?? 0)).toBeLessThan(labels);
      }
    }
  });

  test('a rack wider than its box keeps its places readable', () => {
    const many = rack(
      'back',
      Array.from({ length: 20 }, (_, index) => [index + 1, index * 60, 0, '-y'] as const).map(
        ([number, x, y, opens]) => [number, x, y, opens],
      ),
    );
    expect(draw({ rack: many, available: 390 }).slotWidth).toBeGreaterThanOrEqual(90);
  });
});
