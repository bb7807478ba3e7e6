import type { Pocket } from '#engine';

/** Places are kept to a thousandth of a millimetre, finer than any controller can stand. */
const roundPlace = (mm: number) => Math.round(mm * 1000) / 1000;

export type Spacing =
  { readonly pockets: readonly Pocket[]; readonly pitch: number } | { readonly sentence: string };

/**
 * The pockets between two taught ones, evenly spaced on the straight line between their grips and
 * numbered in between. Everything else is taken from the first; the two ends stay exactly as taught,
 * and only they keep their "taught" mark: a place worked out was not touched by anyone.
 */
export function spaceEvenly(first: Pocket, last: Pocket): Spacing {
  const steps = Math.abs(last.number - first.number);
  if (steps === 0) return { sentence: 'The two pockets must have different numbers.' };
  if (first.opens !== last.opens) {
    return { sentence: 'The two pockets open in different directions; they are no one row.' };
  }
  const { x, y } = first.grip;
  const run = Math.hypot(last.grip.x - x, last.grip.y - y);
  if (!(0 < run)) return { sentence: 'The two pockets have the same grip.' };
  const direction = Math.sign(last.number - first.number);
  const between = Array.from({ length: steps - 1 }, (_, index): Pocket => {
    const share = (index + 1) / steps;
    const at = (from: number, to: number) => roundPlace(from + (to - from) * share);
    return {
      ...first,
      taught: undefined,
      number: first.number + direction * (index + 1),
      grip: {
        x: at(first.grip.x, last.grip.x),
        y: at(first.grip.y, last.grip.y),
        z: at(first.grip.z, last.grip.z),
      },
    };
  });
  return { pockets: [first, ...between, last], pitch: run / steps };
}

/** Puts the row into the list: a pocket that had one of its numbers is replaced, others stay. */
export function placeRow(pockets: readonly Pocket[], row: readonly Pocket[]): readonly Pocket[] {
  const numbers = new Set(row.map((pocket) => pocket.number));
  return [...pockets.filter((pocket) => !numbers.has(pocket.number)), ...row].sort(
    (one, other) => one.number - other.number,
  );
}
