import type { RequestHandler } from 'express';
import type { Rule } from '../auth/policy.js';
import { Problem } from './problem.js';

interface GuardParts {
  /** Finds out who is signed in. */
  readonly session: readonly RequestHandler[];
  readonly crossSite: RequestHandler;
  /** Whose a design is, deleted or not; null when there is none. */
  readonly designOwner: (id: string) => Promise<string | null>;
}

const SAFE_METHODS = ['GET', 'HEAD'];

/** What stands before a route, by its rule: who are you, does your own page ask this, is it yours. */
export function guardsOf({
  session,
  crossSite,
  designOwner,
}: GuardParts): (rule: Rule) => readonly RequestHandler[] {
  const signedIn: RequestHandler = (request, _response, next) => {
    next(request.user ? undefined : new Problem('sign-in-required'));
  };
  const ownPage: RequestHandler = (request, response, next) => {
    if (SAFE_METHODS.includes(request.method)) return next();
    return crossSite(request, response, next);
  };
  const ownDesign: RequestHandler = async (request, _response, next) => {
    const { id } = request.params;
    const owner = typeof id === 'string' ? await designOwner(id) : null;
    // Someone else's is answered as one that is not there.
    next(owner !== null && owner === request.user?.id ? undefined : new Problem('not-found'));
  };
  const guards: Readonly<Record<Rule, readonly RequestHandler[]>> = {
    public: [],
    anyone: [...session, ownPage],
    signedIn: [...session, signedIn, ownPage],
    designOwner: [...session, signedIn, ownPage, ownDesign],
  };
  return (rule) => guards[rule];
}
