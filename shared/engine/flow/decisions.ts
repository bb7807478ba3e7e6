import { MOST_DECISIONS } from './limits';

/** What a walk took for true or false because nothing tells before the run. */
export interface Decision {
  /** Where the condition stands, as findings name it. */
  readonly place: DecisionPlace;
  /** The condition as written. */
  readonly condition: string;
  readonly holds: boolean;
}

type Columns = readonly [number, number];
export interface DecisionPlace {
  readonly line: number;
  readonly columns?: Columns | undefined;
  readonly within?:
    | { readonly text: string; readonly line: number; readonly columns?: Columns | undefined }
    | undefined;
}

/**
 * The outcomes of conditions that are not decided, in one walk. A walk is handed the outcomes of the first
 * ones; of all others it takes that they hold, and notes that they might not, for a walk of its own.
 */
export class Decisions {
  readonly made: Decision[] = [];
  /** How often an undecided condition has been met. */
  asked = 0;
  /** What was met when no further question was kept, and was taken not to hold. */
  readonly beyond: Decision[] = [];
  private readonly outcomes = new Map<string, boolean>();

  constructor(private readonly given: readonly boolean[] = []) {}

  /** The same question gets the same answer throughout a walk. `about`: where it stands and what it hangs on. */
  decide(about: string, describe: () => Omit<Decision, 'holds'>): boolean {
    this.asked++;
    const known = this.outcomes.get(about);
    if (known !== undefined) return known;
    if (this.made.length >= MOST_DECISIONS) {
      this.outcomes.set(about, false);
      if (this.beyond.length < MOST_DECISIONS) this.beyond.push({ ...describe(), holds: false });
      return false;
    }
    const holds = this.given[this.made.length] ?? true;
    this.outcomes.set(about, holds);
    this.made.push({ ...describe(), holds });
    return holds;
  }

  /** Whether the question has been put before. */
  knows(about: string): boolean {
    return this.outcomes.has(about);
  }

  /** The outcomes that would make other walks of this one, each up to where it parts. */
  others(): { readonly given: readonly boolean[]; readonly parts: Decision }[] {
    return this.made.slice(this.given.length).map((parts, index) => {
      const at = this.given.length + index;
      const before = this.made.slice(0, at).map(({ holds }) => holds);
      return { given: [...before, !parts.holds], parts };
    });
  }
}
