import type { FindingDocument } from '#contracts';
import { copyFindings } from '../stores/save-result';
import { addProgram, stockShop } from '../testing/stock-shop';
import { makeTestDatabase, type TestDatabase } from '../testing/test-database';

/**
 * `npm run bench:save`: how long the findings of a check take to be saved as the worker saves them, against
 * the same rows through the models' bulkCreate, each in one transaction, taking turns. Options: `--pairs 5`.
 */
const ROWS = 100_000;
/** Rows of one INSERT; all at once is slower. */
const BATCH = 5_000;
const pairs = Number(process.argv[process.argv.indexOf('--pairs') + 1]) || 5;

const house = await makeTestDatabase();
try {
  const checkId = await askForCheck(house);
  const findings = Array.from({ length: ROWS }, (_, at) => makeFinding(at));
  const ratios: { wall: number; cpu: number }[] = [];
  for (let pair = 0; pair < pairs; pair++) {
    const models = await timed(house, (bound) => saveByModels(bound, checkId, findings));
    const copy = await timed(house, (bound) => saveByCopy(bound, checkId, findings));
    ratios.push({ wall: models.wall / copy.wall, cpu: models.cpu / copy.cpu });
    process.stdout.write(
      `bulkCreate ${models.wall.toFixed(0)} ms (${models.cpu.toFixed(0)} of processor), ` +
        `COPY ${copy.wall.toFixed(0)} ms (${copy.cpu.toFixed(0)})\n`,
    );
  }
  const say = (which: 'wall' | 'cpu') => {
    const sorted = ratios.map((each) => each[which]).sort((one, other) => one - other);
    const middle = sorted[Math.floor(sorted.length / 2)]!;
    return `${middle.toFixed(1)} times [${sorted[0]!.toFixed(1)}–${sorted.at(-1)!.toFixed(1)}]`;
  };
  process.stdout.write(
    `${ROWS.toLocaleString('en')} findings, ${pairs} pairs: COPY is ${say('wall')} as fast, ` +
      `and takes ${say('cpu')} less of this processor\n`,
  );
} finally {
  await house.drop();
}

async function askForCheck({ database }: TestDatabase): Promise<string> {
  const shop = await stockShop(database);
  const { revisionId } = await addProgram(database.stores, shop, 'bench.nc', 'M30\n');
  const { id } = await database.stores.checks.ask(shop.shopId, {
    programRevisionId: revisionId,
    machineId: shop.machineId,
    askedBy: shop.personId,
    cause: 'asked',
  });
  return id;
}

function makeFinding(at: number): FindingDocument {
  return {
    rule: 'beyond-travel',
    severity: 'stop',
    line: at + 1,
    endLine: at + 9,
    worstLine: at + 4,
    count: 3,
    columns: [4, 12],
    tool: 4,
    message: 'Drives X 34.2 mm (1.346 in) past the right-hand travel (1270 mm).',
    advice: 'Move work zero at least 34.2 mm (1.346 in) left, if the work-zero window allows it.',
    data: { axis: 'x', side: 'high', by: 34.2, at: 1304.2, limit: 1270 },
  };
}

/** Runs it in a transaction that is rolled back, so that every turn finds the table as the first did. */
async function timed(
  { database }: TestDatabase,
  save: (bound: Bound) => Promise<void>,
): Promise<{ wall: number; cpu: number }> {
  const { sequelize, models } = database;
  const transaction = await sequelize.transaction();
  const cpu = process.cpuUsage();
  const before = performance.now();
  await save({ sequelize, models, transaction, queue: undefined });
  const wall = performance.now() - before;
  const { user, system } = process.cpuUsage(cpu);
  await transaction.rollback();
  return { wall, cpu: (user + system) / 1000 };
}

type Bound = Parameters<typeof copyFindings>[0];

function saveByCopy(
  bound: Bound,
  checkId: string,
  findings: readonly FindingDocument[],
): Promise<void> {
  return copyFindings(bound, checkId, [...findings]);
}

async function saveByModels(
  { models, transaction }: Bound,
  checkId: string,
  findings: readonly FindingDocument[],
): Promise<void> {
  for (let from = 0; from < findings.length; from += BATCH) {
    const rows = findings.slice(from, from + BATCH).map(({ columns, ...finding }, at) => ({
      ...finding,
      checkId,
      ordinal: from + at,
      columnFrom: columns?.[0],
      columnTo: columns?.[1],
    }));
    await models.finding.bulkCreate(rows, { transaction });
  }
}
