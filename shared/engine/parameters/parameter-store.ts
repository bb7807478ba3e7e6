import type { Failure, ParameterReader } from '../expressions/evaluate';
import { EVERYTHING } from '../expressions/interval';
import type { Grammar } from '../expressions/grammar';
import type { Value } from '../expressions/value';
import { Fingerprint } from './fingerprint';
import { showParameter, type ParameterKey } from './parameter-name';

/** A parameter that is not stored but read off the machine, each time it is asked for. */
export interface LiveParameter {
  read(): Value;
  /** Absent where the controller alone writes it; 'unknown' when it takes no value within bounds. */
  write?(value: Value): 'unknown' | undefined;
}

/** Parameters of one call: G65 and o-word calls open a level, their return closes it. */
interface Level {
  readonly numbers: Map<number, Value>;
  readonly names: Map<string, Value>;
  print: number;
}

/** Facts sheet 4.3. */
const HIGHEST_PUBLISHED = 5_399;
/** Facts sheet 12.1.1: #1 … #33 are a macro's own, #1000 and above the controller's. */
const MACRO_LOCALS = 33;
const FIRST_COMMON = 100;
const FIRST_SYSTEM = 1_000;
const HIGHEST_ANYWHERE = 99_999;
/** Facts sheet 12.2.2. */
const SUBROUTINE_LOCALS = 30;

/**
 * The parameters of one walk. Reading one that nobody set gives
 * - null for #0 and the local variables of a macro dialect (facts sheet 12.1.1, 12.1.2);
 * - a failure for a local name, which o-word dialects refuse (common practice, no source);
 * - else a value that is not known. NISTIR 6556 lets such a parameter read as nought, but it also keeps all of
 *   them from one program to the next, so what an earlier program or the operator left there is what the machine
 *   will read, and a check that took nought for it would be clear on a guess. The setup can state it.
 */
export class ParameterStore implements ParameterReader {
  private readonly numbers = new Map<number, Value>();
  private readonly globals = new Map<string, Value>();
  private readonly levels: Level[] = [{ numbers: new Map(), names: new Map(), print: 0 }];
  private readonly prints = new Fingerprint();
  private commonPrint = 0;

  constructor(
    private readonly grammar: Grammar,
    private readonly live: ReadonlyMap<ParameterKey, LiveParameter>,
    /**
     * Starting values from the setup, and undefined for what it only says is there. All of them exist,
     * whatever the dialect says.
     */
    private readonly stated: ReadonlyMap<ParameterKey, number | undefined>,
  ) {}

  read(number: number): Value | Failure {
    const live = this.live.get(number);
    if (live) return live.read();
    if (!this.hasNumber(number)) return outside(number);
    const set = this.placeOf(number).get(number);
    if (set !== undefined) return set;
    const stated = this.stated.get(number);
    if (stated !== undefined) return stated;
    const isNull = this.grammar.isMacro && number <= MACRO_LOCALS;
    return isNull ? null : unknownValue(number);
  }

  readNamed(name: string): Value | Failure {
    const live = this.live.get(name);
    if (live) return live.read();
    const value = this.namesOf(name).get(name) ?? this.stated.get(name);
    if (value !== undefined) return value;
    return isGlobal(name) ? unknownValue(name) : { reason: 'never-set', what: showParameter(name) };
  }

  exists(name: string): boolean {
    return (
      this.live.has(name) || this.namesOf(name).has(name) || this.stated.get(name) !== undefined
    );
  }

  /** Stores a value; gives what is wrong when the parameter takes none. */
  set(key: ParameterKey, value: Value): Failure | undefined {
    const live = this.live.get(key);
    if (live) {
      const refused = live.write ? live.write(value) : 'system';
      return refused && { reason: refused, what: showParameter(key) };
    }
    if (typeof key === 'string') {
      this.put(key, value);
      return undefined;
    }
    if (!this.hasNumber(key)) return outside(key);
    if (this.grammar.isMacro && key === 0) return { reason: 'read-only', what: '#0' };
    const firstSystem = this.grammar.isMacro ? FIRST_SYSTEM : HIGHEST_PUBLISHED + 1;
    if (key >= firstSystem && !this.stated.has(key))
      return { reason: 'system', what: showParameter(key) };
    this.put(key, value);
    return undefined;
  }

