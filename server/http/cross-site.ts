import { randomBytes } from 'node:crypto';
import { doubleCsrf } from 'csrf-csrf';
import type { Request, RequestHandler, Response } from 'express';
import { Problem } from './problem.js';

export interface CrossSiteOptions {
  readonly secret: string;
  readonly isSecure: boolean;
  /** Where people reach the site; what they type otherwise decides. */
  readonly publicOrigin: string | null;
}

/** What keeps other sites from changing anything in a visitor's name. */
export interface CrossSiteGuard {
  /** Refuses a changing request that does not come from our own page. */
  readonly guard: RequestHandler;
  /** A token for the session or the visitor at hand; its other half goes along as a cookie. */
  readonly issueToken: (request: Request, response: Response) => string;
}

/**
 * Two lines of defence: what the browser itself says about where a request comes from, and a token that only our own
 * pages can read. The token belongs to the session, so a new one is needed after signing in or out.
 */
export function crossSiteGuard(options: CrossSiteOptions): CrossSiteGuard {
  // The prefix makes the browser refuse such a cookie from a neighbouring host, but works over HTTPS only.
  const prefix = options.isSecure ? '__Host-' : '';
  const visitorCookie = `${prefix}layerwright.visitor`;
  const cookie = { httpOnly: true, sameSite: 'lax', secure: options.isSecure, path: '/' } as const;
  const { generateCsrfToken, validateRequest } = doubleCsrf({
    getSecret: () => options.secret,
    getSessionIdentifier: (request) => {
      // A visitor without an account has no session, since each would be a row to store.
      const cookies = request.cookies as Readonly<Record<string, string | undefined>>;
      return request.user ? request.sessionID : (cookies[visitorCookie] ?? '');
    },
    cookieName: `${prefix}layerwright.csrf`,
    cookieOptions: cookie,
  });
  return {
    guard: (request, _response, next) => {
      if (!isOwnPage(request, options.publicOrigin)) return next(new Problem('cross-site'));
      if (validateRequest(request)) return next();
      next(
        new Problem('csrf-token', {
          detail: 'Get a new one from /api/auth/csrf and send it as x-csrf-token.',
        }),
      );
    },
    issueToken: (request, response) => {
      const cookies = request.cookies as Record<string, string | undefined>;
      if (!request.user && !cookies[visitorCookie]) {
        const visitor = randomBytes(16).toString('hex');
        cookies[visitorCookie] = visitor;
        response.cookie(visitorCookie, visitor, cookie);
      }
      return generateCsrfToken(request, response);
    },
  };
}

function isOwnPage(request: Request, publicOrigin: string | null): boolean {
  const site = request.get('Sec-Fetch-Site');
  if (site !== undefined) return site === 'same-origin' || site === 'none';
  const origin = request.get('Origin');
  // A program that is no browser sends neither; it has no visitor's cookies to abuse.
  if (origin === undefined) return true;
  if (origin === publicOrigin) return true;
  return URL.canParse(origin) && new URL(origin).host === request.get('Host');
}
