const NARROW_SPACE = '\u202f';

/** A whole number with its thousands parted by a thin space, as a program's line count needs. */
export function formatCount(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+(?!\d))/g, NARROW_SPACE);
}

/** `1 line`, `58 025 lines`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${formatCount(count)} ${count === 1 ? one : many}`;
}

/** Bytes as a person reads them, in binary steps as the upload limit is set: `812 B`, `24.8 MB`. */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} B`;
  const kilo = bytes / 1024;
  if (kilo < 999.5) return `${Math.max(1, Math.round(kilo))} kB`;
  return `${(kilo / 1024).toFixed(1).replace(/\.0$/, '')} MB`;
}
