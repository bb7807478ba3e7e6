import { ROLES, type Person, type Role, type Units } from '#contracts';
import type { PersonRow } from '../models/people';
import {
  inTransaction,
  refusingTwins,
  select,
  selectOne,
  together,
  type BoundContext,
  type StoreContext,
} from '../store-context';
import { missing, taken } from '../store-refusal';

export interface SignInRecord {
  readonly person: Person;
  readonly shopId: string;
  readonly passwordHash: string;
  readonly failedSignIns: number;
  readonly lockedUntil: Date | null;
}
export interface NewPersonRecord {
  readonly email: string;
  readonly name: string;
  readonly passwordHash: string;
  readonly roles: readonly Role[];
  readonly units?: Units;
}
export interface PersonRecordChange {
  readonly name?: string | undefined;
  readonly roles?: readonly Role[] | undefined;
  readonly active?: boolean | undefined;
  readonly units?: Units | undefined;
  readonly passwordHash?: string | undefined;
}
export interface PeopleStore {
  /**
   * Whether any person of any shop exists: until then the first one may be made without a sign-in. Within
   * a transaction nobody else is told "nobody yet" before it ends.
   */
  anyone(): Promise<boolean>;
  /** Before a sign-in no shop is known: the only look-up of a person by address alone. */
  findByEmail(email: string): Promise<SignInRecord | undefined>;
  find(shopId: string, id: string): Promise<Person | undefined>;
  list(shopId: string): Promise<Person[]>;
  passwordHash(shopId: string, id: string): Promise<string | undefined>;
  add(shopId: string, person: NewPersonRecord): Promise<Person>;
  change(shopId: string, id: string, change: PersonRecordChange): Promise<Person>;
  /** Counts a wrong password; from `lockAfter` on, each locks the person for `lockSeconds`. */
  recordFailedSignIn(
    shopId: string,
    id: string,
    limit: { readonly lockAfter: number; readonly lockSeconds: number },
  ): Promise<{ failedSignIns: number; lockedUntil: Date | null }>;
  clearFailedSignIns(shopId: string, id: string): Promise<void>;
  /** So that the last admin is not locked out of the shop. */
  countActiveWithRole(shopId: string, role: Role): Promise<number>;
}

export function openPeopleStore(ctx: StoreContext): PeopleStore {
  const { person } = ctx.models;
  return {
    async anyone() {
      if (ctx.transaction) {
        await select(ctx, `select pg_advisory_xact_lock(hashtextextended('first person', 0))`);
      }
      return (await person.findOne({ ...inTransaction(ctx) })) !== null;
    },
    async findByEmail(email) {
      const found = await selectOne<{ id: string }>(
        ctx,
        'select id from person where lower(email) = lower(:email)',
        { email },
      );
      const row = found && (await person.findByPk(found.id, { ...inTransaction(ctx) }));
      if (!row) return undefined;
      const { shopId, passwordHash, failedSignIns, lockedUntil } = row;
      const whole = await withRoles(ctx, [row]);
      return { person: whole[0]!, shopId, passwordHash, failedSignIns, lockedUntil };
    },
    async find(shopId, id) {
      const row = await person.findOne({ where: { shopId, id }, ...inTransaction(ctx) });
      return row ? (await withRoles(ctx, [row]))[0] : undefined;
    },
    async list(shopId) {
      const rows = await person.findAll({
        where: { shopId },
        order: ['name', 'email'],
        ...inTransaction(ctx),
      });
      return await withRoles(ctx, rows);
    },
    async passwordHash(shopId, id) {
      const row = await person.findOne({ where: { shopId, id }, ...inTransaction(ctx) });
      return row?.passwordHash;
    },
    add: (shopId, added) => together(ctx, (bound) => addPerson(bound, shopId, added)),
    change: (shopId, id, change) =>
      together(ctx, (bound) => changePerson(bound, shopId, id, change)),
    recordFailedSignIn: (shopId, id, limit) => recordFailedSignIn(ctx, shopId, id, limit),
    async clearFailedSignIns(shopId, id) {
      await person.update(
        { failedSignIns: 0, lockedUntil: null },
        { where: { shopId, id }, ...inTransaction(ctx) },
      );
    },
    async countActiveWithRole(shopId, role) {
      const counted = await selectOne<{ count: number }>(
        ctx,
        `select count(*)::int as count from person join person_role on person_id = id
         where person.shop_id = :shopId and active and role = :role`,
        { shopId, role },
      );
      return counted?.count ?? 0;
    },
  };
}

async function addPerson(
  ctx: BoundContext,
  shopId: string,
  { email, name, passwordHash, roles, units = 'mm' }: NewPersonRecord,
): Promise<Person> {
  const { transaction, models } = ctx;
  const row = await refusingTwins(
    () => models.person.create({ shopId, email, name, passwordHash, units }, { transaction }),
    () => taken('person with the address', email),
  );
  await setRoles(ctx, row, roles);
  await row.reload({ transaction });
  return (await withRoles(ctx, [row]))[0]!;
}

async function changePerson(
  ctx: BoundContext,
  shopId: string,
  id: string,
  { roles, ...columns }: PersonRecordChange,
): Promise<Person> {
  const { transaction, models } = ctx;
  const row = await models.person.findOne({
    where: { shopId, id },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  if (!row) throw missing('person');
  const given = Object.fromEntries(
    Object.entries(columns).filter(([, value]) => value !== undefined),
  );
  await row.update(given, { transaction });
  if (roles) await setRoles(ctx, row, roles);
  return (await withRoles(ctx, [row]))[0]!;
}

async function setRoles(
  { models, transaction }: BoundContext,
  { id: personId, shopId }: PersonRow,
  roles: readonly Role[],
): Promise<void> {
  await models.personRole.destroy({ where: { shopId, personId }, transaction });
  await models.personRole.bulkCreate(
    [...new Set(roles)].map((role) => ({ shopId, personId, role })),
    { transaction },
  );
}

/** One statement, so that attempts in parallel are all counted. */
async function recordFailedSignIn(
  ctx: StoreContext,
  shopId: string,
  id: string,
  { lockAfter, lockSeconds }: { readonly lockAfter: number; readonly lockSeconds: number },
): Promise<{ failedSignIns: number; lockedUntil: Date | null }> {
  const row = await selectOne<{ failedSignIns: number; lockedUntil: Date | null }>(
    ctx,
    `update person set
       failed_sign_ins = failed_sign_ins + 1,
       locked_until = case when failed_sign_ins + 1 >= :lockAfter
         then now() + make_interval(secs => :lockSeconds) else locked_until end
     where shop_id = :shopId and id = :id
     returning failed_sign_ins as "failedSignIns", locked_until as "lockedUntil"`,
    { shopId, id, lockAfter, lockSeconds },
  );
  if (!row) throw missing('person');
  return row;
}

async function withRoles(ctx: StoreContext, rows: readonly PersonRow[]): Promise<Person[]> {
  if (rows.length === 0) return [];
  const held = await select<{ personId: string; role: Role }>(
    ctx,
    'select person_id as "personId", role from person_role where person_id in (:ids)',
    { ids: rows.map((row) => row.id) },
  );
  return rows.map(({ id, email, name, units, active }) => {
    const own = held.filter((each) => each.personId === id).map((each) => each.role);
    return { id, email, name, units, active, roles: ROLES.filter((role) => own.includes(role)) };
  });
}
