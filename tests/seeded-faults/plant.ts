import { CLEAN_LINES, lineOf } from './clean-program';

/** One fault: what is edited, and what that has to make the check say. */
export interface Fault {
  readonly rule: string;
  /** What a person did wrong. */
  readonly story: string;
  /** The shop in which the clean program is clear; the plain test shop with this merged over it. */
  readonly shop?: object;
  /** The wrong entry in the setup, merged over the shop. */
  readonly setup?: object;
  readonly text?: PlantedText;
  /** Line at which the edit has to be found; by default the one that was edited. */
  readonly line?: number;
  readonly severity: 'stop' | 'hold' | 'note';
  readonly unattended?: 'stop' | 'hold';
  /** What the same edit truly brings with it, as `line rule`; each has to be so for a reason. */
  readonly also?: readonly string[];
}
export interface PlantedText {
  readonly program: string;
  /** The line edited, in the edited program. */
  readonly line: number;
}

/** The line that begins so reads otherwise; several lines may take its place. */
export function changed(beginning: string, ...to: readonly string[]): PlantedText {
  const line = lineOf(beginning);
  return { line, program: CLEAN_LINES.toSpliced(line - 1, 1, ...to).join('\n') };
}

/** Lines put in behind the one that begins so. */
export function added(beginning: string, ...lines: readonly string[]): PlantedText {
  const line = lineOf(beginning) + 1;
  return { line, program: CLEAN_LINES.toSpliced(line - 1, 0, ...lines).join('\n') };
}

/** The lines that begin so are gone; the fault shows at the line that then stands at `shows`. */
export function removed(shows: string, ...beginnings: readonly string[]): PlantedText {
  const gone = new Set(beginnings.map(lineOf));
  const kept = CLEAN_LINES.filter((_, index) => !gone.has(index + 1));
  const before = [...gone].filter((line) => line < lineOf(shows)).length;
  return { line: lineOf(shows) - before, program: kept.join('\n') };
}

/** The file ends in the middle of the line that begins so, behind the given text. */
export function cutOff(beginning: string, lastLine: string): PlantedText {
  const line = lineOf(beginning);
  return { line, program: [...CLEAN_LINES.slice(0, line - 1), lastLine].join('\n') };
}