  /** The same whenever the same is stored, here and in all calls that are still to return. */
  get fingerprint(): number {
    return (this.commonPrint + this.level.print) | 0;
  }

  /** G65: local variables of its own, those not given null (facts sheet 12.1.7). */
  enterMacro(given: ReadonlyMap<number, Value>): void {
    this.levels.push({ numbers: new Map(given), names: new Map(), print: 0 });
  }

  /** An o-word call: its values become #1, #2 …, all others are still the caller's (12.2.2). */
  enterSubroutine(given: readonly Value[]): void {
    const numbers = new Map(this.level.numbers);
    given.slice(0, SUBROUTINE_LOCALS).forEach((value, index) => numbers.set(index + 1, value));
    this.levels.push({ numbers, names: new Map(), print: 0 });
  }

  /** The caller's own parameters are as they were. */
  leave(): void {
    if (this.levels.length > 1) this.levels.pop();
  }

  /** All that is stored, over the live parameters of another walk. */
  copy(live: ReadonlyMap<ParameterKey, LiveParameter>): ParameterStore {
    const copy = new ParameterStore(this.grammar, live, this.stated);
    for (const [number, value] of this.numbers) copy.numbers.set(number, value);
    for (const [name, value] of this.globals) copy.globals.set(name, value);
    copy.levels.length = 0;
    for (const { numbers, names, print } of this.levels)
      copy.levels.push({ numbers: new Map(numbers), names: new Map(names), print });
    copy.commonPrint = this.commonPrint;
    return copy;
  }

  private put(key: ParameterKey, value: Value): void {
    const isLocal = typeof key === 'number' ? key <= this.locals : !isGlobal(key);
    const before =
      typeof key === 'number' ? this.placeOf(key).get(key) : this.namesOf(key).get(key);
    const change = this.prints.of(key, value) - this.prints.of(key, before);
    if (isLocal) this.level.print = (this.level.print + change) | 0;
    else this.commonPrint = (this.commonPrint + change) | 0;
    if (typeof key === 'number') this.placeOf(key).set(key, value);
    else this.namesOf(key).set(key, value);
  }

  private get locals(): number {
    return this.grammar.isMacro ? MACRO_LOCALS : SUBROUTINE_LOCALS;
  }

  private get level(): Level {
    return this.levels[this.levels.length - 1]!;
  }

  private placeOf(number: number): Map<number, Value> {
    return number <= this.locals ? this.level.numbers : this.numbers;
  }

  private namesOf(name: string): Map<string, Value> {
    return isGlobal(name) ? this.globals : this.level.names;
  }

  private hasNumber(number: number): boolean {
    if (this.stated.has(number)) return true;
    if (this.grammar.isStrict) return 1 <= number && number <= HIGHEST_PUBLISHED;
    // Controllers of the published language number parameters of their own above its last.
    if (!this.grammar.isMacro) return 1 <= number && number <= HIGHEST_ANYWHERE;
    const isLocal = 0 <= number && number <= MACRO_LOCALS;
    return isLocal || (FIRST_COMMON <= number && number <= HIGHEST_ANYWHERE);
  }
}

/** Facts sheet 12.2.4: names with an underscore in front are the same in every subroutine. */
const isGlobal = (name: string): boolean => name.startsWith('_');

const outside = (number: number): Failure => ({
  reason: 'parameter-number',
  what: showParameter(number),
});

/** Nothing is known of it but where it stands. */
export const unknownValue = (key: ParameterKey): Value => ({
  ...EVERYTHING,
  of: showParameter(key),
});
