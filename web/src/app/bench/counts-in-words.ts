import type { CheckRecord } from '#contracts';
import { counted } from '../ui/count';

/** `3 stops, 1 hold, 2 notes`; "no findings" when there are none, '' while not known. */
export function countsInWords(counts: CheckRecord['counts']): string {
  if (!counts) return '';
  const parts = [
    counts.stop ? counted(counts.stop, 'stop') : '',
    counts.hold ? counted(counts.hold, 'hold') : '',
    counts.note ? counted(counts.note, 'note') : '',
  ].filter(Boolean);
  return parts.length ? parts.join(', ') : 'no findings';
}
