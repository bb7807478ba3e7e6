/** A gauge length that steps and stick-out contradict by more than this is refused (the setup contract, mm). */
const SLACK = 0.5;

export interface HolderSum {
  /** Of all steps together, mm. */
  readonly steps: number;
  /** What gauge length and stick-out leave for the holder, mm. */
  readonly wanted: number;
  readonly agrees: boolean;
}

/** How the holder's steps stand against gauge length less stick-out; null while a figure is missing. */
export function sumHolder(tool: unknown): HolderSum | null {
  if (typeof tool !== 'object' || tool === null) return null;
  const { gaugeLength, stickOut, holder } = tool as Record<string, unknown>;
  if (typeof gaugeLength !== 'number' || typeof stickOut !== 'number') return null;
  const wanted = gaugeLength - stickOut;
  const steps = (holder as { steps?: readonly { length?: unknown }[] } | undefined)?.steps ?? [];
  const lengths = steps.map((step) => step.length);
  if (!lengths.every((each) => typeof each === 'number')) return null;
  const sum = lengths.reduce((total, each) => total + each, 0);
  const agrees = lengths.length === 0 ? -SLACK <= wanted : Math.abs(sum - wanted) <= SLACK;
  return { steps: sum, wanted, agrees };
}
