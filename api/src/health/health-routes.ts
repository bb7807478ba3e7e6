import { z } from 'zod';
import type { Dependencies } from '../dependencies';
import { refuse } from '../http/problems';
import { defineOpenRoute, type Route } from '../http/route';

const healthSchema = z.object({ status: z.literal('up') });
const readinessSchema = z.object({
  status: z.literal('ready'),
  database: z.literal('answers'),
  migrations: z.literal('done'),
  queue: z.literal('there'),
});

/** Mounted at the root, outside /api/v1: whoever starts and watches the server asks these. */
export function healthRoutes(deps: Dependencies): Route[] {
  return [
    defineOpenRoute({
      method: 'get',
      path: '/health',
      group: 'Health',
      summary: 'Whether the process is up; asks nothing of the database',
      reply: healthSchema,
      answer: () => Promise.resolve({ status: 'up' as const }),
    }),
    defineOpenRoute({
      method: 'get',
      path: '/ready',
      group: 'Health',
      summary: 'Whether requests can be served: database, migrations and queue',
      reply: readinessSchema,
      answer: async () => {
        await demandReadiness(deps);
        return {
          status: 'ready' as const,
          database: 'answers' as const,
          migrations: 'done' as const,
          queue: 'there' as const,
        };
      },
    }),
  ];
}

async function demandReadiness(deps: Dependencies): Promise<void> {
  if (deps.isStopping()) throw refuse('not-ready', 'The server is stopping.');
  try {
    await deps.database.answers();
  } catch (error) {
    deps.logger.warn({ err: error }, 'the database does not answer');
    throw refuse('not-ready', 'The database does not answer.');
  }
  try {
    await deps.queue.answers();
  } catch (error) {
    deps.logger.warn({ err: error }, 'the queue does not answer');
    throw refuse('not-ready', 'The queue of checks does not answer.');
  }
  const pending = await deps.database.pendingMigrations();
  if (0 < pending.length) {
    throw refuse('not-ready', `${pending.length} migrations of the database are not yet run.`);
  }
}
