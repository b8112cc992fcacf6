import cookieParser from 'cookie-parser';
import type { Request, RequestHandler, Response } from 'express';
import session from 'express-session';
import { Passport } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Attempts } from './attempts.js';
import type { AuthService } from './auth-service.js';
import { SESSION_IDLE_MS, type SessionStore } from './session-store.js';
import type { SignedInAccount } from './signed-in-account.js';
import { Problem } from '../http/problem.js';

const YEAR_MS = 365 * 24 * 60 * 60_000;

interface SignInParts {
  readonly service: AuthService;
  readonly store: SessionStore;
  readonly attempts: Attempts;
  readonly secret: string;
  readonly isSecure: boolean;
}

/** Signing in and out, and knowing who is signed in: Passport and the session, with our rules around them. */
export class SignIn {
  /** Finds out who is signed in, if anyone is. */
  readonly middleware: readonly RequestHandler[];
  readonly #parts: SignInParts;
  readonly #passport = new Passport();
  readonly #sessionCookie: string;
  readonly #deviceCookie: string;

  constructor(parts: SignInParts) {
    this.#parts = parts;
    // The prefix makes the browser refuse such a cookie from a neighbouring host, but works over HTTPS only.
    const prefix = parts.isSecure ? '__Host-' : '';
    this.#sessionCookie = `${prefix}layerwright.session`;
    this.#deviceCookie = `${prefix}layerwright.device`;
    this.#passport.use(
      new LocalStrategy({ usernameField: 'email', session: false }, (email, password, done) => {
        parts.service.authenticate(email, password).then((account) => done(null, account ?? false), done);
      }),
    );
    this.#passport.serializeUser<string>((account, done) => done(null, account.id));
    this.#passport.deserializeUser<string>((id, done) => {
      parts.service.find(id).then((account) => done(null, account ?? false), done);
    });
    this.middleware = [
      cookieParser(),
      byHttps(parts.isSecure),
      session({
        name: this.#sessionCookie,
        secret: parts.secret,
        proxy: parts.isSecure,
        store: parts.store,
        resave: false,
        saveUninitialized: false,
        rolling: true,
        cookie: { ...this.#cookie, maxAge: SESSION_IDLE_MS },
      }),
      this.#passport.session() as RequestHandler,
    ];
  }

  /** Signs in with address and password; the session gets a new number. Throws when they are wrong. */
  async withPassword(request: Request, response: Response, email: string): Promise<SignedInAccount> {
    const { attempts } = this.#parts;
    const cookies = request.cookies as Readonly<Record<string, string | undefined>>;
    const attempt = attempts.begin(email, cookies[this.#deviceCookie]);
    const account = await this.#checked(request, response);
    if (!account) {
      attempts.failed(attempt);
      throw new Problem('wrong-credentials', { detail: 'Check both and try again.' });
    }
    attempts.succeeded(attempt);
    await this.begin(request, response, account);
    return account;
  }

  /** Begins a session for someone who has just proved who they are. */
  async begin(request: Request, response: Response, account: SignedInAccount): Promise<void> {
    await new Promise<void>((resolve, reject) => {
      request.logIn(account, (error: unknown) => (error ? reject(asError(error)) : resolve()));
    });
    response.cookie(this.#deviceCookie, this.#parts.attempts.markFor(account.email), {
      ...this.#cookie,
      maxAge: YEAR_MS,
    });
  }

  /** Ends the session here and on the server. */
  async end(request: Request, response: Response): Promise<void> {
    await new Promise<void>((resolve, reject) => {
      request.session.destroy((error: unknown) => (error ? reject(asError(error)) : resolve()));
    });
    response.clearCookie(this.#sessionCookie, this.#cookie);
  }

  get #cookie() {
    return { httpOnly: true, sameSite: 'lax', secure: this.#parts.isSecure, path: '/' } as const;
  }

  #checked(request: Request, response: Response): Promise<SignedInAccount | null> {
    return new Promise((resolve, reject) => {
      const done = (error: unknown, account?: Express.User | false | null): void => {
        if (error) reject(asError(error));
        else resolve(account || null);
      };
      const authenticate = this.#passport.authenticate('local', done) as RequestHandler;
      void authenticate(request, response, done);
    });
  }
}

/**
 * Where people come by HTTPS it ends at a proxy, which need not say so. The session's cookie is for HTTPS only, and would
 * not be given out at all to a request that seems to come without.
 */
function byHttps(isSecure: boolean): RequestHandler {
  return (request, _response, next) => {
    if (isSecure) request.headers['x-forwarded-proto'] = 'https';
    next();
  };
}

function asError(error: unknown): Error {
  return error instanceof Error ? error : new Error(String(error));
}
