import type { Expression, ParameterReference } from '../expressions/expression';

/**
 * A line that computes or steers, as it is written: read once, worked out each time it is run. Byte ranges
 * count from the line's first byte. Comments and faults stand in the line's own words.
 */
export interface Statement {
  /** Every word of the block in order, plain numbers too. */
  readonly words: readonly ComputedWord[];
  /** In order; they take effect after every value of the block has been read (NISTIR 6556 3.2.3). */
  readonly settings: readonly Setting[];
  readonly flow: Flow | undefined;
}

export interface ComputedWord {
  /** 0 for A … 25 for Z. */
  readonly letter: number;
  readonly value: Expression;
  readonly from: number;
  readonly to: number;
}

export interface Setting {
  readonly parameter: ParameterReference;
  readonly value: Expression;
  readonly from: number;
  readonly to: number;
}

/** What decides which block comes next. */
export type Flow = FlowWords & { readonly from: number; readonly to: number };

type FlowWords =
  /** `GOTO 20`, `IF [c] GOTO 20`. */
  | {
      readonly kind: 'goto';
      readonly condition: Expression | undefined;
      readonly target: Expression;
    }
  /** `IF [c] THEN #1=2`. */
  | { readonly kind: 'then'; readonly condition: Expression; readonly settings: readonly Setting[] }
  /** `WHILE [c] DO1`, `DO1`. */
  | { readonly kind: 'while'; readonly condition: Expression | undefined; readonly loop: number }
  | { readonly kind: 'end'; readonly loop: number }
  /** `O100 …`, `o<name> …`. */
  | LabelledFlow;

export interface LabelledFlow {
  readonly kind: 'labelled';
  readonly label: Label;
  /** 'program' where nothing but the label stands: `O1000` opens a program. */
  readonly keyword: FlowKeyword | 'program';
  /** The bracketed values behind the keyword: a call's arguments, a condition, a count, a returned value. */
  readonly values: readonly Expression[];
}

/** A number, an expression that gives one, or a name in lower case without its `<>`. */
export type Label = { readonly number: Expression } | { readonly name: string };

export type FlowKeyword =
  | 'sub'
  | 'endsub'
  | 'call'
  | 'return'
  | 'if'
  | 'elseif'
  | 'else'
  | 'endif'
  | 'while'
  | 'endwhile'
  | 'do'
  | 'repeat'
  | 'endrepeat'
  | 'break'
  | 'continue';
