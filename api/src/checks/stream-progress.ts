import type { Request, Response } from 'express';
import type { CheckProgress, CheckState } from '#contracts';
import type { Dependencies } from '../dependencies';
import { openEventStream } from '../http/event-stream';
import { notFound } from '../http/problems';

interface Exchange {
  readonly request: Request;
  readonly response: Response;
}

/**
 * Streams one check until it is done or has failed. It listens before it reads the state, so that nothing
 * falls between the two, and sends nothing once the check has ended.
 */
export async function streamCheck(
  deps: Dependencies,
  { shopId, checkId }: { readonly shopId: string; readonly checkId: string },
  { request, response }: Exchange,
): Promise<void> {
  const { checks } = deps.database.stores;
  const first = await checks.progress(shopId, checkId);
  if (!first) throw notFound('check');
  const stream = openEventStream(request, response);
  let last: CheckProgress | undefined;
  const send = (progress: CheckProgress | undefined) => {
    if (progress?.checkId !== checkId || (last && !isNews(progress, last))) return;
    last = progress;
    stream.send(progress);
    if (isFinal(progress.state)) stream.close();
  };
  const readAgain = () => {
    checks.progress(shopId, checkId).then(send, (error: unknown) => {
      deps.logger.warn({ err: error, checkId }, 'the state of a check could not be read');
    });
  };
  const stop = deps.feed.listen(shopId, {
    progress: send,
    missed: readAgain,
    ending: stream.close,
  });
  try {
    const now = await checks.progress(shopId, checkId);
    if (!last) send(now);
    await stream.closed;
  } finally {
    stop();
  }
}

/**
 * Streams the whole shop: first every check still under way, then whatever the workers say. After a
 * break of the progress connection a page is told to begin again by ending the stream: it reconnects.
 */
export async function streamShop(
  deps: Dependencies,
  shopId: string,
  { request, response }: Exchange,
): Promise<void> {
  const stream = openEventStream(request, response);
  const stop = deps.feed.listen(shopId, {
    progress: (progress) => stream.send(progress),
    missed: stream.close,
    ending: stream.close,
  });
  try {
    for (const progress of await underWay(deps, shopId)) stream.send(progress);
    await stream.closed;
  } finally {
    stop();
  }
}

async function underWay(deps: Dependencies, shopId: string): Promise<CheckProgress[]> {
  const { checks } = await deps.database.stores.checks.bench(shopId);
  return checks
    .filter((check) => !isFinal(check.state))
    .map(({ id, state, linesRead, lines, verdict }) => ({
      checkId: id,
      state,
      linesRead,
      lines,
      verdict,
    }));
}

/**
 * Whether `next` says something after `last`. A check given back by a worker, or taken up again after a
 * killed one, counts from the start: that is news too. Only the end is final.
 */
function isNews(next: CheckProgress, last: CheckProgress): boolean {
  return !isFinal(last.state) && (next.state !== last.state || next.linesRead !== last.linesRead);
}

function isFinal(state: CheckState): boolean {
  return state === 'done' || state === 'failed';
}
