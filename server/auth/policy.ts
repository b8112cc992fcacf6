/**
 * Who may do what: one rule for each route, and no route without one.
 *
 * - `public`: everyone; changes nothing, so it needs neither session nor token.
 * - `anyone`: everyone; may begin or end a session, so it needs a token.
 * - `signedIn`: whoever has an account.
 * - `designOwner`: whoever the design of the path belongs to. For everyone else the design does not exist.
 */
export type Rule = 'public' | 'anyone' | 'signedIn' | 'designOwner';

export type Method = 'GET' | 'POST' | 'PUT' | 'DELETE';

export const POLICY: Readonly<Record<string, Rule>> = {
  'GET /api/health': 'public',
  'GET /api/health/live': 'public',
  'GET /api/openapi.json': 'public',
  'GET /api/docs': 'public',
  'GET /api/steels': 'public',
  'POST /api/evaluate': 'public',

  'GET /api/auth/csrf': 'anyone',
  'POST /api/auth/register': 'anyone',
  'POST /api/auth/login': 'anyone',
  'POST /api/auth/logout': 'anyone',
  'GET /api/auth/me': 'signedIn',
  'GET /api/auth/session': 'anyone',

  'GET /api/designs': 'signedIn',
  'POST /api/designs': 'signedIn',
  'GET /api/designs/:id': 'designOwner',
  'PUT /api/designs/:id': 'designOwner',
  'DELETE /api/designs/:id': 'designOwner',
  'POST /api/designs/:id/restore': 'designOwner',
  'GET /api/designs/:id/card.pdf': 'designOwner',
  'GET /api/designs/:id/cut-sheet.pdf': 'designOwner',
};

/** The rule of a route. Throws for one that nobody has thought about, so that the program does not start with it. */
export function ruleOf(method: Method, path: string): Rule {
  const rule = POLICY[`${method} ${path}`];
  if (rule === undefined) throw new Error(`The route ${method} ${path} has no rule in the policy table.`);
  return rule;
}
