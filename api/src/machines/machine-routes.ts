import {
  descriptionChangeSchema,
  loadingChangeSchema,
  loadingHistorySchema,
  machineDetailsSchema,
  machineListSchema,
  macroChangeSchema,
  offsetChangeSchema,
  rackChangeSchema,
  revisionListSchema,
  setupImportSchema,
} from '#contracts';
import type { RevisedPart } from '../db/stores/machine-store';
import type { Dependencies } from '../dependencies';
import { sendAsDownload } from '../http/download';
import { notFound } from '../http/problems';
import { defineRawRoute, defineRoute, type Route } from '../http/route';
import { importNewMachine, importSetup } from './import-setup';
import {
  changeDescription,
  changeLoading,
  changeMacro,
  changeOffsets,
  changeRack,
} from './revise-machine';

const GROUP = 'Machines';

export function machineRoutes(deps: Dependencies): Route[] {
  return [
    ...standingRoutes(deps),
    ...changeRoutes(deps),
    ...historyRoutes(deps),
    ...setupRoutes(deps),
  ];
}

function standingRoutes(deps: Dependencies): Route[] {
  const { machines } = deps.database.stores;
  return [
    defineRoute({
      method: 'get',
      path: '/machines',
      group: GROUP,
      summary: 'The machines of the shop, short',
      may: 'read',
      reply: machineListSchema,
      answer: async ({ actor }) => ({ machines: await machines.list(actor.shopId) }),
    }),
    defineRoute({
      method: 'get',
      path: '/machines/:id',
      names: 'machine',
      group: GROUP,
      summary: 'A machine with everything that stands on it now',
      may: 'read',
      reply: machineDetailsSchema,
      answer: async ({ actor, id }) => found(await machines.details(actor.shopId, id)),
    }),
  ];
}

function changeRoutes(deps: Dependencies): Route[] {
  const head = { method: 'put', names: 'machine', group: GROUP, size: 'document' } as const;
  const reply = machineDetailsSchema;
  return [
    defineRoute({
      ...head,
      path: '/machines/:id/description',
      summary: 'A new revision of machine and controller',
      may: 'change-machine',
      body: descriptionChangeSchema,
      reply,
      answer: ({ actor, id, body }) => changeDescription(deps, actor, id, body),
    }),
    defineRoute({
      ...head,
      path: '/machines/:id/rack',
      summary: 'A new revision of the rack',
      may: 'change-rack',
      body: rackChangeSchema,
      reply,
      answer: ({ actor, id, body }) => changeRack(deps, actor, id, body),
    }),
    defineRoute({
      ...head,
      path: '/machines/:id/loading',
      summary: 'Which tool sits where now; programs checked on this machine are checked again',
      may: 'change-loading',
      body: loadingChangeSchema,
      reply,
      answer: ({ actor, id, body }) => changeLoading(deps, actor, id, body),
    }),
    defineRoute({
      ...head,
      path: '/machines/:id/offsets',
      summary: 'A new revision of the work offsets',
      may: 'change-work-offsets',
      body: offsetChangeSchema,
      reply,
      answer: ({ actor, id, body }) => changeOffsets(deps, actor, id, body),
    }),
    defineRoute({
      ...head,
      path: '/machines/:id/macro',
      summary: 'A new revision of the tool-change macro',
      may: 'change-macro',
      body: macroChangeSchema,
      reply,
      answer: ({ actor, id, body }) => changeMacro(deps, actor, id, body),
    }),
  ];
}

function historyRoutes(deps: Dependencies): Route[] {
  const { machines } = deps.database.stores;
  const parts: readonly RevisedPart[] = ['description', 'rack', 'offsets', 'macro'];
  return [
    ...parts.map((part) =>
      defineRoute({
        method: 'get',
        path: `/machines/:id/${part}/revisions`,
        names: 'machine',
        group: GROUP,
        summary: `Every revision of the ${part}, newest first`,
        may: 'read',
        reply: revisionListSchema,
        answer: async ({ actor, id }) => ({
          revisions: found(await machines.revisions(actor.shopId, id, part)),
        }),
      }),
    ),
    defineRoute({
      method: 'get',
      path: '/machines/:id/loading/revisions',
      names: 'machine',
      group: GROUP,
      summary: 'Every loading of the machine, newest first',
      may: 'read',
      reply: loadingHistorySchema,
      answer: async ({ actor, id }) => found(await machines.loadingHistory(actor.shopId, id)),
    }),
  ];
}

function setupRoutes(deps: Dependencies): Route[] {
  return [
    defineRoute({
      method: 'post',
      path: '/machines',
      group: GROUP,
      summary: 'A new machine from a setup file; its tools are matched by number',
      may: 'change-machine',
      size: 'document',
      body: setupImportSchema,
      status: 201,
      reply: machineDetailsSchema,
      answer: ({ actor, body }) => importNewMachine(deps, actor, body),
    }),
    defineRoute({
      method: 'put',
      path: '/machines/:id/setup',
      names: 'machine',
      group: GROUP,
      summary: 'New revisions of whatever a setup file says differently',
      may: 'change-machine',
      size: 'document',
      body: setupImportSchema,
      reply: machineDetailsSchema,
      answer: ({ actor, id, body }) => importSetup(deps, actor, id, body),
    }),
    defineRawRoute({
      method: 'get',
      path: '/machines/:id/setup',
      names: 'machine',
      group: GROUP,
      summary: 'The setup file of the machine, all tools of the shop in it',
      may: 'read',
      reply: { kind: 'bytes', contentType: 'application/json', holds: 'a nightlatch-setup file' },
      answer: async ({ actor, id, response }) => {
        const { stores } = deps.database;
        const asOf = deps.now().toISOString();
        const setup = found(await stores.machines.setup(actor.shopId, id, { asOf }));
        sendAsDownload(response, `${setup.machine.name}.setup.json`, 'application/json');
        response.send(`${JSON.stringify(setup, null, 2)}\n`);
      },
    }),
  ];
}

function found<T>(value: T | undefined): T {
  if (value === undefined) throw notFound('machine');
  return value;
}
