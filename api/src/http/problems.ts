import type { Problem as ProblemDocument, WrongField } from '#contracts';

/**
 * Everything the API may refuse, in one catalogue: the status, a heading and what the person can do.
 * The sentence of a case is given where the case is met, for only there are its figures known.
 */
export const PROBLEMS = {
  'unreadable-body': {
    status: 400,
    title: 'The request could not be read',
    next: 'Send valid JSON, or reload the page and try again.',
  },
  'wrong-fields': {
    status: 400,
    title: 'Some values cannot be used',
    next: 'Correct the values named below and send again.',
  },
  'not-signed-in': {
    status: 401,
    title: 'Not signed in',
    next: 'Sign in and try again.',
  },
  'wrong-sign-in': {
    status: 401,
    title: 'E-mail or password is wrong',
    next: 'Check both and try again. After ten wrong passwords sign-in pauses for a while.',
  },
  'session-ended': {
    status: 401,
    title: 'The session has ended',
    next: 'Sign in again.',
  },
  'session-just-renewed': {
    status: 409,
    title: 'The session was renewed a moment ago',
    next: 'Ask again: the new cookies are there already.',
  },
  'no-longer-active': {
    status: 401,
    title: 'This person may no longer sign in',
    next: 'Ask the shop admin to make the account active again.',
  },
  'page-out-of-date': {
    status: 403,
    title: 'The page is out of date',
    next: 'Reload the page and try again.',
  },
  'not-allowed': {
    status: 403,
    title: 'Not allowed for your roles',
    next: 'Ask someone who holds one of the roles named.',
  },
  'not-found': {
    status: 404,
    title: 'Nothing there',
    next: 'Go back and choose from the list; it may have changed.',
  },
  'changed-meanwhile': {
    status: 409,
    title: 'Someone changed it meanwhile',
    next: 'Look at the newest version, then make the change again.',
  },
  'already-there': {
    status: 409,
    title: 'It is there already',
    next: 'Use another value, or change the one that is there.',
  },
  'tools-differ': {
    status: 409,
    title: 'Tools of the file differ from tools of the shop',
    next: 'Send it again with replaceTools to take the tools of the file, or correct the file.',
  },
  'not-possible-now': {
    status: 409,
    title: 'Not possible as things stand',
    next: 'Change what is named, then try again.',
  },
  'too-large': {
    status: 413,
    title: 'Too large',
    next: 'Send less in one request.',
  },
  'not-multipart': {
    status: 415,
    title: 'No files in the request',
    next: 'Choose at least one program file and send it as a form upload.',
  },
  'upload-broken-off': {
    status: 400,
    title: 'The upload broke off',
    next: 'Nothing of the file under way was kept. Send it again.',
  },
  'sign-in-paused': {
    status: 429,
    title: 'Sign-in is paused',
    next: 'Wait, or ask the shop admin to set a new password.',
  },
  'too-many-requests': {
    status: 429,
    title: 'Too many requests',
    next: 'Wait a little and try again.',
  },
  'our-fault': {
    status: 500,
    title: 'Something failed on our side',
    next: 'Try again. If it keeps failing, tell whoever looks after Nightlatch the request id.',
  },
  'not-ready': {
    status: 503,
    title: 'Not ready',
    next: 'Try again in a minute; the server is starting, stopping or has lost its database.',
  },
} as const satisfies Record<string, { status: number; title: string; next: string }>;

export type ProblemCode = keyof typeof PROBLEMS;

/** An expected refusal on its way to the reply. Anything else that is thrown is a bug. */
export class Refusal extends Error {
  override readonly name = 'Refusal';
  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly more: {
      readonly next?: string;
      readonly fields?: readonly WrongField[];
      /** Seconds until it is worth trying again; sent as Retry-After. */
      readonly retryAfter?: number;
    } = {},
  ) {
    super(`${code}: ${detail}`);
  }
}

/** A refusal to throw: what is wrong, where, with its figures, as one sentence. */
export function refuse(code: ProblemCode, detail: string, more?: Refusal['more']): Refusal {
  return new Refusal(code, detail, more);
}

/** The same words whether the thing is missing or another shop's: neither may be told apart. */
export function notFound(what: string): Refusal {
  return refuse('not-found', `There is no such ${what} in your shop.`);
}

/** Someone else's revision came between reading and writing. */
export function changedMeanwhile(
  what: string,
  newest: { readonly number: number; readonly madeBy: string | null; readonly madeAt: string },
): Refusal {
  const who = newest.madeBy ?? 'Nightlatch';
  return refuse(
    'changed-meanwhile',
    `${who} changed ${what} on ${spokenTime(newest.madeAt)}; it is now at revision ${newest.number}. ` +
      'Your change was not saved.',
  );
}

/** The RFC 9457 document of a refusal. */
export function problemDocument(
  refusal: Refusal,
  request: { readonly instance: string; readonly requestId: string },
): ProblemDocument {
  const entry = PROBLEMS[refusal.code];
  return {
    type: `/api/v1/reference#problem-${refusal.code}`,
    title: entry.title,
    status: entry.status,
    detail: refusal.detail,
    instance: request.instance,
    code: refusal.code,
    next: refusal.more.next ?? entry.next,
    requestId: request.requestId,
    ...(refusal.more.fields ? { fields: [...refusal.more.fields] } : {}),
  };
}

/** `2026-11-30T21:04:09.000Z` as "2026-11-30 at 21:04 UTC": one form in every reply, in no locale. */
export function spokenTime(moment: string): string {
  const iso = new Date(moment).toISOString();
  return `${iso.slice(0, 10)} at ${iso.slice(11, 16)} UTC`;
}
