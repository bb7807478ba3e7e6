import type { Observer, Problem } from '../interpreter/events';

const NOT_MODELLED: readonly Problem[] = ['not-modelled', 'unreadable-block'];

/** Counts distinct program lines that the engine could not take for what they say; one bit a line. */
export function countLinesNotModelled(): Observer & { count(): number } {
  let bits = new Uint8Array(1024);
  let count = 0;
  return {
    problem(event) {
      if (!NOT_MODELLED.includes(event.problem)) return;
      const at = event.place.line >> 3;
      const bit = 1 << (event.place.line & 7);
      if (at >= bits.length) {
        const grown = new Uint8Array(Math.max(at + 1, bits.length * 2));
        grown.set(bits);
        bits = grown;
      }
      if ((bits[at]! & bit) !== 0) return;
      bits[at] = bits[at]! | bit;
      count += 1;
    },
    count: () => count,
  };
}
