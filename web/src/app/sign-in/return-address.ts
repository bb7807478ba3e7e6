/** Where to go after signing in: the page left, if it is one of ours; never an outside address. */
export function returnAddress(then: string | undefined): string {
  if (!then?.startsWith('/') || then.startsWith('//') || then.startsWith('/\\')) return '/bench';
  return then.startsWith('/sign-in') || then.startsWith('/first-run') ? '/bench' : then;
}
