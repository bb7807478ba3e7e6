import type { Sequelize } from 'sequelize';
import { bindAudit } from './audit-event';
import { bindChecks } from './checks';
import { bindMachines } from './machines';
import { bindPeople } from './people';
import { bindPrograms } from './programs';
import { bindTools } from './tools';

/** Every table of the schema as a model of this connection. The migrations own the schema. */
export function bindModels(sequelize: Sequelize) {
  return {
    ...bindPeople(sequelize),
    ...bindMachines(sequelize),
    ...bindTools(sequelize),
    ...bindPrograms(sequelize),
    ...bindChecks(sequelize),
    ...bindAudit(sequelize),
  };
}
export type Models = ReturnType<typeof bindModels>;
