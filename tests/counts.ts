/**
 * How much of every long suite runs: a slice with a fixed seed in `npm test`, all of it in
 * `npm run test:long`, which sets NIGHTLATCH_LONG=1. Every such number stands here.
 */
export const IS_LONG = process.env['NIGHTLATCH_LONG'] === '1';
/** The same programs on every run; a failure names the case, not the day. */
export const SEED = 20_260_115;

const of = (slice: number, long: number): number => (IS_LONG ? long : slice);

export const COUNTS = {
  /** Programs a property test makes. */
  properties: of(150, 5_000),
  /** Decimals compared with parseFloat, bit by bit. */
  numbers: of(60_000, 2_000_000),
  /** Random arcs compared with their own sampling. */
  arcs: of(300, 20_000),
  /** Plain programs whose words are compared with those of gcode-parser. */
  tokenPrograms: of(60, 3_000),
  /** Random expressions over bounds, each compared at eight points. */
  intervals: of(4_000, 400_000),
  /** Random programs whose places are not known, each compared with four of those it may be. */
  unknownPlaces: of(150, 10_000),
  /** Programs whose reports are compared with and without quiet motion. */
  quiet: of(120, 5_000),
  /** Mutated statements that must neither crash nor hang their reader. */
  statements: of(6_000, 400_000),
  /** Mutated programs that must neither crash nor hang. */
  fuzz: of(400, 200_000),
  /** Programs that steer, each cut into other pieces. */
  flowChunks: of(20, 1_000),
  /** Programs made of nothing but what steers. */
  flowFuzz: of(300, 40_000),
  /** Random byte strings pushed as they are. */
  garbage: of(300, 20_000),
} as const;
