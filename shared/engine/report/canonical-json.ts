/**
 * A value as canonical JSON (RFC 8785): keys in UTF-16 order, numbers as ECMAScript prints them, no
 * white space. Keys whose value is `undefined` are left out. Throws a RangeError on NaN or an infinity
 * and a TypeError on what JSON cannot hold.
 */
export function canonicalJson(value: unknown): string {
  switch (typeof value) {
    case 'number':
      if (!Number.isFinite(value))
        throw new RangeError('Only finite numbers have a canonical form.');
      return JSON.stringify(value);
    case 'string':
    case 'boolean':
      return JSON.stringify(value);
    case 'object':
      if (value === null) return 'null';
      return Array.isArray(value) ? canonicalArray(value) : canonicalObject(value);
    default:
      throw new TypeError(`A ${typeof value} has no canonical form.`);
  }
}

function canonicalArray(values: readonly unknown[]): string {
  return `[${values.map((each) => canonicalJson(each === undefined ? null : each)).join(',')}]`;
}

function canonicalObject(value: object): string {
  const members = new Map<string, unknown>(Object.entries(value));
  // Without a comparison function, sort compares UTF-16 code units, which is what the RFC asks for.
  const keys = [...members.keys()].filter((key) => members.get(key) !== undefined).sort();
  return `{${keys.map((key) => `${JSON.stringify(key)}:${canonicalJson(members.get(key))}`).join(',')}}`;
}
