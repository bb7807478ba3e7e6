import type { Revision, WrongField } from '#contracts';
import type { StoreRefusal } from '../db/store-refusal';
import { changedMeanwhile, refuse, type Refusal } from './problems';

/** A store's refusal as a reply says it. */
export function refusalOfStore({ code, message, facts }: StoreRefusal): Refusal {
  switch (code) {
    case 'missing':
      return refuse(
        'not-found',
        `There is no such ${String(facts['what'] ?? 'entry')} in your shop.`,
      );
    case 'stale':
      return isRevision(facts['revision'])
        ? changedMeanwhile(`the ${String(facts['what'])}`, facts['revision'])
        : refuse('changed-meanwhile', message);
    case 'taken':
      return refuse('already-there', message);
    case 'unfit':
      return refuse('wrong-fields', message, { fields: fieldsOf(facts['issues'], message) });
  }
}

function isRevision(value: unknown): value is Revision {
  return typeof value === 'object' && value !== null && 'madeAt' in value;
}

function fieldsOf(issues: unknown, message: string): WrongField[] {
  if (!Array.isArray(issues)) return [{ path: '(document)', message }];
  return (issues as { path: readonly (string | number)[]; message: string }[]).map((issue) => ({
    path: issue.path
      .map((part) => (typeof part === 'number' ? `[${part}]` : `.${part}`))
      .join('')
      .replace(/^\./, ''),
    message: `${issue.message}.`,
  }));
}
