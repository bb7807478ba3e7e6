import type { Run } from './run';

/** What the spindle holds from now on: 0 nothing, null not known. */
export function hold(run: Pick<Run, 'machine' | 'shop'>, number: number | null): void {
  const { held } = run.machine;
  held.known = number !== null;
  held.number = number;
  held.tool = number === null ? undefined : run.shop.toolByNumber.get(number);
}
