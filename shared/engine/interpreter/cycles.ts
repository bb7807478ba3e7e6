/** What a canned cycle keeps from one line to the next. */
export interface CycleMemory {
  /** The cycle the sticky words belong to, in tenths; 800 for none. */
  code: number;
  depth: number;
  retract: number;
  dwell: number;
  peck: number;
  /** Level of the depth axis where the series began, machine mm. */
  seriesLevel: number;
}

export function emptyCycle(): CycleMemory {
  return { code: 800, depth: NaN, retract: NaN, dwell: NaN, peck: NaN, seriesLevel: NaN };
}
