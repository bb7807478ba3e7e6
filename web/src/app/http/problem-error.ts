import { HttpErrorResponse } from '@angular/common/http';
import type { Problem } from '#contracts';
import { problemSchema } from '#contracts';

/** What went wrong with a request, in sentences a person can act on. */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';
  constructor(readonly problem: Problem) {
    super(problem.detail);
  }
  /** HTTP status; 0 when the server did not answer at all. */
  get status(): number {
    return this.problem.status;
  }
  get code(): string {
    return this.problem.code;
  }
  /** What the person can do, when the server says. */
  get next(): string | undefined {
    return this.problem.next;
  }
  /** The message for one wrong field, by its path as sent (`email`, `tool.diameter`). */
  field(path: string): string | undefined {
    return this.problem.fields?.find((each) => each.path === path)?.message;
  }
}

/** Any failure as a ProblemError: the server's own RFC 9457 body, or words for what is not one. */
export function toProblemError(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  if (!(error instanceof HttpErrorResponse)) {
    return made(0, 'client-fault', 'Something failed in this page.', 'Reload the page.');
  }
  const body = problemSchema.safeParse(readBody(error.error));
  if (body.success) return new ProblemError(body.data);
  if (error.status === 0) {
    return made(
      0,
      'no-answer',
      'The server did not answer.',
      'Check that it runs and that this computer reaches it, then try again.',
    );
  }
  return made(
    error.status,
    'unreadable-answer',
    `The server answered ${error.status} without saying why.`,
    'Try again; if it stays so, tell whoever keeps the server.',
  );
}

/** Words for an answer that came but is not what the contract says. */
export function unexpectedReply(): ProblemError {
  return made(
    200,
    'unexpected-reply',
    'The server’s answer does not have the agreed form.',
    'The page may be older than the server: reload it.',
  );
}

/** A body that was asked for as text or a blob arrives unparsed on errors. */
function readBody(body: unknown): unknown {
  if (typeof body !== 'string') return body;
  try {
    return JSON.parse(body) as unknown;
  } catch {
    // Not JSON: the caller words it by its status.
    return null;
  }
}

function made(status: number, code: string, detail: string, next: string): ProblemError {
  return new ProblemError({ type: 'about:blank', title: detail, status, detail, code, next });
}
