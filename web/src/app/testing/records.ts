import type { Bench, CheckRecord, Person, ProgramRecord, Role, Session } from '#contracts';

/** Plain records for specs; each takes what differs. */
const id = (tail: string): string => `00000000-0000-4000-8000-${tail.padStart(12, '0')}`;
export const SHOP_ID = id('1');
export const NORTH = id('a1');
export const EAST = id('a2');
export const PROGRAM = id('b1');
export const REVISION = id('c1');
export const CHECK = id('d1');

export function aPerson(change: Partial<Person> = {}): Person {
  return {
    id: id('e1'),
    email: 'pia@example.com',
    name: 'Pia',
    roles: ['programmer'],
    units: 'mm',
    active: true,
    ...change,
  };
}

export function aSession(roles: readonly Role[] = ['programmer']): Session {
  return {
    person: aPerson({ roles: [...roles] }),
    shop: { id: SHOP_ID, name: 'A shop', uploadLimitBytes: 1024 ** 2 },
    // Far off: specs that renew the session say so themselves.
    expiresAt: '2099-01-01T00:00:00.000Z',
  };
}

export function aCheck(change: Partial<CheckRecord> = {}): CheckRecord {
  return {
    id: CHECK,
    programId: PROGRAM,
    programName: 'door.nc',
    programRevision: 1,
    programRevisionId: REVISION,
    machineId: NORTH,
    machineName: 'North router',
    state: 'done',
    linesRead: 80,
    lines: 80,
    verdict: 'clear',
    unattendedVerdict: 'clear',
    counts: { stop: 0, hold: 0, note: 0 },
    askedBy: 'Pia',
    askedAt: '2026-12-01T10:00:00.000Z',
    startedAt: '2026-12-01T10:00:01.000Z',
    finishedAt: '2026-12-01T10:00:02.000Z',
    failure: null,
    against: {
      machineRevision: 1,
      rackRevision: 1,
      loadingRevision: 1,
      offsetRevision: 1,
      macroRevision: null,
      setupSha256: 'a'.repeat(64),
    },
    outOfDate: false,
    ...change,
  };
}

export function aProgram(change: Partial<ProgramRecord> = {}): ProgramRecord {
  return {
    id: PROGRAM,
    name: 'door.nc',
    revision: 1,
    revisionId: REVISION,
    sha256: 'b'.repeat(64),
    bytes: 1200,
    lines: 80,
    uploadedBy: 'Pia',
    uploadedAt: '2026-12-01T10:00:00.000Z',
    checks: [aCheck()],
    ...change,
  };
}

export function aBench(change: Partial<Bench> = {}): Bench {
  return {
    checks: [],
    counts: { waiting: 0, stopped: 0, held: 0, clear: 0, outOfDate: 0 },
    machines: [],
    ...change,
  };
}

/** An RFC 9457 body as the server sends it. */
export function aProblem(change: Record<string, unknown> = {}): Record<string, unknown> {
  return {
    type: 'about:blank',
    title: 'Refused',
    status: 409,
    detail: 'It cannot be done as things stand.',
    code: 'not-possible-now',
    next: 'Change something first.',
    ...change,
  };
}
