import type { StoreContext } from '../store-context';
import { openAuditStore } from './audit-store';
import { openCheckStore } from './check-store';
import { openMachineStore } from './machine-store';
import { openPeopleStore } from './people-store';
import { openProgramStore } from './program-store';
import { openSessionStore } from './session-store';
import { openShopStore } from './shop-store';
import { openToolStore } from './tool-store';

/** Everything the shop can be asked; each store's methods are scoped to one shop. */
export function openStores(ctx: StoreContext) {
  return {
    shops: openShopStore(ctx),
    people: openPeopleStore(ctx),
    sessions: openSessionStore(ctx),
    machines: openMachineStore(ctx),
    tools: openToolStore(ctx),
    programs: openProgramStore(ctx),
    checks: openCheckStore(ctx),
    audit: openAuditStore(ctx),
  };
}
export type Stores = ReturnType<typeof openStores>;
