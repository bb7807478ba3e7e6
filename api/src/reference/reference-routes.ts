import { z } from 'zod';
import { defineOpenRawRoute, defineOpenRoute, type Route } from '../http/route';
import { describeApi, type MountedRoutes } from './openapi';
import { REFERENCE_STYLES, writeReferencePage } from './reference-page';

const GROUP = 'Reference';

/** An OpenAPI document describes itself; here it only says that it is one. */
const openApiSchema = z.looseObject({ openapi: z.literal('3.1.0') });

/** The routes that describe all routes; `mounted` is handed these, so that they are described too. */
export function referenceRoutes(
  mounted: (own: readonly Route[]) => readonly MountedRoutes[],
): Route[] {
  const own: Route[] = [
    defineOpenRoute({
      method: 'get',
      path: '/openapi.json',
      group: GROUP,
      summary: 'The OpenAPI 3.1 document of this API',
      reply: openApiSchema,
      answer: () => Promise.resolve({ ...document }),
    }),
    defineOpenRawRoute({
      method: 'get',
      path: '/reference',
      group: GROUP,
      summary: 'Every route and every refusal on one page',
      reply: { kind: 'bytes', contentType: 'text/html', holds: 'a page' },
      answer: async ({ response }) => {
        response.type('html').send(page);
      },
    }),
    defineOpenRawRoute({
      method: 'get',
      path: '/reference.css',
      group: GROUP,
      summary: 'The style sheet of the reference page',
      reply: { kind: 'bytes', contentType: 'text/css', holds: 'a style sheet' },
      answer: async ({ response }) => {
        response.type('css').send(REFERENCE_STYLES);
      },
    }),
  ];
  const tables = mounted(own);
  const document = describeApi(tables);
  const page = writeReferencePage(tables);
  return own;
}
