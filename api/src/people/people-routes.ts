import { newPersonSchema, peopleSchema, personChangeSchema, personSchema } from '#contracts';
import type { Dependencies } from '../dependencies';
import { defineRoute, type Route } from '../http/route';
import { addPerson } from './add-person';
import { changePerson } from './change-person';

const GROUP = 'People';

export function peopleRoutes(deps: Dependencies): Route[] {
  return [
    defineRoute({
      method: 'get',
      path: '/people',
      group: GROUP,
      summary: 'Everyone of the shop with their roles',
      may: 'manage-people',
      reply: peopleSchema,
      answer: async ({ actor }) => ({
        people: await deps.database.stores.people.list(actor.shopId),
      }),
    }),
    defineRoute({
      method: 'post',
      path: '/people',
      group: GROUP,
      summary: 'Add a person with a first password',
      may: 'manage-people',
      body: newPersonSchema,
      status: 201,
      reply: personSchema,
      answer: ({ actor, body }) => addPerson(deps, actor, body),
    }),
    defineRoute({
      method: 'patch',
      path: '/people/:id',
      names: 'person',
      group: GROUP,
      summary: 'Change name, roles or password, or make a person inactive, who is refused at once',
      may: 'manage-people',
      body: personChangeSchema,
      reply: personSchema,
      answer: ({ actor, id, body }) => changePerson(deps, actor, id, body),
    }),
  ];
}
