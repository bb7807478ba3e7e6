/** One thing a key does. `keys` is a single key or two in a row: `?`, `j`, `g b`. */
export interface Shortcut {
  readonly keys: string;
  /** What it does, as a short sentence without full stop: "Next finding". */
  readonly does: string;
  /** The place it belongs to, heading its list in the help: "Everywhere", "Check report". */
  readonly place: string;
  readonly run: () => void;
}

export type Match =
  | { readonly kind: 'none' }
  /** The first key of a pair: wait for the second. */
  | { readonly kind: 'begun'; readonly first: string }
  | { readonly kind: 'whole'; readonly shortcut: Shortcut };

/** Which shortcut a pressed key completes, `begun` being the first key pressed just before or ''. */
export function matchKey(shortcuts: readonly Shortcut[], begun: string, key: string): Match {
  const pressed = begun ? `${begun} ${key}` : key;
  // Later registrations win: a page may give a key a meaning of its own.
  const whole = shortcuts.findLast((each) => each.keys === pressed);
  if (whole) return { kind: 'whole', shortcut: whole };
  if (!begun && shortcuts.some((each) => each.keys.startsWith(`${key} `))) {
    return { kind: 'begun', first: key };
  }
  return begun ? matchKey(shortcuts, '', key) : { kind: 'none' };
}
