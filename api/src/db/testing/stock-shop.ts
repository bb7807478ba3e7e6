import { readFileSync } from 'node:fs';
import { setupSchema, type ValidSetup } from '#contracts';
import type { Database, Stores } from '../database';

/** A shop with one person, one machine and its tools, to put programs and checks into. */
export interface StockedShop {
  readonly shopId: string;
  readonly personId: string;
  readonly machineId: string;
  readonly setup: ValidSetup;
}

/** `name` keeps two shops of one database apart: the person's address is made of it. */
export async function stockShop(database: Database, name = 'lindenhof'): Promise<StockedShop> {
  const setup = readSetup();
  return await database.transaction(async (stores) => {
    const { id: shopId } = await stores.shops.create({ name });
    const { id: personId } = await stores.people.add(shopId, {
      email: `kim@${name}.example`,
      name: 'Kim',
      passwordHash: 'not a hash',
      roles: ['lead', 'programmer'],
    });
    for (const tool of setup.tools) {
      await stores.tools.add(shopId, {
        tool,
        lengthOffset: setup.offsets.length[String(tool.number)] ?? null,
        diameterOffset: setup.offsets.diameter[String(tool.number)] ?? null,
        madeBy: personId,
      });
    }
    const offsets = { ...setup.offsets, length: {}, diameter: {} };
    const { id: machineId } = await stores.machines.create(shopId, {
      ...setup,
      offsets,
      madeBy: personId,
      reason: 'First description',
    });
    return { shopId, personId, machineId, setup };
  });
}

/** A machine of the demo, as its file says it. */
function readSetup(): ValidSetup {
  return setupSchema.parse(JSON.parse(readFileSync('fixtures/machines/north-router.json', 'utf8')));
}

/** Uploads a text as a revision of the program called `name` and gives the revision's id. */
export async function addProgram(
  stores: Stores,
  { shopId, personId }: StockedShop,
  name: string,
  text: string | Uint8Array,
): Promise<{ programId: string; revisionId: string }> {
  const { textId } = await stores.programs.writeText(shopId, inPieces(text));
  const added = await stores.programs.addRevision(shopId, {
    name,
    textId,
    originalName: name,
    uploadedBy: personId,
  });
  return { programId: added.programId, revisionId: added.revisionId };
}

/** As an upload arrives: in pieces that end anywhere. */
export async function* inPieces(
  content: string | Uint8Array,
  size = 65_536,
): AsyncGenerator<Uint8Array> {
  const bytes = typeof content === 'string' ? Buffer.from(content) : content;
  for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size);
}
