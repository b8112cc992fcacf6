import express, { type Request, type RequestHandler, type Response, Router } from 'express';
import type { z } from 'zod';
import { type Method, type Rule, ruleOf } from '../auth/policy.js';
import type { SignedInAccount } from '../auth/signed-in-account.js';
import type { Operation } from '../openapi/operation.js';
import { Problem } from './problem.js';
import { validated } from './validate.js';

/** The largest body that is read, after it has been unpacked. */
const BODY_LIMIT = '1mb';

/** What a handler is given: everything checked, nothing raw. */
export interface Call<Body, Query> {
  readonly body: Body;
  readonly query: Query;
  readonly params: Readonly<Record<string, string>>;
  /** Who is signed in. Throws on a route whose rule lets others in. */
  readonly account: SignedInAccount;
  readonly request: Request;
  readonly response: Response;
}

/** What a handler answers. */
export type Answer =
  | { readonly status: number; readonly json: unknown; readonly headers?: Readonly<Record<string, string>> }
  | {
      readonly status: number;
      readonly bytes: Uint8Array | string;
      /** Media type. */
      readonly type: string;
      readonly headers?: Readonly<Record<string, string>>;
    }
  | { readonly status: 204; readonly headers?: Readonly<Record<string, string>> };

export interface Route<Body = undefined, Query = undefined> {
  readonly method: Method;
  /** As Express writes it: `/api/designs/:id`. */
  readonly path: string;
  readonly operation: Operation;
  readonly body?: z.ZodType<Body>;
  readonly query?: z.ZodType<Query>;
  /** Runs before everything else. */
  readonly limiter?: RequestHandler;
  readonly handle: (call: Call<Body, Query>) => Answer | Promise<Answer>;
}

/** A route as the documentation and the specs see it. */
export interface RegisteredRoute {
  readonly method: Method;
  readonly path: string;
  readonly rule: Rule;
  readonly operation: Operation;
  readonly body: z.ZodType | null;
  readonly query: z.ZodType | null;
}

/** The only way to add a route: each gets the guards of its rule, and a place in the documentation. */
export class Routes {
  readonly router = Router();
  readonly #registered: RegisteredRoute[] = [];
  readonly #guards: (rule: Rule) => readonly RequestHandler[];

  constructor(guards: (rule: Rule) => readonly RequestHandler[]) {
    this.#guards = guards;
  }

  get registered(): readonly RegisteredRoute[] {
    return this.#registered;
  }

  add<Body = undefined, Query = undefined>(route: Route<Body, Query>): void {
    const { method, path, operation, body, query } = route;
    const rule = ruleOf(method, path);
    this.#registered.push({ method, path, rule, operation, body: body ?? null, query: query ?? null });
    const handlers = [
      ...(route.limiter ? [route.limiter] : []),
      ...this.#guards(rule),
      ...(body ? jsonBody : []),
      handlerOf(route),
    ];
    this.router.route(path)[methodName(method)](...handlers);
  }

  /** Comes after all routes: what is under `/api` and is no route. */
  readonly notFound: RequestHandler = (request, _response, next) => {
    const methods = this.#registered
      .filter(({ path }) => matches(path, request.path))
      .map(({ method }) => method);
    if (methods.length === 0) return next(new Problem('not-found'));
    next(new Problem('method-not-allowed', { headers: { Allow: methods.join(', ') } }));
  };
}

const parseJson = express.json({ limit: BODY_LIMIT, type: ['application/json', 'application/*+json'] });

const jsonBody: readonly RequestHandler[] = [
  (request, _response, next) => {
    if (request.is(['application/json', 'application/*+json']) === false) {
      return next(
        new Problem('unsupported-media-type', { detail: 'Send it with Content-Type: application/json.' }),
      );
    }
    next();
  },
  parseJson,
];

function handlerOf<Body, Query>(route: Route<Body, Query>): RequestHandler {
  return async (request, response) => {
    const answer = await route.handle({
      body: (route.body ? validated(route.body, request.body) : undefined) as Body,
      query: (route.query ? validated(route.query, request.query) : undefined) as Query,
      params: request.params as Readonly<Record<string, string>>,
      get account() {
        if (!request.user) throw new Error(`Nobody has to be signed in at ${route.method} ${route.path}.`);
        return request.user;
      },
      request,
      response,
    });
    send(response, answer);
  };
}

function send(response: Response, answer: Answer): void {
  response.status(answer.status);
  // Personal unless a handler says otherwise.
  response.set({ 'Cache-Control': 'no-store', ...answer.headers });
  if ('json' in answer) response.json(answer.json);
  else if ('bytes' in answer) response.type(answer.type).send(asBody(answer.bytes));
  else response.end();
}

function asBody(bytes: Uint8Array | string): Buffer | string {
  return typeof bytes === 'string' ? bytes : Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
}

function methodName(method: Method): 'get' | 'post' | 'put' | 'delete' {
  return method.toLowerCase() as 'get' | 'post' | 'put' | 'delete';
}

function matches(pattern: string, path: string): boolean {
  const parts = pattern.split('/');
  const given = path.split('/');
  return (
    parts.length === given.length && parts.every((part, at) => part.startsWith(':') || part === given[at])
  );
}
