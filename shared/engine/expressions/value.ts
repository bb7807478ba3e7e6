/** A number known only to lie within bounds, ends included; `of` names where it came from, such as '#5399'. */
export interface Bounds {
  readonly least: number;
  readonly greatest: number;
  readonly of: string;
}

/**
 * What an expression is worth: a number; a number within bounds; or null, which is what a variable of a
 * macro dialect holds that was never set.
 */
export type Value = number | Bounds | null;

export const isBounds = (value: Value): value is Bounds =>
  typeof value === 'object' && value !== null;
