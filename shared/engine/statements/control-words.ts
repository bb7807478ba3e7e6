import type { FlowKeyword } from './statement';

export const CONTROL_WORDS: readonly FlowKeyword[] = [
  'sub',
  'endsub',
  'call',
  'return',
  'if',
  'elseif',
  'else',
  'endif',
  'while',
  'endwhile',
  'do',
  'repeat',
  'endrepeat',
  'break',
  'continue',
];

/** Letters that may be wrong, missing or too many in a misspelt word. */
const SLIPS = 2;

/** The control word that a misspelt one may mean, or ''. */
export function nearestControlWord(word: string): string {
  let nearest = '';
  let fewest = SLIPS + 1;
  for (const known of CONTROL_WORDS) {
    const slips = slipsBetween(word, known);
    if (slips < fewest && slips < known.length - 1) {
      fewest = slips;
      nearest = known;
    }
  }
  return nearest;
}

/** How many letters have to be changed, added or taken out to make one word the other. */
function slipsBetween(one: string, other: string): number {
  let above = Array.from({ length: other.length + 1 }, (_, column) => column);
  for (let row = 1; row <= one.length; row++) {
    const here = [row];
    for (let column = 1; column <= other.length; column++) {
      const changed = above[column - 1]! + (one[row - 1] === other[column - 1] ? 0 : 1);
      here.push(Math.min(changed, above[column]! + 1, here[column - 1]! + 1));
    }
    above = here;
  }
  return above[other.length]!;
}
