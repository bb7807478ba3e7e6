import supertest from 'supertest';
import { expect } from 'vitest';
import type { z } from 'zod';
import { problemSchema, type Problem } from '#contracts';
import type { Route } from '../../../api/src/http/route';

type Test = supertest.Test;
export interface Answer {
  readonly status: number;
  readonly body: unknown;
  readonly headers: Readonly<Record<string, string>>;
  readonly text: string;
  /** The body as a contract has it; fails the test when the reply is a refusal. */
  as<Schema extends z.ZodType>(schema: Schema): z.output<Schema>;
  /** The refusal; fails the test when the reply is none. */
  readonly problem: Problem;
}

/** A browser as the API sees one: cookies, and the token repeated in the header of what writes. */
export interface Client {
  get(path: string): Promise<Answer>;
  post(path: string, body?: object): Promise<Answer>;
  put(path: string, body?: object): Promise<Answer>;
  patch(path: string, body?: object): Promise<Answer>;
  delete(path: string): Promise<Answer>;
  upload(path: string, files: readonly UploadFile[]): Promise<Answer>;
  /** A request to shape by hand, cookies sent and kept, no token added. */
  raw(method: 'get' | 'post' | 'put' | 'patch' | 'delete', path: string): Test;
  /** Sends a request made with `raw` and holds the reply against its contract. */
  settle(request: Test, method: string, path: string): Promise<Answer>;
  cookie(name: string): string;
  /** All cookies, as a header. */
  cookies(): string;
}
export interface UploadFile {
  readonly name: string;
  readonly content: string | Buffer;
}
type Routes = readonly { readonly base: string; readonly route: Route }[];

export function openClient(address: string, base: string, routes: Routes): Client {
  const jar = new Map<string, string>();
  const cookies = () => [...jar].map(([name, value]) => `${name}=${value}`).join('; ');
  const raw: Client['raw'] = (method, path) => {
    const request = supertest(address)[method](path.startsWith('/api/') ? path : `${base}${path}`);
    return jar.size === 0 ? request : request.set('Cookie', cookies());
  };
  const settle: Client['settle'] = async (request, method, path) => {
    const response = await request;
    keepCookies(jar, response.headers['set-cookie'] as unknown as string[] | undefined);
    const whole = path.startsWith('/api/') ? path : `${base}${path}`;
    holdAgainstContract(routes, { method, path: whole }, response);
    return asAnswer(response);
  };
  const send = async (method: 'post' | 'put' | 'patch' | 'delete', path: string, body?: object) => {
    if (!jar.has('XSRF-TOKEN')) await settle(raw('get', '/welcome'), 'get', '/welcome');
    const request = raw(method, path).set('X-XSRF-TOKEN', jar.get('XSRF-TOKEN') ?? '');
    return await settle(body === undefined ? request : request.send(body), method, path);
  };
  return {
    raw,
    settle,
    cookie: (name) => jar.get(name) ?? '',
    cookies,
    get: (path) => settle(raw('get', path), 'get', path),
    post: (path, body) => send('post', path, body),
    put: (path, body) => send('put', path, body),
    patch: (path, body) => send('patch', path, body),
    delete: (path) => send('delete', path),
    upload: async (path, files) => {
      const request = raw('post', path).set('X-XSRF-TOKEN', jar.get('XSRF-TOKEN') ?? '');
      for (const { name, content } of files) {
        request.attach('files', Buffer.from(content), { filename: name });
      }
      return await settle(request, 'post', path);
    },
  };
}

function asAnswer(response: supertest.Response): Answer {
  const isRefusal = 400 <= response.status;
  return {
    status: response.status,
    headers: response.headers,
    text: response.text,
    body: response.body,
    as: (schema) => {
      if (isRefusal) throw new Error(`refused: ${response.text}`);
      return schema.parse(response.body);
    },
    get problem() {
      if (!isRefusal) throw new Error(`not refused: ${response.status}`);
      return problemSchema.parse(JSON.parse(response.text));
    },
  };
}

function keepCookies(jar: Map<string, string>, set: readonly string[] | undefined): void {
  for (const each of set ?? []) {
    const [pair = ''] = each.split(';');
    const at = pair.indexOf('=');
    const name = pair.slice(0, at);
    const value = decodeURIComponent(pair.slice(at + 1));
    if (value === '') jar.delete(name);
    else jar.set(name, value);
  }
}

/** Every reply of every spec: exactly what the contract says, and nothing beside it. */
function holdAgainstContract(
  routes: Routes,
  { method, path }: { readonly method: string; readonly path: string },
  response: supertest.Response,
): void {
  if (400 <= response.status) {
    expect(response.headers['content-type']).toMatch(/^application\/problem\+json/);
    const problem = JSON.parse(response.text) as Problem;
    expect(problemSchema.parse(problem)).toEqual(problem);
    expect(problem.status).toBe(response.status);
    return;
  }
  const found = routes.find(
    ({ base, route }) => route.method === method && matches(`${base}${route.path}`, path),
  );
  if (found?.route.reply.kind !== 'document') return;
  expect(response.status).toBe(found.route.status);
  expect(found.route.reply.schema.parse(response.body)).toEqual(response.body);
}

function matches(pattern: string, path: string): boolean {
  const plain = path.split('?')[0] ?? path;
  return new RegExp(`^${pattern.replaceAll('.', '\\.').replace(':id', '[^/]+')}$`).test(plain);
}
