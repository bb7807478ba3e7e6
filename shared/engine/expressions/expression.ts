/** An expression as it is written, before anything of it is worked out. Byte ranges count from the line's first byte. */
export type Expression =
  | { readonly kind: 'number'; readonly value: number }
  | ParameterReference
  | { readonly kind: 'minus'; readonly of: Expression }
  | {
      readonly kind: 'binary';
      readonly operator: BinaryOperator;
      readonly left: Expression;
      readonly right: Expression;
    }
  | {
      readonly kind: 'function';
      readonly name: FunctionName;
      readonly of: readonly Expression[];
      readonly from: number;
      readonly to: number;
    }
  | { readonly kind: 'exists'; readonly name: string };

/** `#5`, `##5`, `#[#1+2]`, or `#<depth>`; a name is in lower case without blanks. */
export interface ParameterReference {
  readonly kind: 'parameter';
  readonly number?: Expression;
  readonly name?: string;
  readonly from: number;
  readonly to: number;
}

export type BinaryOperator =
  | '**'
  | '*'
  | '/'
  | 'MOD'
  | '+'
  | '-'
  | 'AND'
  | 'OR'
  | 'XOR'
  | 'EQ'
  | 'NE'
  | 'GT'
  | 'GE'
  | 'LT'
  | 'LE';

/** ATAN has two parts in the published language and may have one in macro dialects. */
export type FunctionName =
  | 'ABS'
  | 'ACOS'
  | 'ASIN'
  | 'ATAN'
  | 'BCD'
  | 'BIN'
  | 'COS'
  | 'EXP'
  | 'FIX'
  | 'FUP'
  | 'LN'
  | 'ROUND'
  | 'SIN'
  | 'SQRT'
  | 'TAN';
