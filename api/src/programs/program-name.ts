const LONGEST = 200;

/**
 * What a program is called: the last part of the name its file came with, on whichever system that was.
 * Only ever shown and compared; it is never a path here.
 */
export function programName(fileName: string): string {
  const last = fileName.split(/[\\/]/).at(-1) ?? '';
  const shown = last
    .normalize('NFC')
    .replaceAll(/\p{Cc}|\p{Cf}/gu, '')
    .trim();
  return cutTo(LONGEST, shown) || 'unnamed';
}

/** Cut between characters, never within one. */
function cutTo(length: number, text: string): string {
  return [...text].slice(0, length).join('');
}
