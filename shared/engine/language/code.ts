/** How far a code or a word is followed. */
export type Modelled =
  /** What it does is worked out to the last digit. */
  | 'exactly'
  /** What it does is known only within bounds, and checked at them. */
  | 'within bounds'
  /** It changes nothing that a check looks at. */
  | 'no effect'
  /** It raises `not-modelled` wherever it stands. */
  | 'named';

/** One line of the language table. */
export interface Code {
  /** As written: 'G2', 'M6', 'X', 'o… call'. */
  readonly code: string;
  readonly meaning: string;
  readonly modelled: Modelled;
  /** Which published text says so, or 'common practice, no source'. */
  readonly source: string;
  /** A program that uses it as it should be used; the code with a nought for every word it needs when absent. */
  readonly example?: string;
  /** Followed only where the setup's language is this one. */
  readonly only?: 'rs274ngc' | 'custom-macro';
}
