import {
  Model,
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  type Sequelize,
} from 'sequelize';
import type { ValidSetup } from '#contracts';
import * as column from './columns';
import { revisionColumns } from './people';

type Rack = ValidSetup['rack'];

export class MachineRow extends Model<
  InferAttributes<MachineRow>,
  InferCreationAttributes<MachineRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare name: string;
  declare createdAt: CreationOptional<Date>;
}
export class MachineRevisionRow extends Model<
  InferAttributes<MachineRevisionRow>,
  InferCreationAttributes<MachineRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare machineId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare machine: ValidSetup['machine'];
  declare controller: ValidSetup['controller'];
}
export class RackRevisionRow extends Model<
  InferAttributes<RackRevisionRow>,
  InferCreationAttributes<RackRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare machineId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare name: string;
  declare edge: Rack['edge'];
  /** The rack without name, edge and pockets. */
  declare body: Omit<Rack, 'name' | 'edge' | 'pockets'>;
}
export class PocketRow extends Model<
  InferAttributes<PocketRow>,
  InferCreationAttributes<PocketRow>
> {
  declare rackRevisionId: string;
  declare position: number;
  declare number: number;
  declare gripX: number;
  declare gripY: number;
  declare gripZ: number;
  declare opens: Rack['pockets'][number]['opens'];
  declare largestDiameter: number;
  declare longest: number;
  declare taper: string;
  declare kind: Rack['pockets'][number]['kind'];
  declare heaviest: number | null;
  declare taught: { at: string; by: string } | null;
}
export class LoadingRevisionRow extends Model<
  InferAttributes<LoadingRevisionRow>,
  InferCreationAttributes<LoadingRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare machineId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare spindle: 'tool' | 'empty' | 'unknown';
  declare spindleTool: number | null;
  declare byHand: number[];
}
export class LoadingPocketRow extends Model<
  InferAttributes<LoadingPocketRow>,
  InferCreationAttributes<LoadingPocketRow>
> {
  declare loadingRevisionId: string;
  declare position: number;
  declare pocket: number;
  declare tool: number;
}
export class OffsetRevisionRow extends Model<
  InferAttributes<OffsetRevisionRow>,
  InferCreationAttributes<OffsetRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare machineId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare work: ValidSetup['offsets']['work'];
  /** Table entries that belong to no tool of the shop; a tool's own entries stand with the tool. */
  declare length: Record<string, number>;
  declare diameter: Record<string, number>;
}
export class MacroRevisionRow extends Model<
  InferAttributes<MacroRevisionRow>,
  InferCreationAttributes<MacroRevisionRow>
> {
  declare id: CreationOptional<string>;
  declare shopId: string;
  declare machineId: string;
  declare number: number;
  declare madeBy: string | null;
  declare madeAt: CreationOptional<Date>;
  declare reason: string;
  declare name: string | null;
  declare text: string | null;
  declare subprograms: { name: string; text: string }[];
}

const machineRevisionColumns = { ...revisionColumns, machineId: column.reference };

export function bindMachines(sequelize: Sequelize) {
  return {
    machine: column.bind(sequelize, MachineRow, 'machine', {
      id: column.key,
      shopId: column.reference,
      name: column.words,
      createdAt: column.momentNow,
    }),
    machineRevision: column.bind(sequelize, MachineRevisionRow, 'machine_revision', {
      ...machineRevisionColumns,
      machine: column.json,
      controller: column.json,
    }),
    rackRevision: column.bind(sequelize, RackRevisionRow, 'rack_revision', {
      ...machineRevisionColumns,
      name: column.words,
      edge: column.words,
      body: column.json,
    }),
    pocket: column.bind(sequelize, PocketRow, 'pocket', {
      rackRevisionId: column.partOfKey,
      position: column.whole,
      number: { ...column.whole, primaryKey: true },
      gripX: column.length,
      gripY: column.length,
      gripZ: column.length,
      opens: column.words,
      largestDiameter: column.length,
      longest: column.length,
      taper: column.words,
      kind: column.words,
      heaviest: column.maybeLength,
      taught: column.maybeJson,
    }),
    loadingRevision: column.bind(sequelize, LoadingRevisionRow, 'loading_revision', {
      ...machineRevisionColumns,
      spindle: column.words,
      spindleTool: column.maybeWhole,
      byHand: column.wholes,
    }),
    loadingPocket: column.bind(sequelize, LoadingPocketRow, 'loading_pocket', {
      loadingRevisionId: column.partOfKey,
      position: column.whole,
      pocket: { ...column.whole, primaryKey: true },
      tool: column.whole,
    }),
    offsetRevision: column.bind(sequelize, OffsetRevisionRow, 'offset_revision', {
      ...machineRevisionColumns,
      work: column.json,
      length: column.json,
      diameter: column.json,
    }),
    macroRevision: column.bind(sequelize, MacroRevisionRow, 'macro_revision', {
      ...machineRevisionColumns,
      name: column.maybeWords,
      text: column.maybeWords,
      subprograms: column.json,
    }),
  };
}
