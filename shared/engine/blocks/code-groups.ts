/**
 * Which modal group a code belongs to, codes written in tenths (G59.1 is 591). Groups 0–13 are those of
 * NISTIR 6556 table 4; canned cycles and the arc-centre mode stand apart because controllers treat them so.
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
} as const;
export const GROUP_COUNT = 18;
export const NO_GROUP = -1;

const G_GROUPS: Readonly<Record<string, readonly number[]>> = {
  once: [40, 90, 100, 280, 281, 300, 301, 520, 530, 920, 921, 922, 923],
  motion: [0, 10, 20, 30, 382, 383, 384, 385],
  plane: [170, 180, 190],
  distance: [900, 910],
  arcCentre: [901, 911],
  feedMode: [930, 940, 950],
  units: [200, 210],
  compensation: [400, 410, 420],
  length: [430, 431, 490],
  cycle: [730, 740, 760, 800, 810, 820, 830, 840, 850, 860, 870, 880, 890],
  return: [980, 990],
  workOffset: [540, 550, 560, 570, 580, 590, 591, 592, 593],
  path: [610, 611, 640],
};
const M_GROUPS: Readonly<Record<string, readonly number[]>> = {
  stop: [0, 10, 20, 300, 600],
  change: [60],
  spindle: [30, 40, 50],
  coolant: [70, 80, 90],
  override: [480, 490],
};

export const G_GROUP_OF = groupTable(G_GROUPS);
export const M_GROUP_OF = groupTable(M_GROUPS);

function groupTable(groups: Readonly<Record<string, readonly number[]>>): Int8Array {
  const table = new Int8Array(10_000).fill(NO_GROUP);
  for (const [name, codes] of Object.entries(groups))
    for (const code of codes) table[code] = GROUP[name as keyof typeof GROUP];
  return table;
}

/** 'G59.1' from 591. */
export function codeName(letter: 'G' | 'M', tenths: number): string {
  const whole = Math.floor(tenths / 10);
  const part = tenths - whole * 10;
  return part === 0 ? `${letter}${whole}` : `${letter}${whole}.${part}`;
}
