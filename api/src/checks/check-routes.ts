import {
  checkDetailsSchema,
  checkProgressSchema,
  checkSchema,
  findingPageSchema,
  findingQuerySchema,
  newCheckSchema,
  pathSchema,
  reportSchema,
} from '#contracts';
import type { Dependencies } from '../dependencies';
import { sendAsDownload } from '../http/download';
import { notFound, refuse } from '../http/problems';
import { defineRawRoute, defineRoute, type Route } from '../http/route';
import { askForCheck } from './ask-for-check';
import { streamCheck, streamShop } from './stream-progress';

const GROUP = 'Checks';

export function checkRoutes(deps: Dependencies): Route[] {
  return [...askRoutes(deps), ...reportRoutes(deps), ...eventRoutes(deps)];
}

function askRoutes(deps: Dependencies): Route[] {
  return [
    defineRoute({
      method: 'post',
      path: '/program-revisions/:id/checks',
      names: 'program revision',
      group: GROUP,
      summary: 'Ask for a check of a program revision on a machine as it stands now',
      may: 'ask-for-check',
      body: newCheckSchema,
      status: 202,
      reply: checkSchema,
      answer: ({ actor, id, body }) =>
        deps.database.transaction((stores) =>
          askForCheck(stores, actor, { programRevisionId: id, ...body, cause: 'asked' }),
        ),
    }),
    defineRoute({
      method: 'get',
      path: '/checks/:id',
      names: 'check',
      group: GROUP,
      summary: 'A check with its summary and the setup it was held against',
      may: 'read',
      reply: checkDetailsSchema,
      answer: async ({ actor, id }) =>
        found(await deps.database.stores.checks.details(actor.shopId, id)),
    }),
  ];
}

function reportRoutes(deps: Dependencies): Route[] {
  const { checks } = deps.database.stores;
  const head = { method: 'get', names: 'check', group: GROUP, may: 'read' } as const;
  return [
    defineRoute({
      ...head,
      path: '/checks/:id/findings',
      summary: 'Findings in the order of the report, filtered and paged',
      query: findingQuerySchema,
      reply: findingPageSchema,
      answer: async ({ actor, id, query }) => found(await checks.findings(actor.shopId, id, query)),
    }),
    defineRawRoute({
      ...head,
      path: '/checks/:id/report',
      summary: 'The whole report as one nightlatch-report document',
      reply: { kind: 'bytes', contentType: 'application/json', holds: 'a nightlatch-report file' },
      answer: async ({ actor, id, response }) => {
        const check = found(await checks.find(actor.shopId, id));
        const report = await checks.report(actor.shopId, id);
        if (!report) throw notYet(check.state);
        sendAsDownload(response, `${check.programName}.report.json`, 'application/json');
        response.send(`${JSON.stringify(reportSchema.parse(report), null, 2)}\n`);
      },
    }),
    defineRoute({
      ...head,
      path: '/checks/:id/path',
      summary: 'The path in plan, thinned out, in machine mm of the gauge point',
      reply: pathSchema,
      answer: async ({ actor, id }) => {
        const check = found(await checks.find(actor.shopId, id));
        const path = await checks.path(actor.shopId, id);
        if (!path) throw notYet(check.state);
        return path;
      },
    }),
  ];
}

function eventRoutes(deps: Dependencies): Route[] {
  const reply = { kind: 'events', schema: checkProgressSchema } as const;
  return [
    defineRawRoute({
      method: 'get',
      path: '/checks/:id/events',
      names: 'check',
      group: GROUP,
      summary:
        'How far a check has read; its state now comes first, the stream ends with the check',
      may: 'read',
      reply,
      answer: ({ actor, id, request, response }) =>
        streamCheck(deps, { shopId: actor.shopId, checkId: id }, { request, response }),
    }),
    defineRawRoute({
      method: 'get',
      path: '/events',
      group: GROUP,
      summary: 'Progress of every check of the shop, until the page is left',
      may: 'read',
      reply,
      answer: ({ actor, request, response }) =>
        streamShop(deps, actor.shopId, { request, response }),
    }),
  ];
}

function found<T>(value: T | undefined): T {
  if (value === undefined) throw notFound('check');
  return value;
}

function notYet(state: string): Error {
  if (state === 'failed') {
    return refuse('not-possible-now', 'The check failed, so there is nothing to show of it.', {
      next: 'Read why on the check, then ask for it again.',
    });
  }
  return refuse('not-possible-now', `The check is ${state}; its report is not there yet.`, {
    next: 'Wait until the check is done.',
  });
}
