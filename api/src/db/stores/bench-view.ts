import type { Bench } from '#contracts';
import { select, type StoreContext } from '../store-context';
import { readStandingChecks } from './check-record';

/** Checks the bench lists; older ones are found on the Programs page. */
const CHECKS_LISTED = 50;

/** What needs somebody now: the checks that stand, how they stand, and the machines. */
export async function readBench(ctx: StoreContext, shopId: string): Promise<Bench> {
  const checks = await readStandingChecks(ctx, shopId);
  const count = (is: (check: (typeof checks)[number]) => boolean) => checks.filter(is).length;
  return {
    checks: checks.slice(0, CHECKS_LISTED),
    counts: {
      waiting: count(({ state }) => state === 'queued' || state === 'running'),
      stopped: count(({ verdict }) => verdict === 'stopped'),
      held: count(({ verdict }) => verdict === 'held'),
      clear: count(({ verdict }) => verdict === 'clear'),
      outOfDate: count(({ outOfDate }) => outOfDate),
    },
    machines: await readMachines(ctx, shopId),
  };
}

interface MachineColumns {
  readonly id: string;
  readonly name: string;
  readonly spindle: 'tool' | 'empty' | 'unknown';
  readonly spindleTool: number | null;
  readonly loaded: number;
  readonly pockets: number;
  readonly lastLoading: Date;
}

async function readMachines(ctx: StoreContext, shopId: string): Promise<Bench['machines']> {
  const rows = await select<MachineColumns>(
    ctx,
    `select machine.id, machine.name, loading.spindle, loading.spindle_tool as "spindleTool",
       loading.made_at as "lastLoading",
       (select count(*)::int from pocket where rack_revision_id = rack.id) as pockets,
       (select count(*)::int from loading_pocket where loading_revision_id = loading.id) as loaded
     from machine
     cross join lateral (select id from rack_revision where machine_id = machine.id
       order by number desc limit 1) rack
     cross join lateral (select * from loading_revision where machine_id = machine.id
       order by number desc limit 1) loading
     where machine.shop_id = :shopId
     order by machine.name`,
    { shopId },
  );
  return rows.map(({ spindle, spindleTool, lastLoading, ...machine }) => ({
    ...machine,
    inSpindle: { tool: spindleTool, empty: null, unknown: 'unknown' as const }[spindle],
    lastLoading: lastLoading.toISOString(),
  }));
}
