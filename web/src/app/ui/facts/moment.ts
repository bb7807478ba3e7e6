/** A moment as a date-and-time field of the browser shows it: local time, to the minute. */
export function showMoment(stored: string): string {
  const moment = new Date(stored);
  if (Number.isNaN(moment.getTime())) return '';
  const two = (figure: number) => String(figure).padStart(2, '0');
  const day = `${moment.getFullYear()}-${two(moment.getMonth() + 1)}-${two(moment.getDate())}`;
  return `${day}T${two(moment.getHours())}:${two(moment.getMinutes())}`;
}

/** The moment as it is stored, or undefined when the field holds none. */
export function readMoment(shown: string): string | undefined {
  const moment = new Date(shown);
  return Number.isNaN(moment.getTime()) ? undefined : moment.toISOString();
}
