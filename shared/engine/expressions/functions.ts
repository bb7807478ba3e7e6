import type { FunctionName } from './expression';
import type { Grammar } from './grammar';
import * as ranges from './interval';
import type { Interval } from './interval';

/** Why a value could not be worked out; each has a sentence of its own. */
export type Reason =
  | 'division'
  | 'power'
  | 'domain'
  | 'too-large'
  | 'not-whole'
  | 'parameter-number'
  | 'never-set'
  | 'read-only'
  /** The controller's own parameter, which no program may set or this check does not follow. */
  | 'system'
  /** Known only within bounds where one value is needed. */
  | 'unknown';

const radians = (degrees: number): number => (degrees * Math.PI) / 180;
const degrees = (angle: number): number => (angle * 180) / Math.PI;

/** Half away from nought (facts sheet 10.3). */
export const roundHalfAway = (value: number): number =>
  Math.sign(value) * Math.round(Math.abs(value));

/** FIX and FUP: down and up in the published language, toward and away from nought in macro dialects. */
const fix = (value: number, isMacro: boolean): number =>
  isMacro ? Math.trunc(value) : Math.floor(value);
const fup = (value: number, isMacro: boolean): number =>
  isMacro ? Math.sign(value) * Math.ceil(Math.abs(value)) : Math.ceil(value);

/** A function of one number; angles in degrees (NISTIR 6556 3.2.2.4). */
export function functionOf(
  name: FunctionName,
  value: number,
  { isMacro }: Grammar,
): number | Reason {
  switch (name) {
    case 'ABS':
      return Math.abs(value);
    case 'ACOS':
      return Math.abs(value) <= 1 ? degrees(Math.acos(value)) : 'domain';
    case 'ASIN':
      return Math.abs(value) <= 1 ? degrees(Math.asin(value)) : 'domain';
    case 'ATAN':
      return degrees(Math.atan(value));
    case 'BCD':
      return toCoded(value);
    case 'BIN':
      return fromCoded(value);
    case 'COS':
      return Math.cos(radians(value));
    case 'EXP':
      return Math.exp(value);
    case 'FIX':
      return fix(value, isMacro);
    case 'FUP':
      return fup(value, isMacro);
    case 'LN':
      return value > 0 ? Math.log(value) : 'domain';
    case 'ROUND':
      return roundHalfAway(value);
    case 'SIN':
      return Math.sin(radians(value));
    case 'SQRT':
      return value >= 0 ? Math.sqrt(value) : 'domain';
    case 'TAN':
      return Math.tan(radians(value));
  }
}

/** All that a function may give over an interval; a reason when it gives nothing anywhere in it. */
export function functionOver(
  name: FunctionName,
  over: Interval,
  { isMacro }: Grammar,
): Interval | Reason {
  const { least, greatest } = over;
  switch (name) {
    case 'ABS': {
      const ends = [Math.abs(least), Math.abs(greatest)];
      return ranges.hull(ranges.holds(over, 0) ? [...ends, 0] : ends);
    }
    case 'ACOS':
      if (least > 1 || greatest < -1) return 'domain';
      return ranges.outward(
        degrees(Math.acos(Math.min(greatest, 1))),
        degrees(Math.acos(Math.max(least, -1))),
      );
    case 'ASIN':
      if (least > 1 || greatest < -1) return 'domain';
      return ranges.outward(
        degrees(Math.asin(Math.max(least, -1))),
        degrees(Math.asin(Math.min(greatest, 1))),
      );
    case 'ATAN':
      return ranges.outward(degrees(Math.atan(least)), degrees(Math.atan(greatest)));
    case 'BCD':
    case 'BIN':
      if (roundHalfAway(greatest) < 0) return 'domain';
      return { least: 0, greatest: name === 'BCD' ? MOST_CODED_BITS : MOST_CODED };
    case 'COS':
      return ranges.sine(over, 90);
    case 'EXP':
      return ranges.outward(Math.exp(least), Math.exp(greatest));
    case 'FIX':
      return ranges.interval(fix(least, isMacro), fix(greatest, isMacro));
    case 'FUP':
      return ranges.interval(fup(least, isMacro), fup(greatest, isMacro));
    case 'LN':
      if (greatest <= 0) return 'domain';
      return ranges.outward(least <= 0 ? -Infinity : Math.log(least), Math.log(greatest));
    case 'ROUND':
      return ranges.interval(roundHalfAway(least), roundHalfAway(greatest));
    case 'SIN':
      return ranges.sine(over, 0);
    case 'SQRT':
      if (greatest < 0) return 'domain';
      return ranges.interval(Math.sqrt(Math.max(least, 0)), Math.sqrt(greatest));
    case 'TAN':
      return ranges.tangent(over);
  }
}

/** Eight decimal digits, four bits each. */
const MOST_CODED = 99_999_999;
const MOST_CODED_BITS = 0x99999999;
const CODED_BASE = 16;

/** BCD: a whole number as its decimal digits, four bits each. */
function toCoded(value: number): number | Reason {
  const whole = roundHalfAway(value);
  if (!(0 <= whole && whole <= MOST_CODED)) return 'domain';
  return Number.parseInt(whole.toFixed(0), CODED_BASE);
}

/** BIN: the other way round. */
function fromCoded(value: number): number | Reason {
  const whole = roundHalfAway(value);
  if (!(0 <= whole && whole <= MOST_CODED_BITS)) return 'domain';
  const digits = whole.toString(CODED_BASE);
  return /^\d+$/.test(digits) ? Number(digits) : 'domain';
}
