import type { Bench } from '#contracts';

/** What a spindle holds, said so that nobody takes "unknown" for "nothing". */
export function spindleInWords(inSpindle: Bench['machines'][number]['inSpindle']): string {
  if (inSpindle === 'unknown') return 'not known: look';
  return inSpindle === null ? 'nothing' : `T${inSpindle}`;
}
