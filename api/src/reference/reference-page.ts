import { PROBLEMS } from '../http/problems';
import type { Route } from '../http/route';
import { rolesOf, type MountedRoutes } from './openapi';

/** A plain page of every route and every refusal. No script, no style but its own sheet. */
export function writeReferencePage(mounted: readonly MountedRoutes[]): string {
  const sections = groupsOf(mounted).map(
    ([group, rows]) => `<h2>${escape(group)}</h2>
<table>
<thead><tr><th>Route</th><th>What it does</th><th>Who may</th><th>Answers</th></tr></thead>
<tbody>${rows.join('')}</tbody>
</table>`,
  );
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<title>Nightlatch: API reference</title>
<link rel="stylesheet" href="/api/v1/reference.css">
</head>
<body>
<h1>Nightlatch: API reference</h1>
<p>Every schema is in the <a href="/api/v1/openapi.json">OpenAPI document</a>. Lengths are in mm, angles
in degrees, feeds in mm/min, times in seconds unless a name says otherwise.</p>
<p>Sign in with POST /api/v1/session; the cookies it sets carry every later request. A request that
writes repeats the cookie XSRF-TOKEN in the header X-XSRF-TOKEN.</p>
${sections.join('\n')}
<h2>Refusals</h2>
<p>Every refusal is an RFC 9457 document with one of these codes, a sentence with the figures of the
case, and what to do next.</p>
<table>
<thead><tr><th>Code</th><th>Status</th><th>Means</th><th>What to do</th></tr></thead>
<tbody>${problemRows()}</tbody>
</table>
</body>
</html>
`;
}

export const REFERENCE_STYLES = `:root { color-scheme: light dark; }
body { font: 1rem/1.5 'IBM Plex Sans', sans-serif; margin: 2rem auto; max-width: 70rem; padding: 0 1rem; }
table { border-collapse: collapse; width: 100%; }
th, td { text-align: left; vertical-align: top; padding: 0.25rem 1rem 0.25rem 0; }
tbody tr { border-top: 1px solid color-mix(in srgb, currentColor 20%, transparent); }
code { font-family: 'IBM Plex Mono', monospace; }
`;

function groupsOf(mounted: readonly MountedRoutes[]): [string, string[]][] {
  const groups = new Map<string, string[]>();
  for (const { base, routes } of mounted) {
    for (const route of routes) {
      const rows = groups.get(route.group) ?? [];
      rows.push(routeRow(base, route));
      groups.set(route.group, rows);
    }
  }
  return [...groups];
}

function routeRow(base: string, route: Route): string {
  const who = route.may === 'anyone' ? 'anyone' : rolesOf(route).join(', ');
  const line = `${route.method.toUpperCase()} ${base}${route.path}`;
  return `<tr><td><code>${escape(line)}</code></td><td>${escape(route.summary)}</td><td>${escape(
    who,
  )}</td><td>${escape(answerOf(route))}</td></tr>`;
}

function answerOf(route: Route): string {
  switch (route.reply.kind) {
    case 'document':
      return `${route.status}, JSON`;
    case 'nothing':
      return `${route.status}`;
    case 'events':
      return `${route.status}, server-sent events`;
    case 'bytes':
      return `${route.status}, ${route.reply.holds}`;
  }
}

function problemRows(): string {
  return Object.entries(PROBLEMS)
    .map(
      ([code, { status, title, next }]) =>
        `<tr id="problem-${code}"><td><code>${code}</code></td><td>${status}</td><td>${escape(
          title,
        )}</td><td>${escape(next)}</td></tr>`,
    )
    .join('');
}

function escape(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
}
