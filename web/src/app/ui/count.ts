const NARROW_SPACE = '\u202f';

/** A whole number with its thousands parted by a thin space, as a program's line count needs. */
export function formatCount(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+(?!\d))/g, NARROW_SPACE);
}

/** `1 line`, `58 025 lines`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${formatCount(count)} ${count === 1 ? one : many}`;
}

/** Bytes as a person reads them: `812 B`, `24.8 MB`. */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  if (bytes < 999_500) return `${Math.round(bytes / 1000)} kB`;
  return `${(bytes / 1e6).toFixed(1).replace(/\.0$/, '')} MB`;
}
