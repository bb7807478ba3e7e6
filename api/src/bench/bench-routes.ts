import { benchSchema } from '#contracts';
import type { Dependencies } from '../dependencies';
import { defineRoute, type Route } from '../http/route';

export function benchRoutes(deps: Dependencies): Route[] {
  return [
    defineRoute({
      method: 'get',
      path: '/bench',
      group: 'Bench',
      summary: 'What needs someone now: checks by verdict, and the machines as they stand',
      may: 'read',
      reply: benchSchema,
      answer: ({ actor }) => deps.database.stores.checks.bench(actor.shopId),
    }),
  ];
}
