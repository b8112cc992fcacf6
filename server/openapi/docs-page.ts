import { PROBLEMS, type ProblemCode } from '../http/problem.js';
import type { RegisteredRoute } from '../http/routes.js';

/** What each kind of problem means, for the page that its `type` leads to. */
const MEANINGS: Readonly<Record<ProblemCode, string>> = {
  'invalid-request':
    'Fields are missing, unknown or out of range. issues names each by a JSON pointer into the body.',
  'malformed-json': 'The body cannot be read as JSON.',
  'sign-in-required': 'The session is over, or there was none.',
  'wrong-credentials': 'The address is unknown or the password is wrong; which of the two is not said.',
  'csrf-token': 'The header x-csrf-token does not belong to this session. Get a new one from /api/auth/csrf.',
  'cross-site': 'A browser says that the request was made by another site’s page.',
  'not-found': 'There is no such thing, or it is not yours to see.',
  'method-not-allowed': 'There is something at this address, but not for this method. Allow says for which.',
  'email-taken': 'Accounts are told apart by their address.',
  'too-many-designs': 'One account keeps so many designs at most.',
  'newer-stored-document':
    'The design was stored by a newer version of the program, and is not overwritten by this one.',
  'stale-revision':
    'Someone has saved since. The document has the current revision, when it was saved, and its ETag.',
  'body-too-large': 'A body has 1 MB at most.',
  'unsupported-media-type': 'Bodies are JSON in UTF-8, with Content-Type: application/json.',
  'newer-document': 'The design document has a higher version than this program knows. It was left alone.',
  'refused-step':
    'bar, stepId and field say what asks for too much; asked and available are both numbers, in unit.',
  'too-much-work': 'Working the design out takes longer than one request may.',
  'revision-required': 'A change needs If-Match with the ETag of the revision it was made from.',
  'too-many-requests': 'Retry-After says when to try again.',
  'internal-error': 'A mistake in the program. The log has it under the number in instance.',
  'storage-unavailable': 'The disk is full or failing. Nothing of the request was kept; reading goes on.',
  'too-busy': 'Too many costly requests at once. Retry-After says when to try again.',
};

/** The documentation as a page for people; everything on it comes from the routes themselves. */
export function docsPage(routes: readonly RegisteredRoute[]): string {
  const tags = [...new Set(routes.map(({ operation }) => operation.tag))];
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Layerwright: HTTP API</title>
<style>${STYLE}</style>
</head>
<body>
<header>
<h1>Layerwright: HTTP API</h1>
<p>JSON over HTTP; lengths in mm, masses in kg, temperatures in °C. Changes need a session and the token from
<code>/api/auth/csrf</code>. Schemas and examples: <a href="/api/openapi.json">openapi.json</a> (OpenAPI 3.1).</p>
</header>
<main>
${tags
  .map((tag) =>
    section(
      tag,
      routes.filter(({ operation }) => operation.tag === tag),
    ),
  )
  .join('\n')}
<section aria-labelledby="problems">
<h2 id="problems">Problems</h2>
<p>Every error is a problem document (RFC 9457); the end of its <code>type</code> is one of these.</p>
<dl>
${(Object.keys(PROBLEMS) as ProblemCode[]).map(problem).join('\n')}
</dl>
</section>
</main>
</body>
</html>
`;
}

function section(tag: string, routes: readonly RegisteredRoute[]): string {
  return `<section><h2>${escaped(tag)}</h2>\n${routes.map(route).join('\n')}\n</section>`;
}

function route({ method, path, operation }: RegisteredRoute): string {
  const needs = Object.entries({ ...operation.params, ...operation.headers });
  const answers = Object.entries(operation.answers).map(
    ([status, { description }]) => [status, description] as const,
  );
  const problems = operation.problems
    .map((code) => `<a href="#${code}">${PROBLEMS[code].status} ${code}</a>`)
    .join(', ');
  return `<article id="${operation.id}">
<h3><span class="method">${method}</span> <code>${escaped(path)}</code> ${escaped(operation.summary)}</h3>
<p>${escaped(operation.description)}</p>
<dl class="pairs">
${[...needs, ...answers].map(([term, words]) => `<dt><code>${escaped(term)}</code></dt><dd>${escaped(words)}</dd>`).join('\n')}
${problems ? `<dt>Problems</dt><dd>${problems}</dd>` : ''}
</dl>
</article>`;
}

function problem(code: ProblemCode): string {
  const { status, title } = PROBLEMS[code];
  return `<dt id="${code}"><code>${status} ${code}</code> ${escaped(title)}</dt><dd>${escaped(MEANINGS[code])}</dd>`;
}

function escaped(text: string): string {
  return text.replace(/[&<>"]/g, (character) => `&#${character.charCodeAt(0)};`);
}

const STYLE = `
:root { color-scheme: light dark; --ground: light-dark(#f6f3ec, #16181a); --raised: light-dark(#fff, #202326);
  --ink: light-dark(#22262a, #ece7dd); --quiet: light-dark(#5a6067, #a9afb5); --ember: light-dark(#b23e14, #ff8a5c); }
body { margin: 0 auto; max-width: 60rem; padding: 1rem; background: var(--ground); color: var(--ink);
  font: 1rem/1.5 'IBM Plex Sans', system-ui, sans-serif; }
code, .method { font-family: 'IBM Plex Mono', ui-monospace, monospace; overflow-wrap: anywhere; }
a { color: var(--ember); }
article { background: var(--raised); padding: 0.5rem 1rem; margin: 1rem 0; }
h3 { margin: 0.5rem 0; font-size: 1rem; }
.method { color: var(--ember); }
.pairs { display: grid; grid-template-columns: minmax(6rem, auto) 1fr; gap: 0.25rem 1rem; margin: 0.5rem 0; }
dd { margin: 0; color: var(--quiet); }
dt:target { outline: 2px solid var(--ember); }
#problems ~ dl dd { margin: 0 0 0.75rem 0; }
`;
