import type { Revision } from '#contracts';

/**
 * A store will not do what was asked, for a reason the asker can mend: the row is not there (or is
 * another shop's), another change came between, the name is taken, the value cannot be kept.
 * Thrown, so that the transaction around it rolls back; `http/problems.ts` turns it into a reply.
 */
export class StoreRefusal extends Error {
  constructor(
    readonly code: 'missing' | 'stale' | 'taken' | 'unfit',
    message: string,
    readonly facts: Readonly<Record<string, unknown>> = {},
  ) {
    super(message);
    this.name = 'StoreRefusal';
  }
}

export function missing(what: string): StoreRefusal {
  return new StoreRefusal('missing', `This ${what} is not in the shop.`, { what });
}

/** `newest`: the revision number that stands now; `revision`: who made it and when, if there is one. */
export function stale(
  what: string,
  basedOn: number,
  newest: number,
  revision?: Revision,
): StoreRefusal {
  return new StoreRefusal(
    'stale',
    `The ${what} was changed by someone else: your change was based on revision ${basedOn}, the newest is ${newest}.`,
    { what, basedOn, newest, revision },
  );
}

export function taken(what: string, value: string | number): StoreRefusal {
  return new StoreRefusal('taken', `There is already a ${what} ${value} in the shop.`, {
    what,
    value,
  });
}

/** PostgreSQL keeps no NUL character in text; silently dropping or escaping it would change a macro. */
export function refuseNul(what: string, text: string): void {
  const at = text.indexOf('\0');
  if (at === -1) return;
  throw new StoreRefusal(
    'unfit',
    `The ${what} holds a NUL character at position ${at + 1}: it is not a text file.`,
    { what, at },
  );
}
