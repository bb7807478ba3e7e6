import pg from 'pg';
import { z } from 'zod';
import { checkProgressSchema, type CheckProgress } from '#contracts';
import type { Logger } from '../http/request-log';

const CHANNEL = 'check_progress';
const noticeSchema = checkProgressSchema.extend({ shopId: z.uuid() });

/** Waits between attempts to reach the database again, milliseconds; the last one is kept to. */
const RETRY_AFTER = [250, 500, 1_000, 2_000, 5_000] as const;

export interface Listener {
  progress(progress: CheckProgress): void;
  /** Notices may have been missed: read the state again. */
  missed(): void;
  /** The server is stopping: no further notice will come. */
  ending(): void;
}

export interface ProgressFeed {
  /** Hears every notice of one shop until the function returned is called. */
  listen(shopId: string, listener: Listener): () => void;
  /** Settles once notices arrive. */
  readonly ready: Promise<void>;
  stop(): Promise<void>;
}

/**
 * One connection that hears what the workers say about all checks, shared by every open stream. It is
 * made again whenever it breaks; whoever listens is then told to read the state anew, for a notice is
 * not kept for those who are away.
 */
export function openProgressFeed(databaseUrl: string, logger: Logger): ProgressFeed {
  const listeners = new Map<string, Set<Listener>>();
  let stopped = false;
  let client: pg.Client | undefined;
  let retry: NodeJS.Timeout | undefined;
  let attempt = 0;
  let markReady: () => void = () => undefined;
  const ready = new Promise<void>((resolve) => (markReady = resolve));

  const tellMissed = () => {
    for (const ofShop of listeners.values()) for (const each of ofShop) each.missed();
  };
  const connect = async (): Promise<void> => {
    const next = new pg.Client({ connectionString: databaseUrl, keepAlive: true });
    next.on('notification', ({ payload }) => pass(payload ?? '', listeners, logger));
    next.on('error', (error) => logger.warn({ err: error }, 'the progress connection failed'));
    next.once('end', connectLater);
    client = next;
    try {
      await next.connect();
      await next.query(`listen ${CHANNEL}`);
      if (0 < attempt) tellMissed();
      attempt = 0;
      markReady();
    } catch (error) {
      logger.warn({ err: error }, 'the progress connection could not be made; trying again');
      connectLater();
    }
  };
  const connectLater = () => {
    if (stopped || retry) return;
    const wait = RETRY_AFTER[Math.min(attempt, RETRY_AFTER.length - 1)];
    attempt += 1;
    retry = setTimeout(() => {
      retry = undefined;
      void connect();
    }, wait);
  };

  void connect();
  return {
    ready,
    listen: (shopId, listener) => {
      const ofShop = listeners.get(shopId) ?? new Set<Listener>();
      listeners.set(shopId, ofShop.add(listener));
      return () => {
        ofShop.delete(listener);
        if (ofShop.size === 0 && listeners.get(shopId) === ofShop) listeners.delete(shopId);
      };
    },
    stop: async () => {
      stopped = true;
      clearTimeout(retry);
      for (const ofShop of listeners.values()) for (const each of [...ofShop]) each.ending();
      await client?.end();
    },
  };
}

function pass(
  payload: string,
  listeners: ReadonlyMap<string, ReadonlySet<Listener>>,
  logger: Logger,
): void {
  const notice = readNotice(payload);
  if (!notice) {
    logger.warn({ payload }, 'a notice on the progress channel is not of its form');
    return;
  }
  const { shopId, ...progress } = notice;
  for (const each of listeners.get(shopId) ?? []) each.progress(progress);
}

function readNotice(payload: string): z.output<typeof noticeSchema> | undefined {
  try {
    const read = noticeSchema.safeParse(JSON.parse(payload));
    return read.success ? read.data : undefined;
  } catch (error) {
    if (error instanceof SyntaxError) return undefined;
    throw error;
  }
}
