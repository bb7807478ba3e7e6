import { randomUUID } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';
import pino from 'pino';
import { pinoHttp } from 'pino-http';
import type { LogLevel } from '../config';

export type Logger = pino.Logger;

/** What must never reach a log line, wherever it turns up. */
const SECRETS = [
  'req.headers.cookie',
  'req.headers.authorization',
  'req.headers["x-xsrf-token"]',
  'res.headers["set-cookie"]',
  '*.password',
  '*.token',
  '*.databaseUrl',
];

export function openLog(level: LogLevel, destination?: pino.DestinationStream): Logger {
  const options = { level, redact: { paths: SECRETS, censor: '(secret)' } };
  return destination ? pino(options, destination) : pino(options);
}

/**
 * Gives every request an id of our own, sent back as X-Request-Id and named in every problem, and
 * writes one line a reply. Ids sent by a client are not taken over: they could forge log lines.
 */
export function logRequests(logger: Logger): RequestHandler {
  const handler = pinoHttp({
    logger,
    genReqId: (_request, response) => {
      const id = randomUUID();
      response.setHeader('X-Request-Id', id);
      return id;
    },
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        url: request.url,
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    autoLogging: { ignore: isHeartbeat },
    customLogLevel: (_request, response, error) => {
      if (error || 500 <= response.statusCode) return 'error';
      return 'info';
    },
  });
  return handler as RequestHandler;
}

function isHeartbeat(request: IncomingMessage): boolean {
  return request.url === '/health' || request.url === '/ready';
}

/** The id that logRequests gave the request. */
export function requestIdOf(request: IncomingMessage): string {
  return String(request.id ?? '');
}
