import {
  blockWordsQuerySchema,
  blockWordsSchema,
  jobChangeSchema,
  lineRangeQuerySchema,
  lineRangeSchema,
  programDetailsSchema,
  programPageSchema,
  programQuerySchema,
  uploadResultSchema,
} from '#contracts';
import { z } from 'zod';
import type { Dependencies } from '../dependencies';
import { sendAsDownload } from '../http/download';
import { notFound, refuse } from '../http/problems';
import { defineRawRoute, defineRoute, type Route } from '../http/route';
import { readBlockWords } from './block-words';
import { changeJob } from './change-job';
import { receiveUpload } from './receive-upload';
import { sendText } from './send-text';

const GROUP = 'Programs';
/** Lines of one request: a few screens ahead, small enough to answer at once. */
const MOST_LINES = 2000;

export function programRoutes(deps: Dependencies): Route[] {
  return [...listRoutes(deps), ...writeRoutes(deps), ...textRoutes(deps)];
}

function listRoutes(deps: Dependencies): Route[] {
  const { programs } = deps.database.stores;
  return [
    defineRoute({
      method: 'get',
      path: '/programs',
      group: GROUP,
      summary: 'Programs with the newest checks of their newest revision, filtered, sorted, paged',
      may: 'read',
      query: programQuerySchema,
      reply: programPageSchema,
      answer: ({ actor, query }) => programs.list(actor.shopId, query),
    }),
    defineRoute({
      method: 'get',
      path: '/programs/:id',
      names: 'program',
      group: GROUP,
      summary: 'A program with its revisions, their checks and its job sheet',
      may: 'read',
      reply: programDetailsSchema,
      answer: async ({ actor, id }) => {
        const details = await programs.details(actor.shopId, id);
        if (!details) throw notFound('program');
        return details;
      },
    }),
  ];
}

function writeRoutes(deps: Dependencies): Route[] {
  return [
    defineRoute({
      method: 'post',
      path: '/programs',
      group: GROUP,
      summary: 'Upload program files (form field "files"); each is checked on the machine named',
      may: 'upload-program',
      query: z.object({ machineId: z.uuid() }),
      takesFiles: true,
      status: 201,
      reply: uploadResultSchema,
      answer: ({ actor, query, request, response }) =>
        receiveUpload(deps, actor, query.machineId, { request, response }),
    }),
    defineRoute({
      method: 'put',
      path: '/programs/:id/job',
      names: 'program',
      group: GROUP,
      summary: 'A new revision of the job sheet: stock, zero, clamps',
      may: 'change-job-sheet',
      body: jobChangeSchema,
      reply: programDetailsSchema,
      answer: ({ actor, id, body }) => changeJob(deps, actor, id, body),
    }),
  ];
}

function textRoutes(deps: Dependencies): Route[] {
  const { programs } = deps.database.stores;
  return [
    defineRoute({
      method: 'get',
      path: '/program-revisions/:id/lines',
      names: 'program revision',
      group: GROUP,
      summary: `Lines from … to …, both included, ${MOST_LINES} at most`,
      may: 'read',
      query: lineRangeQuerySchema,
      reply: lineRangeSchema,
      answer: async ({ actor, id, query }) => {
        demandRange(query);
        const lines = await programs.lines(actor.shopId, id, query);
        if (!lines) throw notFound('program revision');
        return lines;
      },
    }),
    defineRoute({
      method: 'get',
      path: '/program-revisions/:id/words',
      names: 'program revision',
      group: GROUP,
      summary: 'The words of one block, letter by letter, for a person who asks',
      may: 'read',
      query: blockWordsQuerySchema,
      reply: blockWordsSchema,
      answer: async ({ actor, id, query: { line } }) => {
        const range = await programs.lines(actor.shopId, id, { from: line, to: line });
        if (!range) throw notFound('program revision');
        return readBlockWords(line, range.lines[0] ?? '');
      },
    }),
    defineRawRoute({
      method: 'get',
      path: '/program-revisions/:id/text',
      names: 'program revision',
      group: GROUP,
      summary: 'The bytes exactly as they were uploaded',
      may: 'read',
      reply: { kind: 'bytes', contentType: 'text/plain', holds: 'the program as uploaded' },
      answer: async ({ actor, id, response }) => {
        const revision = await programs.revision(actor.shopId, id);
        const bytes = revision && (await programs.bytes(actor.shopId, id));
        if (!revision || !bytes) throw notFound('program revision');
        // No charset: nobody knows which one the file was written in.
        sendAsDownload(response, revision.programName, 'application/octet-stream');
        response.setHeader('Content-Length', String(revision.bytes));
        await sendText(bytes, response);
      },
    }),
  ];
}

function demandRange({ from, to }: { readonly from: number; readonly to: number }): void {
  if (to < from) throw wrongRange(`to is ${to}: give ${from} or more, as from is ${from}.`);
  if (MOST_LINES < to - from + 1) {
    throw wrongRange(`Lines ${from} to ${to} are more than the ${MOST_LINES} sent at once.`);
  }
}

function wrongRange(message: string): Error {
  return refuse('wrong-fields', message, {
    fields: [{ path: 'to', message, expected: `at most ${MOST_LINES} lines from the first` }],
  });
}
