/** A parameter by its number, or by its name in lower case, without blanks and `#<>`. */
export type ParameterKey = number | string;

/** `#500` or `#<name>`, as setups write them. */
export function parameterKey(written: string): ParameterKey {
  const name = /^#<([^>]*)>$/.exec(written)?.[1];
  return name === undefined ? Number(written.slice(1)) : name.replace(/[ \t]/g, '').toLowerCase();
}

/** As a person writes it. */
export const showParameter = (key: ParameterKey): string =>
  typeof key === 'number' ? `#${key}` : `#<${key}>`;
