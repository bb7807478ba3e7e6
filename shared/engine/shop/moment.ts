/**
 * Seconds since 1970-01-01T00:00:00Z of an ISO 8601 moment with an offset, such as
 * 2026-12-01T18:00:00Z; NaN for anything else. The engine has no clock and no runtime to ask.
 */
export function secondsOf(moment: string): number {
  const parts = MOMENT.exec(moment);
  if (!parts) return NaN;
  const [, year, month, day, hour, minute, second, sign, offsetHours, offsetMinutes] = parts;
  const days = daysSinceEpoch(Number(year), Number(month), Number(day));
  const offset = Number(offsetHours ?? 0) * 60 + Number(offsetMinutes ?? 0);
  const minutes = Number(hour) * 60 + Number(minute) - (sign === '-' ? -offset : offset);
  return days * SECONDS_A_DAY + minutes * 60 + Number(second ?? 0);
}

export const SECONDS_A_DAY = 86_400;
const MOMENT =
  /^(\d{4})-(\d{2})-(\d{2})[Tt](\d{2}):(\d{2})(?::(\d{2}(?:\.\d+)?))?(?:[Zz]|([+-])(\d{2}):?(\d{2}))$/;
/** Days from 0000-03-01 to 1970-01-01 in the proleptic Gregorian calendar. */
const EPOCH = 719_468;
const DAYS_A_CYCLE = 146_097;

/** Counts years from March, so that the leap day is a year's last. */
function daysSinceEpoch(year: number, month: number, day: number): number {
  const y = month <= 2 ? year - 1 : year;
  const cycle = Math.floor(y / 400);
  const yearOfCycle = y - cycle * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + day - 1;
  const dayOfCycle =
    yearOfCycle * 365 + Math.floor(yearOfCycle / 4) - Math.floor(yearOfCycle / 100) + dayOfYear;
  return cycle * DAYS_A_CYCLE + dayOfCycle - EPOCH;
}
