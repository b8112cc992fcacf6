import type { RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import { Problem } from './problem.js';

/** How many requests one address may make in a time, beside what guards a single account. */
export interface RateLimitConfig {
  readonly signIns: Allowance;
  readonly registrations: Allowance;
  /** Work that costs the server something though nobody is signed in. */
  readonly computations: Allowance;
}

export interface Allowance {
  readonly count: number;
  readonly windowMs: number;
}

const MINUTE_MS = 60_000;

/** Generous, since a whole forging class may sit behind one address. */
export const DEFAULT_RATE_LIMITS: RateLimitConfig = {
  signIns: { count: 200, windowMs: 15 * MINUTE_MS },
  registrations: { count: 100, windowMs: 60 * MINUTE_MS },
  computations: { count: 1200, windowMs: MINUTE_MS },
};

/** Answers 429 to an address that asks too often. */
export function limitedByAddress({ count, windowMs }: Allowance): RequestHandler {
  return rateLimit({
    limit: count,
    windowMs,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    // Whether a proxy stands before us is said by the settings, not guessed from a request.
    validate: { xForwardedForHeader: false, trustProxy: false },
    handler: (_request, response, next) => {
      const after = response.getHeader('Retry-After') ?? Math.ceil(windowMs / 1000);
      next(new Problem('too-many-requests', { detail: `Try again in ${String(after)} seconds.` }));
    },
  });
}
