import type { ValidSetup } from '#contracts';
import { refusingTwins, type BoundContext } from '../store-context';
import { refuseNul, taken } from '../store-refusal';

/** Who makes a revision, which number it gets and why. */
export interface NewRevision {
  readonly shopId: string;
  readonly machineId: string;
  readonly number: number;
  readonly madeBy: string | null;
  readonly reason: string;
}

export async function writeDescription(
  { models, transaction }: BoundContext,
  revision: NewRevision,
  { machine, controller }: Pick<ValidSetup, 'machine' | 'controller'>,
): Promise<void> {
  await models.machineRevision.create({ ...revision, machine, controller }, { transaction });
  const { shopId, machineId: id } = revision;
  await refusingTwins(
    () => models.machine.update({ name: machine.name }, { where: { shopId, id }, transaction }),
    () => taken('machine', machine.name),
  );
}

export async function writeRack(
  { models, transaction }: BoundContext,
  revision: NewRevision,
  { name, edge, pockets, ...body }: ValidSetup['rack'],
): Promise<void> {
  const row = await models.rackRevision.create({ ...revision, name, edge, body }, { transaction });
  const rows = pockets.map(({ grip, heaviest = null, taught = null, ...pocket }, position) => ({
    rackRevisionId: row.id,
    position,
    gripX: grip.x,
    gripY: grip.y,
    gripZ: grip.z,
    heaviest,
    taught,
    ...pocket,
  }));
  await models.pocket.bulkCreate(rows, { transaction });
}

export async function writeLoading(
  { models, transaction }: BoundContext,
  revision: NewRevision,
  { pockets, inSpindle, byHand }: ValidSetup['loading'],
): Promise<void> {
  const row = await models.loadingRevision.create(
    { ...revision, ...spindleColumns(inSpindle), byHand: [...byHand] },
    { transaction },
  );
  await models.loadingPocket.bulkCreate(
    pockets.map(({ pocket, tool }, position) => ({
      loadingRevisionId: row.id,
      position,
      pocket,
      tool,
    })),
    { transaction },
  );
}

export async function writeOffsets(
  { models, transaction }: BoundContext,
  revision: NewRevision,
  { work, length, diameter }: ValidSetup['offsets'],
): Promise<void> {
  await models.offsetRevision.create({ ...revision, work, length, diameter }, { transaction });
}

export async function writeMacro(
  { models, transaction }: BoundContext,
  revision: NewRevision,
  macro: { readonly name: string; readonly text: string } | null,
  subprograms: ValidSetup['subprograms'],
): Promise<void> {
  if (macro) refuseNul('macro', macro.text);
  for (const each of subprograms) refuseNul(`subprogram ${each.name}`, each.text);
  await models.macroRevision.create(
    { ...revision, name: macro?.name ?? null, text: macro?.text ?? null, subprograms },
    { transaction },
  );
}

function spindleColumns(inSpindle: ValidSetup['loading']['inSpindle']) {
  if (inSpindle === 'unknown') return { spindle: 'unknown' as const, spindleTool: null };
  if (inSpindle === null) return { spindle: 'empty' as const, spindleTool: null };
  return { spindle: 'tool' as const, spindleTool: inSpindle };
}
