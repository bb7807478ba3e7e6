import { z } from 'zod';
import * as contracts from '#contracts';
import { PERMISSIONS, problemSchema } from '#contracts';
import { PROBLEMS } from '../http/problems';
import type { Route } from '../http/route';

type Json = Record<string, unknown>;
export interface MountedRoutes {
  readonly base: string;
  readonly routes: readonly Route[];
}
export interface OpenApiDocument {
  readonly openapi: '3.1.0';
  readonly info: Json;
  readonly paths: Record<string, Record<string, Json>>;
  readonly components: Json;
}

/** The OpenAPI 3.1 document of the routes as mounted, its schemas made from the contracts. */
export function describeApi(mounted: readonly MountedRoutes[]): OpenApiDocument {
  const names = schemaNames();
  const sent = schemasOf(names, 'input');
  const answered = schemasOf(names, 'output');
  const paths: Record<string, Record<string, Json>> = {};
  for (const { base, routes } of mounted) {
    for (const route of routes) {
      const path = `${base}${route.path.replace(':id', '{id}')}`;
      const methods = (paths[path] ??= {});
      methods[route.method] = operation(route, names);
    }
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Nightlatch',
      version: '1',
      description:
        'Pre-flight check for CNC routers with automatic tool changers. It reads and records; it never ' +
        'moves a machine and never stands in for a guard, local codes or licensed practice.',
    },
    paths,
    components: {
      schemas: { ...answered, ...sent },
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: 'nightlatch_access' },
        page: { type: 'apiKey', in: 'header', name: 'X-XSRF-TOKEN' },
      },
    },
  };
}

type Names = ReadonlyMap<z.ZodType, string>;

/** Every schema the contracts export, under the name its type has. */
function schemaNames(): Names {
  const names = new Map<z.ZodType, string>();
  for (const [exported, value] of Object.entries(contracts)) {
    if (!exported.endsWith('Schema') || !(value instanceof z.ZodType)) continue;
    const name = exported.slice(0, -'Schema'.length);
    // Two exports of one schema are one component: the first name stays.
    if (!names.has(value)) names.set(value, name.charAt(0).toUpperCase() + name.slice(1));
  }
  return names;
}

/** What is sent may leave out what has a default; what is answered never does. */
function schemasOf(names: Names, io: 'input' | 'output'): Record<string, Json> {
  const registry = z.registry<{ id: string }>();
  for (const [schema, name] of names) registry.add(schema, { id: componentName(name, io) });
  const { schemas } = z.toJSONSchema(registry, {
    uri: (id) => `#/components/schemas/${id}`,
    target: 'draft-2020-12',
    unrepresentable: 'any',
    io,
  });
  return withSharedNamed(schemas, io);
}

/** Parts without a name of their own that several schemas share; the generator keeps them apart. */
const SHARED = '__shared';

function withSharedNamed(schemas: Json, io: 'input' | 'output'): Record<string, Json> {
  const { [SHARED]: shared, ...named } = schemas as Record<string, Json>;
  const parts = (shared?.['$defs'] ?? {}) as Record<string, Json>;
  const nameOf = (part: string) => componentName(`Shared_${part}`, io);
  const all = {
    ...named,
    ...Object.fromEntries(Object.entries(parts).map(([part, schema]) => [nameOf(part), schema])),
  };
  const spelt = JSON.stringify(all).replaceAll(
    /#\/components\/schemas\/__shared#\/\$defs\/(\w+)/g,
    (_reference, part: string) => `#/components/schemas/${nameOf(part)}`,
  );
  return Object.fromEntries(
    Object.entries(JSON.parse(spelt) as Record<string, Json>).map(([id, schema]) => [
      id,
      withoutAddress(schema),
    ]),
  );
}

function componentName(name: string, io: 'input' | 'output'): string {
  return io === 'input' ? `${name}Sent` : name;
}

function operation(route: Route, names: Names): Json {
  const parameters = [...pathParameters(route), ...queryParameters(route)];
  const writes = route.method !== 'get';
  return {
    operationId: operationId(route),
    tags: [route.group],
    summary: route.summary,
    'x-roles': rolesOf(route),
    ...(parameters.length > 0 ? { parameters } : {}),
    ...(route.body || route.takesFiles ? { requestBody: requestBody(route, names) } : {}),
    responses: {
      [route.status]: reply(route, names),
      default: problemReply(names),
    },
    security:
      route.may === 'anyone'
        ? writes
          ? [{ page: [] }]
          : []
        : [{ session: [], ...(writes ? { page: [] } : {}) }],
  };
}

/** `get /programs/:id/checks` as `getProgramsIdChecks`. */
function operationId(route: Route): string {
  const words = route.path.split(/[^A-Za-z]+/).filter((word) => word !== '');
  return route.method + words.map((word) => word.charAt(0).toUpperCase() + word.slice(1)).join('');
}

/** The roles that may call a route; empty: no sign-in needed. */
export function rolesOf(route: Route): string[] {
  if (route.may === 'anyone') return [];
  return [...new Set(route.may.flatMap((permission) => PERMISSIONS[permission]))];
}

function pathParameters(route: Route): Json[] {
  if (!route.path.includes(':id')) return [];
  return [
    {
      name: 'id',
      in: 'path',
      required: true,
      description: `The ${route.names}`,
      schema: { type: 'string', format: 'uuid' },
    },
  ];
}

function queryParameters(route: Route): Json[] {
  if (!route.query) return [];
  const schema = z.toJSONSchema(route.query, { io: 'input', unrepresentable: 'any' }) as {
    properties?: Record<string, Json>;
    required?: string[];
  };
  return Object.entries(schema.properties ?? {}).map(([name, property]) => ({
    name,
    in: 'query',
    required: schema.required?.includes(name) ?? false,
    schema: property,
  }));
}

function requestBody(route: Route, names: Names): Json {
  if (route.takesFiles) {
    const files = { type: 'array', items: { type: 'string', contentMediaType: 'text/plain' } };
    const schema = { type: 'object', properties: { files }, required: ['files'] };
    return { required: true, content: { 'multipart/form-data': { schema } } };
  }
  return {
    required: true,
    content: { 'application/json': { schema: referTo(route.body, names, 'input') } },
  };
}

function reply(route: Route, names: Names): Json {
  const { reply } = route;
  switch (reply.kind) {
    case 'nothing':
      return { description: 'Done; nothing to read' };
    case 'bytes':
      return { description: reply.holds, content: { [reply.contentType]: {} } };
    case 'events':
      return {
        description: 'Server-sent events; the data of each is one document',
        content: { 'text/event-stream': { schema: referTo(reply.schema, names, 'output') } },
      };
    case 'document':
      return {
        description: 'Done',
        content: { 'application/json': { schema: referTo(reply.schema, names, 'output') } },
      };
  }
}

function problemReply(names: Names): Json {
  return {
    description: `Refused: ${Object.keys(PROBLEMS).join(', ')}`,
    content: { 'application/problem+json': { schema: referTo(problemSchema, names, 'output') } },
  };
}

function referTo(schema: z.ZodType | undefined, names: Names, io: 'input' | 'output'): Json {
  if (!schema) return {};
  const name = names.get(schema);
  if (name) return { $ref: `#/components/schemas/${componentName(name, io)}` };
  return withoutAddress(z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json);
}

/** The document itself says which dialect it is in and where a schema stands. */
function withoutAddress(schema: Json): Json {
  return Object.fromEntries(
    Object.entries(schema).filter(([key]) => key !== '$schema' && key !== '$id'),
  );
}
