/** What cutter compensation keeps from block to block, machine mm. One object a walk. */
export interface Offset {
  /** 1: the cutter runs left of the path, −1: right of it; 0: off. A negative diameter has swapped it. */
  side: 1 | -1 | 0;
  radius: number;
  /** The D number that the next G41 or G42 without one takes; null for that of the held tool. */
  number: number | null;
  /** Where the program stands; the cutter is off to its side. */
  x: number;
  y: number;
  /** Where the last compensated motion left the cutter. */
  toolX: number;
  toolY: number;
  /** Whether no XY move has been made since it was switched on. */
  isEntering: boolean;
  /** Whether it was switched off and no XY move has been made since. */
  isLeaving: boolean;
  /** Whether the cutter has stayed down since it was switched off. */
  isLow: boolean;
  /** Length of the last straight move that no corner has used up; NaN after an arc or the entry. */
  room: number;
}

export const noOffset = (): Offset => ({
  side: 0,
  radius: 0.5,
  number: null,
  x: 0.5,
  y: 0.5,
  toolX: 0.5,
  toolY: 0.5,
  isEntering: false,
  isLeaving: false,
  isLow: true,
  room: NaN,
});
