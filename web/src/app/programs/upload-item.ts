import type { UploadResult } from '#contracts';
import type { ProblemError } from '../http/problem-error';
import { formatBytes } from '../ui/count';

type Stored = Extract<UploadResult['files'][number], { outcome: 'stored' }>;

/** Where one chosen file stands on its way into the shop. */
export type UploadState =
  | { readonly step: 'waiting' }
  | { readonly step: 'sending'; readonly sent: number }
  /** All bytes are out; the server still stores them. */
  | { readonly step: 'storing' }
  | { readonly step: 'stored'; readonly stored: Stored }
  /** The file itself is not taken: sending it again would change nothing. */
  | { readonly step: 'refused'; readonly reason: string; readonly next: string }
  /** The way was broken: the same file may be sent again. */
  | { readonly step: 'failed'; readonly reason: string; readonly next: string };

export interface UploadItem {
  readonly id: number;
  readonly name: string;
  readonly bytes: number;
  readonly machineId: string;
  readonly state: UploadState;
}

/** Why a file need not be sent at all, or null. The server holds the same limit against every byte. */
export function refusalBeforehand(
  file: { readonly name: string; readonly size: number },
  limitBytes: number,
): Extract<UploadState, { step: 'refused' }> | null {
  if (file.size <= limitBytes) return null;
  return {
    step: 'refused',
    reason: `${formatBytes(file.size)} is more than the shop takes (${formatBytes(limitBytes)}).`,
    next: 'Post it in parts, or ask the lead to raise the limit under Shop, Settings.',
  };
}

/** The state that the server's answer for one file puts it in. */
export function stateOfAnswer(answer: UploadResult): UploadState {
  const [file] = answer.files;
  if (!file) {
    return {
      step: 'failed',
      reason: 'The server did not mention this file.',
      next: 'Send it again.',
    };
  }
  if (file.outcome === 'stored') return { step: 'stored', stored: file };
  return { step: 'refused', reason: file.reason, next: file.next };
}

export function stateOfProblem(problem: ProblemError): UploadState {
  return {
    step: problem.status === 413 ? 'refused' : 'failed',
    reason: problem.message,
    next: problem.next ?? 'Send it again.',
  };
}

/** Per cent sent; null while there is nothing to count. */
export function percentSent(item: UploadItem): number | null {
  if (item.state.step !== 'sending' || item.bytes === 0) return null;
  return Math.min(100, Math.round((100 * item.state.sent) / item.bytes));
}

export function isUnderWay(item: UploadItem): boolean {
  return ['waiting', 'sending', 'storing'].includes(item.state.step);
}
