import { Client } from 'pg';
import { claimKey } from './stores/check-runs';

/** A check that this process alone works on. */
export interface CheckClaim {
  /** Aborted when the connection that holds the claim is lost: another worker may begin. */
  readonly lost: AbortSignal;
  release(): Promise<void>;
}

/**
 * Claims a check by an advisory lock on a connection of its own. The server drops the lock the moment
 * the process or the connection dies, so a claim never outlives its worker and needs no lease time.
 * Undefined: somebody holds it.
 */
export async function claimCheck(url: string, checkId: string): Promise<CheckClaim | undefined> {
  const client = new Client({ connectionString: url, application_name: 'nightlatch-claim' });
  const lost = new AbortController();
  client.on('error', (error) => lost.abort(error));
  await client.connect();
  const { rows } = await client.query<{ mine: boolean }>(
    'select pg_try_advisory_lock(hashtextextended($1, 0)) as mine',
    [claimKey(checkId)],
  );
  if (!rows[0]?.mine) {
    await client.end();
    return undefined;
  }
  client.on('end', () => lost.abort(new Error('The connection holding the claim was closed.')));
  return { lost: lost.signal, release: () => client.end() };
}
