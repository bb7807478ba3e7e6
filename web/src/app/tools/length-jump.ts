/** A check holds when table and gauge length part by more than this (rule length-offset-disagrees, mm). */
const WORTH_A_LOOK = 0.05;
/** And stops from here on: more than wear or dirt explains (same rule, mm). */
const NOT_THE_SAME_TOOL = 1;

export type LengthJump = 'none' | 'look' | 'large';

/** How a newly measured length stands against the last one, both mm. */
export function judgeJump(last: number, measured: number): LengthJump {
  const by = Math.abs(measured - last);
  if (by <= WORTH_A_LOOK) return 'none';
  return by <= NOT_THE_SAME_TOOL ? 'look' : 'large';
}
