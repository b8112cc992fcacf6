import { randomUUID } from 'node:crypto';
import type { Logger } from 'pino';
import { type App, createApp } from './app.js';
import { AccountRepository } from './auth/account-repository.js';
import { Attempts } from './auth/attempts.js';
import { AuthService } from './auth/auth-service.js';
import { Passwords } from './auth/passwords.js';
import { SessionStore } from './auth/session-store.js';
import { SignIn } from './auth/sign-in.js';
import { CardService } from './cards/card-service.js';
import type { Compute } from './compute/tasks.js';
import type { Units } from './db/units.js';
import { seedDemo } from './demo/seed-demo.js';
import { DesignRepository } from './designs/design-repository.js';
import { DesignService } from './designs/design-service.js';
import { Health } from './health/health.js';
import { Housekeeping } from './housekeeping.js';
import { crossSiteGuard } from './http/cross-site.js';
import type { RateLimitConfig } from './http/rate-limits.js';

/** What the application is made from. */
export interface Materials {
  readonly log: Logger;
  readonly units: Units;
  readonly canStore: () => boolean;
  readonly compute: Compute;
  readonly secret: string;
  readonly publicOrigin: string | null;
  readonly trustedProxies: number;
  readonly limits: RateLimitConfig;
  readonly webFolder: string | null;
  readonly now: () => Date;
}

export interface Composition extends App {
  readonly auth: AuthService;
  readonly health: Health;
  readonly housekeeping: Housekeeping;
  /** Fills an empty database with an invented shop. */
  readonly seed: () => Promise<void>;
}

/** The only place where the parts of the server are made and told of each other. */
export function compose(materials: Materials): Composition {
  const { log, units, secret, publicOrigin, compute, now } = materials;
  const isSecure = publicOrigin?.startsWith('https:') ?? false;
  const clock = (): number => now().getTime();
  const passwords = new Passwords();
  const accounts = new AccountRepository(units);
  const auth = new AuthService({ accounts, passwords, now, newId: randomUUID });
  const store = new SessionStore(units, log, clock);
  const attempts = new Attempts(secret, clock);
  const designRows = new DesignRepository(units);
  const designs = new DesignService({ designs: designRows, compute, log, now, newId: randomUUID });
  const health = new Health({ units, canStore: materials.canStore });
  const app = createApp({
    log,
    health,
    auth,
    signIn: new SignIn({ service: auth, store, attempts, secret, isSecure }),
    crossSite: crossSiteGuard({ secret, isSecure, publicOrigin }),
    designRows,
    designs,
    cards: new CardService({ designs, compute, publicOrigin, now }),
    compute,
    limits: materials.limits,
    isSecure,
    trustedProxies: materials.trustedProxies,
    webFolder: materials.webFolder,
  });
  return {
    ...app,
    auth,
    health,
    housekeeping: new Housekeeping({ store, designs: designRows, log, now }),
    seed: () => seedDemo({ accounts, passwords, designs, now, newId: randomUUID }),
  };
}
