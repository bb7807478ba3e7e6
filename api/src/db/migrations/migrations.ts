import { createShopsAndPeople } from './20261201-0900-create-shops-and-people';
import { createMachinesAndTools } from './20261201-0910-create-machines-and-tools';
import { createPrograms } from './20261201-0920-create-programs';
import { createChecks } from './20261201-0930-create-checks';
import { createAuditTrail } from './20261201-0940-create-audit-trail';
import { addFindingAssumptions } from './20261201-1200-add-finding-assumptions';
import type { Migration } from './migration';

/** Every migration, oldest first. A list, not a folder read at run time, so that it survives bundling. */
export const MIGRATIONS: readonly Migration[] = [
  createShopsAndPeople,
  createMachinesAndTools,
  createPrograms,
  createChecks,
  createAuditTrail,
  addFindingAssumptions,
];
