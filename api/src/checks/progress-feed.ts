import type { CheckProgress } from '#contracts';
import { listenForProgress } from '../db/progress-channel';
import type { Logger } from '../http/request-log';

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
  stop(): Promise<void>;
}

/**
 * One connection that hears what the workers say about all checks, shared by every open stream. When it
 * broke and was made again, whoever listens is told to read the state anew: a notice is not kept for
 * those who are away.
 */
export async function openProgressFeed(url: string, logger: Logger): Promise<ProgressFeed> {
  const listeners = new Map<string, Set<Listener>>();
  const everyone = () => [...listeners.values()].flatMap((ofShop) => [...ofShop]);
  const channel = await listenForProgress({
    url,
    onProgress: ({ shopId, ...progress }) => {
      for (const each of listeners.get(shopId) ?? []) each.progress(progress);
    },
    onError: (error) => logger.warn({ err: error }, 'the progress connection has a fault'),
    onReconnect: () => {
      for (const each of everyone()) each.missed();
    },
  });
  return {
    listen: (shopId, listener) => {
      const ofShop = listeners.get(shopId) ?? new Set<Listener>();
      listeners.set(shopId, ofShop.add(listener));
      return () => {
        ofShop.delete(listener);
        if (ofShop.size === 0 && listeners.get(shopId) === ofShop) listeners.delete(shopId);
      };
    },
    stop: async () => {
      for (const each of everyone()) each.ending();
      await channel.stop();
    },
  };
}
