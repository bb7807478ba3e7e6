import {
  measurementSchema,
  newToolSchema,
  revisionListSchema,
  toolChangeSchema,
  toolListSchema,
  toolRecordSchema,
} from '#contracts';
import type { Dependencies } from '../dependencies';
import { notFound } from '../http/problems';
import { defineRoute, type Route } from '../http/route';
import { addTool, changeTool } from './change-tool';
import { recordMeasurement } from './record-measurement';

const GROUP = 'Tools';

export function toolRoutes(deps: Dependencies): Route[] {
  const { tools } = deps.database.stores;
  return [
    defineRoute({
      method: 'get',
      path: '/tools',
      group: GROUP,
      summary: 'Every tool of the shop, where it sits, and its table entries',
      may: 'read',
      reply: toolListSchema,
      answer: async ({ actor }) => ({ tools: await tools.list(actor.shopId) }),
    }),
    defineRoute({
      method: 'post',
      path: '/tools',
      group: GROUP,
      summary: 'Add a tool under a number that is free',
      may: 'change-tools',
      body: newToolSchema,
      status: 201,
      reply: toolRecordSchema,
      answer: ({ actor, body }) => addTool(deps, actor, body),
    }),
    defineRoute({
      method: 'put',
      path: '/tools/:id',
      names: 'tool',
      group: GROUP,
      summary: 'A new revision of a tool',
      may: 'change-tools',
      body: toolChangeSchema,
      reply: toolRecordSchema,
      answer: ({ actor, id, body }) => changeTool(deps, actor, id, body),
    }),
    defineRoute({
      method: 'post',
      path: '/tools/:id/measurements',
      names: 'tool',
      group: GROUP,
      summary: 'Record a measured gauge length, mm',
      may: 'record-length',
      body: measurementSchema,
      status: 201,
      reply: toolRecordSchema,
      answer: ({ actor, id, body }) => recordMeasurement(deps, actor, id, body),
    }),
    defineRoute({
      method: 'get',
      path: '/tools/:id/revisions',
      names: 'tool',
      group: GROUP,
      summary: 'Every revision of a tool, newest first',
      may: 'read',
      reply: revisionListSchema,
      answer: async ({ actor, id }) => {
        const revisions = await tools.revisions(actor.shopId, id);
        if (!revisions) throw notFound('tool');
        return { revisions };
      },
    }),
  ];
}
