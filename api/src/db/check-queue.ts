import PgBoss from 'pg-boss';
import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';

const QUEUE = 'check-program';

/**
 * Ten tries a second and more apart outlast a restart of the database. A job that outlives its hour
 * is handed out again; the check itself is guarded against being walked twice at once.
 */
const QUEUE_OPTIONS = {
  name: QUEUE,
  retryLimit: 10,
  retryDelay: 1,
  retryBackoff: true,
  expireInSeconds: 3600,
  retentionDays: 14,
};

export interface CheckJob {
  readonly checkId: string;
}
/** How a job stands: not yet taken, in somebody's hands since then, or over. */
export type JobStanding =
  | { readonly state: 'waiting' }
  | { readonly state: 'taken'; readonly since: Date }
  | { readonly state: 'over' };
/** Whether somebody waits for the check (it goes first) or nobody asked for it by hand. */
export type Urgency = 'asked' | 'background';
/** The queue of checks, kept in the same database as the checks themselves. */
export interface CheckQueue {
  /** Sends the job inside the caller's transaction: both are there afterwards, or neither is. */
  send(
    job: CheckJob,
    urgency: Urgency,
    within: { readonly sequelize: Sequelize; readonly transaction: Transaction },
  ): Promise<string>;
  standing(jobId: string): Promise<JobStanding>;
  /** Resolves when the queue is there to take jobs, rejects when it is not. */
  answers(): Promise<void>;
  /** Withdraws a job, whoever holds it; one that is gone already is no error. */
  cancel(jobId: string): Promise<void>;
  /** Takes jobs one at a time until `stop`; a handler that throws has its job tried again later. */
  work(pollSeconds: number, handle: (job: CheckJob) => Promise<void>): Promise<void>;
  /** Waits for the job in hand, if any, at most `timeout` milliseconds. */
  stop(options?: { readonly timeout?: number }): Promise<void>;
}

export interface CheckQueueOptions {
  readonly url: string;
  /** Faults of the queue's own connections; without it they would end the process. */
  readonly onError: (error: Error) => void;
  readonly poolSize?: number;
}

export async function openCheckQueue(options: CheckQueueOptions): Promise<CheckQueue> {
  const boss = new PgBoss({
    connectionString: options.url,
    max: options.poolSize ?? 3,
    application_name: 'nightlatch-queue',
    maintenanceIntervalSeconds: 30,
    schedule: false,
  });
  boss.on('error', options.onError);
  await boss.start();
  await boss.createQueue(QUEUE, QUEUE_OPTIONS);
  return {
    async send(job, urgency, { sequelize, transaction }) {
      const id = await boss.send(QUEUE, job, {
        priority: urgency === 'asked' ? 1 : 0,
        db: overSequelize(sequelize, transaction),
      });
      if (id === null) throw new Error('The queue took no job for the check.');
      return id;
    },
    async standing(jobId) {
      const job = await boss.getJobById(QUEUE, jobId);
      if (job?.state === 'created' || job?.state === 'retry') return { state: 'waiting' };
      if (job?.state === 'active') return { state: 'taken', since: job.startedOn };
      return { state: 'over' };
    },
    async answers() {
      if (!(await boss.getQueue(QUEUE))) throw new Error(`There is no queue called ${QUEUE}.`);
    },
    async cancel(jobId) {
      await boss.cancel(QUEUE, jobId);
    },
    async work(pollSeconds, handle) {
      await boss.work<CheckJob>(
        QUEUE,
        { pollingIntervalSeconds: pollSeconds, batchSize: 1 },
        async (jobs) => {
          for (const job of jobs) await handle(job.data);
        },
      );
    },
    async stop({ timeout = 5000 } = {}) {
      await boss.stop({ graceful: true, wait: true, timeout });
    },
  };
}

/** pg-boss leaves values undefined that Sequelize refuses to bind; the database means null by them. */
function overSequelize(sequelize: Sequelize, transaction: Transaction): PgBoss.Db {
  return {
    async executeSql(text, values: unknown[]) {
      const rows = await sequelize.query(text, {
        bind: values.map((value) => (value === undefined ? null : value)),
        type: QueryTypes.SELECT,
        transaction,
      });
      return { rows };
    },
  };
}
