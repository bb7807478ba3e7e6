import type { AuditEvent } from '#contracts';

/** What was done, as the trail says it after the person's name. Unknown acts are spelt from their code. */
const WORDS: Readonly<Record<string, string>> = {
  'session.begin': 'signed in',
  'session.end': 'signed out',
  'session.pause': 'had sign-in paused after too many wrong passwords',
  'session.token-used-twice': 'was signed out: a sign-in was used from two places',
  'shop.create': 'set up the shop',
  'shop.change': 'changed the shop’s settings',
  'policy.change': 'changed the policy',
  'person.add': 'added',
  'person.change': 'changed',
  'person.change-own': 'changed their own settings',
  'person.change-own-password': 'changed their own password',
  'program.upload': 'sent in',
  'program.change-job': 'changed the job sheet of',
  'check.ask': 'asked for a check of',
  'machine.add': 'described the machine',
  'machine.import': 'read in a setup for',
  'machine.change-description': 'changed the description of',
  'machine.change-rack': 'changed the rack of',
  'machine.change-loading': 'changed the loading of',
  'machine.change-offsets': 'changed the work offsets of',
  'machine.change-macro': 'changed the change macro of',
  'tool.add': 'entered the tool',
  'tool.change': 'changed the tool',
  'tool.measure': 'measured the tool',
};
/** Acts whose words already say what they were done to. */
const WHOLE = new Set([
  'session.begin',
  'session.end',
  'session.pause',
  'session.token-used-twice',
  'shop.create',
  'shop.change',
  'policy.change',
  'person.change-own',
  'person.change-own-password',
]);

export interface AuditLine {
  readonly id: string;
  readonly at: string;
  readonly person: string;
  readonly did: string;
  readonly subject: string;
  /** Name and value of what was kept with it, for those who look closer. */
  readonly details: readonly { readonly name: string; readonly value: string }[];
}

export function auditLine(event: AuditEvent): AuditLine {
  return {
    id: event.id,
    at: event.at,
    person: event.person ?? 'Nightlatch',
    did: WORDS[event.action] ?? event.action.replaceAll(/[.-]/g, ' '),
    subject: WHOLE.has(event.action) ? '' : event.subject,
    details: flatten(event.detail),
  };
}

/** Nested records as `before roles`, lists joined; ids stay, for they lead to the row. */
function flatten(
  detail: Readonly<Record<string, unknown>>,
  under = '',
): { name: string; value: string }[] {
  return Object.entries(detail).flatMap(([key, value]) => {
    const name = under ? `${under} ${spaced(key)}` : spaced(key);
    if (isRecord(value)) return flatten(value, name);
    return [{ name, value: spoken(value) }];
  });
}

function spoken(value: unknown): string {
  if (value === null || value === undefined || value === '') return '–';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string' || typeof value === 'number') return String(value);
  if (Array.isArray(value)) {
    const simple = value.every((each) => typeof each !== 'object');
    return simple ? value.join(', ') || '–' : JSON.stringify(value);
  }
  return JSON.stringify(value);
}

function spaced(key: string): string {
  return key.replaceAll(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
}

function isRecord(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
