/** The second contract: what a check says. Keys stand in contract order; see engine.md "Report". */
export interface Report {
  readonly format: 'nightlatch-report';
  readonly version: 1;
  readonly engine: string;
  readonly program: {
    readonly name: string;
    readonly sha256: string;
    readonly bytes: number;
    readonly lines: number;
  };
  readonly setup: { readonly sha256: string };
  readonly verdict: Verdict;
  readonly counts: Counts;
  readonly unattended: { readonly verdict: Verdict; readonly counts: Counts };
  readonly findings: readonly Finding[];
  readonly tools: readonly ToolUse[];
  readonly extents: {
    readonly gauge: Extent | null;
    readonly work: Readonly<Record<string, Extent>>;
  };
  /** Values the work offset itself may take, from travel alone; lo > hi: none; null: axis unused. */
  readonly workZeroWindow: Readonly<
    Record<string, { readonly x: Window; readonly y: Window; readonly z: Window }>
  >;
  readonly seconds: {
    readonly total: number;
    readonly cutting: number;
    readonly rapid: number;
    readonly changes: number;
    readonly dwell: number;
  };
  readonly material: { readonly used: boolean; readonly cell: number; readonly bytes: number };
  readonly coverage: { readonly blocks: number; readonly modelled: number };
  readonly dependsOn: {
    readonly tools: readonly number[];
    readonly pockets: readonly number[];
    readonly offsets: readonly string[];
    readonly pairs: readonly (readonly [number, number])[];
  };
  /** What a static check cannot see, in whole sentences. */
  readonly blind: readonly string[];
}
export type Severity = 'stop' | 'hold' | 'note';
export type Verdict = 'stopped' | 'held' | 'clear';
export interface Counts {
  readonly stop: number;
  readonly hold: number;
  readonly note: number;
}
export interface Extent {
  readonly min: { readonly x: number; readonly y: number; readonly z: number };
  readonly max: { readonly x: number; readonly y: number; readonly z: number };
}
export type Window = readonly [number, number] | null;
/** A place in a macro or setup subprogram; columns as in Finding. */
export interface Within {
  readonly text: string;
  readonly line: number;
  readonly columns?: Columns | undefined;
}
/** 1-based, first and one past the last, in UTF-16 units of the line decoded as UTF-8. */
export type Columns = readonly [number, number];
export type FindingValue = string | number | boolean | null | readonly FindingValue[];
/** Every figure a finding's sentence uses, mm and s, so that a client can word it in its own unit. */
export type FindingData = Readonly<Record<string, FindingValue>>;
/** The outcome of a condition that nothing decides before the run, in words: '[#500 GT 3] holds'. */
export interface Assumption {
  readonly line: number;
  readonly within?: Within | undefined;
  readonly condition: string;
}
export interface Finding {
  readonly rule: string;
  readonly severity: Severity;
  /** Only where it differs from `severity`. */
  readonly unattended?: Severity | undefined;
  readonly line: number;
  readonly endLine: number;
  readonly worstLine: number;
  /** Violating blocks. */
  readonly count: number;
  readonly columns?: Columns | undefined;
  readonly within?: Within | undefined;
  /** Present when only the walk that skips `/` blocks finds it. */
  readonly blockDelete?: 'on' | undefined;
  /** Present where it is found only if what is not known before the run turns out so. */
  readonly assumed?: readonly Assumption[] | undefined;
  readonly tool?: number | undefined;
  /** How many further findings of this rule are folded into this one. */
  readonly folded?: number | undefined;
  /** Which hold this is: answered by looking at the machine, or by judgement. */
  readonly hold?: 'look' | 'judge' | undefined;
  readonly message: string;
  readonly advice: string;
  readonly data: FindingData;
}
export interface ToolUse {
  readonly number: number;
  readonly pocket: number | null;
  readonly firstLine: number;
  readonly changes: number;
  readonly cutSeconds: number;
  readonly cutLength: number;
  /** Lowest tip z in the work offset then active; null: no motion with it. */
  readonly lowest: number | null;
}
