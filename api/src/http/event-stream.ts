import type { Request, Response } from 'express';

/** Often enough that no proxy takes a quiet stream for a dead one. */
const HEARTBEAT_MILLISECONDS = 15_000;

export interface EventStream {
  /** One event; `data` goes out as JSON. */
  send(data: unknown): void;
  /** Ends the stream from our side. */
  close(): void;
  /** Settles once either side has ended it. */
  readonly closed: Promise<void>;
}

/** Begins a stream of server-sent events with a heartbeat comment that keeps it open. */
export function openEventStream(request: Request, response: Response): EventStream {
  response.status(200);
  response.setHeader('Content-Type', 'text/event-stream');
  response.setHeader('Cache-Control', 'no-store, no-transform');
  response.setHeader('X-Accel-Buffering', 'no');
  response.flushHeaders();
  response.write('retry: 2000\n\n');
  const heartbeat = setInterval(() => response.write(': still here\n\n'), HEARTBEAT_MILLISECONDS);
  const closed = new Promise<void>((resolve) => {
    const end = () => {
      clearInterval(heartbeat);
      resolve();
    };
    request.once('close', end);
    response.once('close', end);
    response.once('finish', end);
  });
  return {
    send: (data) => {
      if (!response.writableEnded) response.write(`data: ${JSON.stringify(data)}\n\n`);
    },
    close: () => response.end(),
    closed,
  };
}
