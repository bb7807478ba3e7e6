import { z } from 'zod';
import { auditTrailSchema, shopChangeSchema, shopPolicySchema, shopSchema } from '#contracts';
import type { Dependencies } from '../dependencies';
import { notFound } from '../http/problems';
import { defineRoute, type Route } from '../http/route';
import { changePolicy } from './change-policy';
import { changeShop } from './change-shop';

const GROUP = 'Shop';

const auditQuerySchema = z.object({
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(500).default(50),
});

export function shopRoutes(deps: Dependencies): Route[] {
  const { stores } = deps.database;
  return [
    defineRoute({
      method: 'get',
      path: '/shop',
      group: GROUP,
      summary: 'Name and upload limit of the shop',
      may: 'read',
      reply: shopSchema,
      answer: async ({ actor }) => {
        const shop = await stores.shops.find(actor.shopId);
        if (!shop) throw notFound('shop');
        return shop;
      },
    }),
    defineRoute({
      method: 'patch',
      path: '/shop',
      group: GROUP,
      summary: 'Change the name or the upload limit (bytes a file)',
      may: 'set-policy',
      body: shopChangeSchema,
      reply: shopSchema,
      answer: ({ actor, body }) => changeShop(deps, actor, body),
    }),
    defineRoute({
      method: 'get',
      path: '/shop/policy',
      group: GROUP,
      summary: 'What an unattended run needs and which severities the shop has raised',
      may: 'read',
      reply: shopPolicySchema,
      answer: ({ actor }) => stores.shops.policy(actor.shopId),
    }),
    defineRoute({
      method: 'put',
      path: '/shop/policy',
      group: GROUP,
      summary: 'Set the policy; a severity can be raised, never lowered',
      may: 'set-policy',
      body: shopPolicySchema,
      reply: shopPolicySchema,
      answer: ({ actor, body }) => changePolicy(deps, actor, body),
    }),
    defineRoute({
      method: 'get',
      path: '/audit',
      group: GROUP,
      summary: 'Who did what and when, newest first',
      may: ['set-policy', 'manage-people'],
      query: auditQuerySchema,
      reply: auditTrailSchema,
      answer: ({ actor, query }) => stores.audit.list(actor.shopId, query),
    }),
  ];
}
