import type { FindingData } from '../report/report';

/** A figure of a finding, or NaN where it has none; wording only, never judging. */
export function figure(data: FindingData, key: string): number {
  const value = data[key];
  return typeof value === 'number' ? value : NaN;
}

/** A text of a finding, or '' where it has none. */
export function text(data: FindingData, key: string): string {
  const value = data[key];
  return typeof value === 'string' ? value : '';
}

export function has(data: FindingData, key: string): boolean {
  return data[key] !== undefined && data[key] !== null;
}

/** Numbers of a list, such as the pockets a tool stands in. */
export function figures(data: FindingData, key: string): readonly number[] {
  const value = data[key];
  return Array.isArray(value) ? value.filter((each) => typeof each === 'number') : [];
}

/** 'a, b and c'. */
export function listed(words: readonly (string | number)[]): string {
  if (words.length < 2) return String(words[0] ?? '');
  return `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;
}

/** 'T4', with the tool's name where the list has one. */
export function toolWords(data: FindingData): string {
  const name = text(data, 'name');
  return name ? `T${figure(data, 'tool')} (${name})` : `T${figure(data, 'tool')}`;
}
