/** Running or elapsed time in words short enough for a table: `0.31 s`, `48 s`, `12 min`, `1 h 12 min`. */
export function formatDuration(seconds: number | null | undefined): string {
  if (seconds === null || seconds === undefined || !Number.isFinite(seconds)) return '–';
  if (seconds < 10) return `${Number(seconds.toFixed(2))} s`;
  if (seconds < 59.5) return `${Math.round(seconds)} s`;
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return `${minutes} min`;
  const rest = String(minutes % 60).padStart(2, '0');
  return `${Math.floor(minutes / 60)} h ${rest} min`;
}

/** A moment as the shop says it: `18:42` today, else `30 Nov, 18:42`, with the year when another. */
export function formatMoment(iso: string | null | undefined, now: Date): string {
  if (!iso) return '–';
  const at = new Date(iso);
  if (Number.isNaN(at.getTime())) return '–';
  const clock = `${two(at.getHours())}:${two(at.getMinutes())}`;
  if (at.toDateString() === now.toDateString()) return clock;
  const day = `${at.getDate()} ${MONTHS[at.getMonth()]}`;
  const year = at.getFullYear() === now.getFullYear() ? '' : ` ${at.getFullYear()}`;
  return `${day}${year}, ${clock}`;
}

/** `Tuesday 1 December`. */
export function longDay(at: Date): string {
  return `${DAYS[at.getDay()]} ${at.getDate()} ${LONG_MONTHS[at.getMonth()]}`;
}

/** Seconds between two moments, or null while either is missing. */
export function secondsBetween(from: string | null, to: string | null): number | null {
  if (!from || !to) return null;
  return (new Date(to).getTime() - new Date(from).getTime()) / 1000;
}

const DAYS = [
  'Sunday',
  'Monday',
  'Tuesday',
  'Wednesday',
  'Thursday',
  'Friday',
  'Saturday',
] as const;
const LONG_MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;
const MONTHS = [
  'Jan',
  'Feb',
  'Mar',
  'Apr',
  'May',
  'Jun',
  'Jul',
  'Aug',
  'Sep',
  'Oct',
  'Nov',
  'Dec',
] as const;
const two = (value: number): string => String(value).padStart(2, '0');
