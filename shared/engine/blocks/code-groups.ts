/**
 * Which modal group a code belongs to; codes are written in tenths (G59.1 is 591). The groups are those of
 * NISTIR 6556 table 4, with canned cycles and the arc-centre mode apart because router controllers treat
 * them so, and with the codes that trade dialects add (common practice, no source).
 */
export const GROUP = {
  once: 0,
  motion: 1,
  plane: 2,
  distance: 3,
  arcCentre: 4,
  feedMode: 5,
  units: 6,
  compensation: 7,
  length: 8,
  cycle: 9,
  return: 10,
  workOffset: 11,
  path: 12,
  stop: 13,
  change: 14,
  spindle: 15,
  coolant: 16,
  override: 17,
  /** Cancels of modes that this engine never has on: scaling, rotation, polar, modal macro. */
  idle: 18,
} as const;
export const GROUP_COUNT = 19;
/** A code nobody knows. */
export const NO_GROUP = -1;
/** A code whose meaning the setup declares. */
export const DECLARED = -2;

type Grouping = Readonly<Partial<Record<keyof typeof GROUP, readonly number[]>>>;

/** What NISTIR 6556 defines. */
const PUBLISHED_G: Grouping = {
  once: [40, 100, 280, 300, 530, 920, 921, 922, 923],
  motion: [0, 10, 20, 30, 382],
  cycle: [800, 810, 820, 830, 840, 850, 860, 870, 880, 890],
  plane: [170, 180, 190],
  distance: [900, 910],
  feedMode: [930, 940],
  units: [200, 210],
  compensation: [400, 410, 420],
  length: [430, 490],
  return: [980, 990],
  workOffset: [540, 550, 560, 570, 580, 590, 591, 592, 593],
  path: [610, 611, 640],
};
/** What trade dialects add. G9 is an exact stop for one block, which changes no end point. */
const TRADE_G: Grouping = {
  once: [90, 281, 301, 520],
  motion: [383, 384, 385],
  cycle: [730],
  arcCentre: [901, 911],
  feedMode: [950],
  compensation: [411, 421],
  length: [431],
  workOffset: [541],
  idle: [150, 500, 501, 670, 690, 691],
};
const PUBLISHED_M: Grouping = {
  stop: [0, 10, 20, 300, 600],
  change: [60],
  spindle: [30, 40, 50],
  coolant: [70, 80, 90],
  override: [480, 490],
};
/** M19 stops and orients the spindle; M99 ends a main program that nobody called. */
const TRADE_M: Grouping = { stop: [990], spindle: [190] };

/** A table of groups by code; longer codes than it holds have no group. */
export const TABLE_LENGTH = 10_000;

export function groupTables(isStrict: boolean): { g: Int8Array; m: Int8Array } {
  const g = new Int8Array(TABLE_LENGTH).fill(NO_GROUP);
  const m = new Int8Array(TABLE_LENGTH).fill(NO_GROUP);
  enter(g, PUBLISHED_G);
  enter(m, PUBLISHED_M);
  if (!isStrict) {
    enter(g, TRADE_G);
    enter(m, TRADE_M);
  }
  return { g, m };
}

function enter(table: Int8Array, grouping: Grouping): void {
  for (const [name, codes] of Object.entries(grouping))
    for (const code of codes) table[code] = GROUP[name as keyof typeof GROUP];
}

/** 'G59.1' from 591. */
export function codeName(letter: string, tenths: number): string {
  const whole = Math.floor(tenths / 10);
  const part = tenths - whole * 10;
  return part === 0 ? `${letter}${whole}` : `${letter}${whole}.${part}`;
}

/** 591 from 'G59.1'. */
export const codeTenths = (name: string): number => Math.round(Number(name.slice(1)) * 10);
