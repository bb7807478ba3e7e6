import { startTrace, type Motion, type Setup } from '#engine';
import type { Row } from './row';

/**
 * Not compared: 5220 is reset by the end code itself, after which nothing is read, and where a probe stops is
 * not known here.
 */
const LEFT_OUT: readonly string[] = ['FEED-06', 'PRB-01'];

export const statesParameters = (row: Row): boolean =>
  row.expected.params !== undefined && !LEFT_OUT.includes(row.id);

/** What the row's parameters hold before its end code: a machine move to each of them tells, in mm. */
export function parametersAfter(row: Row, setup: Setup): Readonly<Record<string, number>> {
  const numbers = Object.keys(row.expected.params ?? {});
  const end = row.program.lastIndexOf('M2');
  const moves = numbers.map((number) => `G53 G0 X#${number} Y1\nG53 G0 Y2\n`).join('');
  const program = `${row.program.slice(0, end)}G90\n${moves}M2\n`;
  const reached: number[] = [];
  const observer = {
    motion: ({ by, toX, toY }: Motion) => {
      if (by === 'machine' && toY === 1) reached.push(toX);
    },
  };
  const trace = startTrace(setup, () => undefined, { observers: [observer] });
  do trace.push(new TextEncoder().encode(program));
  while (trace.endOfText() === 'read-again');
  return Object.fromEntries(numbers.map((number, index) => [number, reached[index] ?? NaN]));
}
