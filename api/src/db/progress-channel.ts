import { Client } from 'pg';
import { z } from 'zod';
import { checkProgressSchema, type CheckProgress } from '#contracts';
import { select, type StoreContext } from './store-context';

const CHANNEL = 'check_progress';
/** After a lost connection: long enough not to hammer a server that restarts, short enough not to be noticed. */
const RECONNECT_MS = 1000;

/** What travels: the progress of a check, and whose it is. */
export type ShopProgress = CheckProgress & { readonly shopId: string };

/** Tells every listening process; inside a transaction it is delivered when that commits. */
export async function announce(ctx: StoreContext, progress: ShopProgress): Promise<void> {
  await select(ctx, 'select pg_notify(:channel, :payload)', {
    channel: CHANNEL,
    payload: JSON.stringify(progress),
  });
}

export interface ProgressListener {
  readonly url: string;
  readonly onProgress: (progress: ShopProgress) => void;
  /** A lost connection; listening goes on by itself. What was told meanwhile is missed: clients poll. */
  readonly onError: (error: Error) => void;
  /** Listening goes on after a lost connection: whoever must not miss anything reads the state again. */
  readonly onReconnect?: () => void;
}

const noticeSchema = checkProgressSchema.extend({ shopId: z.uuid() });

/** Listens on a connection of its own, and again on a new one when that is lost, until stopped. */
export async function listenForProgress(
  options: ProgressListener,
): Promise<{ stop(): Promise<void> }> {
  let client = await listen(options, reconnect);
  let isStopped = false;
  let timer: NodeJS.Timeout | undefined;

  function reconnect(error: Error): void {
    if (isStopped) return;
    options.onError(error);
    timer = setTimeout(() => {
      listen(options, reconnect).then((next) => {
        client = next;
        if (isStopped) void next.end();
        else options.onReconnect?.();
      }, reconnect);
    }, RECONNECT_MS);
  }
  return {
    async stop() {
      isStopped = true;
      clearTimeout(timer);
      await client.end();
    },
  };
}

async function listen(
  { url, onProgress, onError }: ProgressListener,
  onLost: (error: Error) => void,
): Promise<Client> {
  const client = new Client({ connectionString: url, application_name: 'nightlatch-progress' });
  let isLost = false;
  const lose = (error: Error): void => {
    if (isLost) return;
    isLost = true;
    void client.end().catch(() => undefined);
    onLost(error);
  };
  await client.connect();
  client.on('error', lose);
  client.on('end', () => lose(new Error('The connection that listens for progress was closed.')));
  client.on('notification', ({ payload }) => {
    const progress = readNotice(payload ?? '');
    if (progress) onProgress(progress);
    else onError(new Error('A notice on the progress channel is not of its form.'));
  });
  await client.query(`listen ${CHANNEL}`);
  return client;
}

/** Anyone who reaches the database can write to the channel: what is not ours must not end the process. */
function readNotice(payload: string): ShopProgress | undefined {
  try {
    return noticeSchema.safeParse(JSON.parse(payload)).data;
  } catch (error) {
    if (error instanceof SyntaxError) return undefined;
    throw error;
  }
}
