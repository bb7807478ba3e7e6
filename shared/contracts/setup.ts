import * as z from 'zod';
import { CODE_DEEDS, INPUT_MEANINGS } from '../engine/shop/setup';

/**
 * The setup contract (`nightlatch-setup`, version 1): machine, controller, rack, loading, tools,
 * offsets, job sheet, macro and policy as one JSON document. Unknown keys are refused; every key that
 * is optional has its default here, so an older file stays valid.
 */
const number = z.number();
const positive = z.number().positive();
const atLeastZero = z.number().min(0);
const whole = z.number().int().min(0);
const interval = z
  .tuple([number, number])
  .refine(([from, to]) => from <= to, { message: 'the first number must not exceed the second' });
const point = z.strictObject({ x: number, y: number, z: number });
const perAxis = z.strictObject({ x: positive, y: positive, z: positive });
const corner = z.strictObject({ x: number.optional(), y: number.optional(), z: number.optional() });
const openBox = z
  .strictObject({ min: corner, max: corner })
  .refine(
    ({ min, max }) =>
      (['x', 'y', 'z'] as const).every(
        (axis) => (min[axis] ?? -Infinity) <= (max[axis] ?? Infinity),
      ),
    { message: 'min must not exceed max on any axis' },
  );
const name = z.string().min(1).max(200);
const moment = z.iso.datetime({ offset: true });
const text = z.strictObject({ name, text: z.string().max(2_000_000) });

export const machineSchema = z.strictObject({
  name,
  travel: z.strictObject({ x: interval, y: interval, z: interval, a: interval.optional() }),
  changeTravel: z
    .strictObject({ x: interval.optional(), y: interval.optional(), z: interval.optional() })
    .default({}),
  start: point.optional(),
  references: z.strictObject({ g28: point.optional(), g30: point.optional() }).default({}),
  rapid: perAxis,
  maxFeed: perAxis,
  acceleration: perAxis,
  spindle: z.strictObject({
    minRpm: atLeastZero,
    maxRpm: positive,
    spinUp: atLeastZero,
    spinDown: atLeastZero,
    turns: z.array(z.enum(['cw', 'ccw'])).min(1),
    waits: z.boolean().default(false),
  }),
  drawbar: z
    .strictObject({ open: atLeastZero, close: atLeastZero, ejects: atLeastZero.default(0) })
    .optional(),
  spoilboard: z
    .strictObject({
      top: number,
      allowance: atLeastZero,
      area: z
        .strictObject({
          min: z.strictObject({ x: number, y: number }),
          max: z.strictObject({ x: number, y: number }),
        })
        .optional(),
    })
    .optional(),
  changePoint: point.nullable().default(null),
  changeSeconds: atLeastZero.default(15),
  bodies: z
    .array(
      z.strictObject({
        name,
        rides: z.enum(['head', 'carriage', 'gantry']),
        box: openBox,
        boot: z.enum(['stays', 'lifts', 'docks']).optional(),
        bristles: atLeastZero.optional(),
      }),
    )
    .default([]),
  zones: z
    .array(
      z.strictObject({
        name,
        box: openBox,
        forbids: z.enum(['everything', 'tip', 'rapid', 'all-but-change']),
      }),
    )
    .default([]),
});

const SWITCH_DEFAULTS = {
  homeAxes: 'all',
  cycleReturn: 'line',
  startMotion: 'none',
  lengthWithoutH: 'refused',
  leastIncrement: 0.001,
  peckBackOff: 0.254,
  packedM98: false,
  incrementalMachineMove: 'obeyed',
  strict: false,
} as const;

