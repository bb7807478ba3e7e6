/** A rule a shop may raise, with its own severity for an attended run. */
export interface RaisableRule {
  readonly id: string;
  readonly title: string;
  readonly severity: string;
}

/**
 * The rules that are not stops already, by heading. The engine is fetched when it is asked for: only
 * this page and the report need it.
 */
export async function readRaisableRules(): Promise<readonly RaisableRule[]> {
  const { RULES } = await import('#engine');
  return RULES.filter((rule) => rule.severity !== 'stop')
    .map(({ id, title, severity }) => ({ id, title, severity }))
    .toSorted((one, other) => one.title.localeCompare(other.title));
}
