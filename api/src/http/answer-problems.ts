import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express';
import { StoreRefusal } from '../db/store-refusal';
import { problemDocument, Refusal, refuse } from './problems';
import { requestIdOf, type Logger } from './request-log';
import { refusalOfStore } from './store-refusals';

/** The last stop of every request that went wrong: an RFC 9457 document, never a stack. */
export function answerProblems(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, _next) => {
    const refusal = asRefusal(error);
    if (refusal.code === 'our-fault') {
      logger.error({ err: error, requestId: requestIdOf(request) }, 'a request failed');
    }
    // Once bytes are on their way the only honest sign is a broken connection.
    if (response.headersSent) {
      response.destroy();
      return;
    }
    sendProblem(refusal, request, response);
  };
}

/** No route of ours: the same document as for everything else that is refused. */
export const answerUnknownRoute: RequestHandler = (request) => {
  throw refuse('not-found', `Nothing answers to ${request.method} ${request.path}.`, {
    next: 'The reference at /api/v1/reference lists every route.',
  });
};

function sendProblem(refusal: Refusal, request: Request, response: Response): void {
  const document = problemDocument(refusal, {
    instance: request.originalUrl.split('?')[0] ?? request.originalUrl,
    requestId: requestIdOf(request),
  });
  if (refusal.more.retryAfter !== undefined) {
    response.setHeader('Retry-After', String(Math.ceil(refusal.more.retryAfter)));
  }
  response.status(document.status);
  response.setHeader('Cache-Control', 'no-store');
  response.type('application/problem+json').send(JSON.stringify(document));
}

function asRefusal(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  if (error instanceof StoreRefusal) return refusalOfStore(error);
  return bodyRefusal(error) ?? refuse('our-fault', 'The request could not be carried out.');
}

/** What Express's own body reader and path decoder throw, told by their documented `type`. */
function bodyRefusal(error: unknown): Refusal | undefined {
  if (!(error instanceof Error)) return undefined;
  const { type, limit, status } = error as Error & {
    type?: unknown;
    limit?: unknown;
    status?: unknown;
  };
  switch (type) {
    case 'entity.parse.failed':
      return refuse('unreadable-body', `The request is not JSON: ${error.message}.`);
    case 'entity.too.large':
      return refuse(
        'too-large',
        `The request is larger than the ${String(limit)} bytes allowed here.`,
      );
    case 'request.aborted':
    case 'request.size.invalid':
      return refuse('unreadable-body', 'The request broke off before it was complete.');
    case 'encoding.unsupported':
    case 'charset.unsupported':
      return refuse(
        'unreadable-body',
        'The request is in an encoding that is not read: use UTF-8.',
      );
    default:
      if (error instanceof URIError || status === 400) {
        return refuse('unreadable-body', 'The address of the request cannot be read.');
      }
      return undefined;
  }
}
