import type { OperatorFunction } from 'rxjs';
import { map } from 'rxjs';
import { unexpectedReply } from './problem-error';

interface Schema<T> {
  safeParse(value: unknown): { success: true; data: T } | { success: false; error: unknown };
}

/** Holds a reply against its contract; beyond this line its type is trusted. */
export function parsed<T>(schema: Schema<T>): OperatorFunction<unknown, T> {
  return map((reply) => {
    const result = schema.safeParse(reply);
    if (result.success) return result.data;
    console.error('A reply differs from its contract', result.error);
    throw unexpectedReply();
  });
}
