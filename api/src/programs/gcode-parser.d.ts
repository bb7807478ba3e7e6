/** The part of the package that is used here and that the tests compare with; it ships no types of its own. */
declare module 'gcode-parser' {
  export function parseLine(line: string): {
    readonly words: readonly (readonly [string, number | string])[];
    readonly ln?: number;
    readonly comments?: readonly string[];
    readonly cmds?: readonly string[];
  };
}