const parameterName = z
  .string()
  .regex(/^#(\d+|<[^<>]+>)$/, 'a parameter is written #500 or #<name>');
const workOffsetName = z
  .string()
  .regex(/^G(5[4-9](\.[1-3])?|54\.1P\d+)$/, 'a work offset is written G54 … G59.3');

export const controllerSchema = z.strictObject({
  language: z.enum(['rs274ngc', 'custom-macro']),
  defaults: z.strictObject({
    units: z.enum(['mm', 'inch']),
    plane: z.enum(['xy', 'zx', 'yz']),
    distance: z.enum(['absolute', 'incremental']),
    arcCentre: z.enum(['incremental', 'absolute']),
    feed: z.enum(['per-minute', 'inverse-time', 'per-revolution']),
    workOffset: workOffsetName,
    return: z.enum(['G98', 'G99']),
    path: z.enum(['G61', 'G61.1', 'G64']),
  }),
  arcTolerance: positive,
  dwell: z.enum(['seconds', 'milliseconds']),
  numbers: z.enum(['decimal', 'least-increment']),
  longestBlock: z.number().int().positive(),
  toolWord: z.enum(['tool', 'pocket']),
  toolZero: z.enum(['put-away', 'ignored', 'by-hand', 'refused']),
  changeOn: z.enum(['M6', 'T']).default('M6'),
  toolChange: z.enum(['macro', 'controller', 'manual', 'ignored']),
  changeStopsSpindle: z.boolean().default(false),
  rapids: z.enum(['coordinated', 'independent']),
  lengthOffset: z.enum(['program', 'macro', 'automatic']),
  lengthScheme: z
    .enum(['from-nose', 'from-master', 'touch-off', 'none', 'measured-in-macro'])
    .default('from-nose'),
  lengthReference: number.default(0),
  diameterOffsetShift: z.number().int().default(0),
  currentTool: parameterName.optional(),
  selectedTool: parameterName.optional(),
  currentPocket: parameterName.optional(),
  selectedPocket: parameterName.optional(),
  pocketContents: z.record(z.string().regex(/^\d+$/), parameterName).default({}),
  codes: z
    .array(
      z.strictObject({
        code: z.string().regex(/^[GM]\d+(\.\d)?$/, 'a code is written like M64 or G38.2'),
        where: z.record(z.string().regex(/^[A-Z]$/), number).optional(),
        does: z.enum(CODE_DEEDS),
        input: z.enum(INPUT_MEANINGS).optional(),
        pocket: whole.optional(),
        when: number.optional(),
        seconds: z.union([atLeastZero, z.string().regex(/^[A-Z]$/)]).optional(),
        into: parameterName.optional(),
        timeout: number.optional(),
        from: z
          .string()
          .regex(/^[A-Z]$/)
          .optional(),
      }),
    )
    .default([]),
  inputs: z
    .array(
      z.strictObject({
        parameter: parameterName,
        means: z.enum(INPUT_MEANINGS),
        pocket: whole.optional(),
        when: number,
      }),
    )
    .default([]),
  parameters: z.record(parameterName, number).default({}),
  switches: z
    .strictObject({
      homeAxes: z.enum(['all', 'named']).default(SWITCH_DEFAULTS.homeAxes),
      cycleReturn: z.enum(['line', 'series']).default(SWITCH_DEFAULTS.cycleReturn),
      startMotion: z.enum(['none', 'rapid', 'feed']).default(SWITCH_DEFAULTS.startMotion),
      lengthWithoutH: z.enum(['refused', 'held-tool']).default(SWITCH_DEFAULTS.lengthWithoutH),
      leastIncrement: positive.default(SWITCH_DEFAULTS.leastIncrement),
      peckBackOff: atLeastZero.default(SWITCH_DEFAULTS.peckBackOff),
      packedM98: z.boolean().default(SWITCH_DEFAULTS.packedM98),
      incrementalMachineMove: z
        .enum(['obeyed', 'refused', 'ignored'])
        .default(SWITCH_DEFAULTS.incrementalMachineMove),
      strict: z.boolean().default(SWITCH_DEFAULTS.strict),
    })
    .default(SWITCH_DEFAULTS),
});

export const pocketSchema = z.strictObject({
  number: z.number().int().positive(),
  grip: point,
  opens: z.enum(['+x', '-x', '+y', '-y']),
  largestDiameter: positive,
  longest: positive,
  taper: name,
  kind: z.enum(['fork', 'cup']).default('fork'),
  heaviest: positive.optional(),
  taught: z.strictObject({ at: moment, by: name }).optional(),
});

export const rackSchema = z.strictObject({
  name,
  edge: z.enum(['front', 'back', 'left', 'right']),
  slideOut: positive,
  gripTolerance: z.strictObject({ xy: positive, z: positive }),
  fork: z.strictObject({
    width: positive,
    reach: positive,
    thickness: positive,
    below: atLeastZero,
  }),
  bodies: z.array(z.strictObject({ name, box: openBox })).default([]),
  pockets: z.array(pocketSchema),
});

export const loadingSchema = z.strictObject({
  pockets: z.array(z.strictObject({ pocket: z.number().int().positive(), tool: whole })),
  inSpindle: z.union([whole, z.null(), z.literal('unknown')]),
  byHand: z.array(whole).default([]),
});

export const toolSchema = z
  .strictObject({
    number: z.number().int().positive(),
    name,
    kind: name,
    diameter: positive,
    asGround: positive.optional(),
    shank: positive,
    stickOut: positive,
    fluteLength: atLeastZero,
    gaugeLength: positive,
    holder: z.strictObject({
      taper: name,
      diameter: positive,
      above: atLeastZero,
      steps: z.array(z.strictObject({ diameter: positive, length: positive })).default([]),
      collet: z
        .strictObject({ min: positive, max: positive, grips: positive.optional() })
        .optional(),
      gripped: positive.optional(),
    }),
    flutes: z.number().int().positive().optional(),
    maxRpm: positive,
    turns: z.enum(['cw', 'ccw', 'never']),
    life: positive.optional(),
    used: atLeastZero.default(0),
    mass: positive.optional(),
    measured: z.strictObject({ at: moment, method: name }).nullable().default(null),
    touched: moment.nullable().default(null),
    sisterOf: whole.nullable().default(null),
  })
  .superRefine((tool, context) => {
    const holderLength = tool.gaugeLength - tool.stickOut;
    if (holderLength < -GAUGE_LENGTH_SLACK) {
      context.addIssue({
        code: 'custom',
        path: ['gaugeLength'],
        message: `gaugeLength ${tool.gaugeLength} is less than stickOut ${tool.stickOut}: the tip would stand above the holder's face`,
      });
    }
    if (tool.holder.steps.length === 0) return;
    const stepped = tool.holder.steps.reduce((sum, step) => sum + step.length, 0);
    if (!(Math.abs(stepped - holderLength) <= GAUGE_LENGTH_SLACK)) {
      context.addIssue({
        code: 'custom',
        path: ['gaugeLength'],
        message: `gaugeLength ${tool.gaugeLength} does not agree with stickOut ${tool.stickOut} and holder steps of ${stepped} mm together (they may differ by ${GAUGE_LENGTH_SLACK} mm)`,
      });
    }
  });

/** A gauge length that steps and stick-out contradict by more than this is refused (mm, engine.md). */
const GAUGE_LENGTH_SLACK = 0.5;

const tableNumber = z.string().regex(/^\d+$/, 'offset tables are keyed by number');
export const offsetsSchema = z.strictObject({
  length: z.record(tableNumber, number).default({}),
  diameter: z.record(tableNumber, number).default({}),
  work: z
    .record(
      workOffsetName,
      z.strictObject({
        x: number.optional(),
        y: number.optional(),
        z: number.optional(),
        a: number.optional(),
      }),
    )
    .default({}),
});

export const jobSheetSchema = z.strictObject({
  stock: z
    .strictObject({
      in: workOffsetName,
      min: point,
      max: point,
      material: z.string().max(200).optional(),
    })
    .optional(),
  zeroOn: z.enum(['top', 'board']).default('top'),
  obstacles: z.array(z.strictObject({ name, in: workOffsetName, box: openBox })).default([]),
});

const POLICY_DEFAULTS = {
  unattended: { allowPauses: false, lifeMargin: 0.1, measuredWithinDays: 30 },
  raise: {},
  material: { upToBlocks: 500_000 },
  chipLoad: [],
};
export const policySchema = z.strictObject({
  unattended: z
    .strictObject({
      allowPauses: z.boolean().default(false),
      lifeMargin: atLeastZero.default(0.1),
      measuredWithinDays: positive.default(30),
    })
    .default(POLICY_DEFAULTS.unattended),
  raise: z.record(z.string(), z.enum(['hold', 'stop'])).default({}),
  material: z
    .strictObject({ upToBlocks: whole.default(500_000) })
    .default(POLICY_DEFAULTS.material),
  chipLoad: z
    .array(
      z.strictObject({
        kind: name,
        material: z.string().optional(),
        from: positive,
        to: positive,
      }),
    )
    .default([]),
});

export const setupSchema = z
  .strictObject({
    format: z.literal('nightlatch-setup'),
    version: z.literal(1),
    asOf: moment.optional(),
    machine: machineSchema,
    controller: controllerSchema,
    rack: rackSchema,
    loading: loadingSchema,
    tools: z.array(toolSchema),
    offsets: offsetsSchema,
    job: jobSheetSchema.optional(),
    changeMacro: text.optional(),
    subprograms: z.array(text).default([]),
    policy: policySchema.default(POLICY_DEFAULTS),
  })
  .superRefine(refuseTwins);

/** Numbers that name one thing must stand once: pocket numbers, tool numbers. */
function refuseTwins(
  setup: {
    rack: { pockets: readonly { number: number }[] };
    tools: readonly { number: number }[];
    loading: { pockets: readonly { pocket: number }[] };
  },
  context: z.core.$RefinementCtx,
): void {
  const lists = [
    { path: ['rack', 'pockets'], numbers: setup.rack.pockets.map((each) => each.number) },
    { path: ['tools'], numbers: setup.tools.map((each) => each.number) },
    { path: ['loading', 'pockets'], numbers: setup.loading.pockets.map((each) => each.pocket) },
  ];
  for (const { path, numbers } of lists) {
    numbers.forEach((each, index) => {
      if (numbers.indexOf(each) === index) return;
      context.addIssue({
        code: 'custom',
        path: [...path, index],
        message: `number ${each} stands twice in ${path.join('.')}`,
      });
    });
  }
  const pockets = new Set(setup.rack.pockets.map((each) => each.number));
  setup.loading.pockets.forEach(({ pocket }, index) => {
    if (pockets.has(pocket)) return;
    context.addIssue({
      code: 'custom',
      path: ['loading', 'pockets', index, 'pocket'],
      message: `pocket ${pocket} is not in the rack`,
    });
  });
}

export type SetupDocument = z.input<typeof setupSchema>;
export type ValidSetup = z.output<typeof setupSchema>;
