import compression from 'compression';
import express, { type Express } from 'express';
import type { Logger } from 'pino';
import { addAuthRoutes } from './auth/auth-routes.js';
import type { AuthService } from './auth/auth-service.js';
import type { SignIn } from './auth/sign-in.js';
import { addCardRoutes } from './cards/card-routes.js';
import type { CardService } from './cards/card-service.js';
import type { Compute } from './compute/tasks.js';
import { addDesignRoutes } from './designs/design-routes.js';
import type { DesignRepository } from './designs/design-repository.js';
import type { DesignService } from './designs/design-service.js';
import { addEvaluateRoutes } from './evaluate/evaluate-routes.js';
import type { Health } from './health/health.js';
import { addHealthRoutes } from './health/health-routes.js';
import type { CrossSiteGuard } from './http/cross-site.js';
import { errorHandler } from './http/error-handler.js';
import { guardsOf } from './http/guards.js';
import type { RateLimitConfig } from './http/rate-limits.js';
import { requestLog } from './http/request-log.js';
import { Routes } from './http/routes.js';
import { securityHeaders } from './http/security-headers.js';
import { webFiles } from './http/web-files.js';
import { addDocsRoutes } from './openapi/docs-routes.js';
import { addSteelRoutes } from './steels/steel-routes.js';

/** Everything the application is put together from. */
export interface AppParts {
  readonly log: Logger;
  readonly health: Health;
  readonly auth: AuthService;
  readonly signIn: SignIn;
  readonly crossSite: CrossSiteGuard;
  readonly designRows: DesignRepository;
  readonly designs: DesignService;
  readonly cards: CardService;
  readonly compute: Compute;
  readonly limits: RateLimitConfig;
  /** People reach the site by HTTPS. */
  readonly isSecure: boolean;
  /** Proxies before the server whose word about the caller's address is taken. */
  readonly trustedProxies: number;
  /** The built page; null serves the API alone. */
  readonly webFolder: string | null;
}

export interface App {
  readonly express: Express;
  readonly routes: Routes;
}

/** The application. It does not listen. */
export function createApp(parts: AppParts): App {
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.set('query parser', 'simple');
  app.set('trust proxy', parts.trustedProxies);
  app.use(requestLog(parts.log));
  app.use((_request, response, next) => {
    // A connection kept open would keep the server from ending.
    if (parts.health.isStopping) response.set('Connection', 'close');
    next();
  });
  app.use(securityHeaders(parts.isSecure));
  app.use(compression());

  const routes = new Routes(
    guardsOf({
      session: parts.signIn.middleware,
      crossSite: parts.crossSite.guard,
      designOwner: (id) => parts.designRows.ownerOf(id),
    }),
  );
  addHealthRoutes(routes, parts.health);
  addAuthRoutes(routes, { ...parts, service: parts.auth });
  addDesignRoutes(routes, parts.designs);
  addCardRoutes(routes, parts.cards);
  addEvaluateRoutes(routes, parts.compute, parts.limits);
  addSteelRoutes(routes);
  addDocsRoutes(routes);
  app.use(routes.router);
  if (parts.webFolder !== null) app.use(webFiles(parts.webFolder));
  app.use(routes.notFound);
  app.use(errorHandler);
  return { express: app, routes };
}
