import type { CrossSiteGuard } from '../http/cross-site.js';
import { type RateLimitConfig, limitedByAddress } from '../http/rate-limits.js';
import type { Routes } from '../http/routes.js';
import {
  credentialsSchema,
  registrationSchema,
  sessionSchema,
  signedInSchema,
  tokenSchema,
} from './auth-schemas.js';
import type { AuthService } from './auth-service.js';
import type { SignIn } from './sign-in.js';

interface AuthRouteParts {
  readonly service: AuthService;
  readonly signIn: SignIn;
  readonly crossSite: CrossSiteGuard;
  readonly limits: RateLimitConfig;
}

const EXAMPLE = {
  account: { id: '7b0c2c0e-6a55-4c3b-9d6a-4f1f0f1f7f10', name: 'Ada', email: 'ada@forge.example' },
  shops: [{ id: '0d9a4b52-55c5-4a9b-8f4e-2f2b0c1d9e31', name: 'Ada’s shop', role: 'owner' }],
};

const NEEDS_TOKEN = { 'x-csrf-token': 'The token from /api/auth/csrf' };

/** Accounts and sessions. */
export function addAuthRoutes(routes: Routes, parts: AuthRouteParts): void {
  const { service, signIn, crossSite, limits } = parts;

  routes.add({
    method: 'GET',
    path: '/api/auth/csrf',
    operation: {
      id: 'getToken',
      tag: 'Accounts',
      summary: 'Get a token for changes',
      description:
        'Every request that changes something carries this token as the header x-csrf-token. It belongs to the session: ' +
        'get a new one after signing in or out.',
      answers: {
        200: { description: 'The token', schema: tokenSchema, example: { token: '5f2a….9c1e…' } },
      },
      problems: [],
    },
    handle: ({ request, response }) => ({
      status: 200,
      json: { token: crossSite.issueToken(request, response) },
    }),
  });

  routes.add({
    method: 'POST',
    path: '/api/auth/register',
    limiter: limitedByAddress(limits.registrations),
    body: registrationSchema,
    operation: {
      id: 'register',
      tag: 'Accounts',
      summary: 'Make an account',
      description: 'Makes an account and a shop that it owns, and signs in.',
      headers: NEEDS_TOKEN,
      bodyExample: { name: 'Ada', email: 'ada@forge.example', password: 'three hammers and a tong' },
      answers: {
        201: { description: 'The account is made and signed in', schema: signedInSchema, example: EXAMPLE },
      },
      problems: [
        'invalid-request',
        'email-taken',
        'csrf-token',
        'cross-site',
        'too-many-requests',
        'storage-unavailable',
      ],
    },
    handle: async ({ body, request, response }) => {
      const account = await service.register(body);
      await signIn.begin(request, response, account);
      return { status: 201, json: await service.signedIn(account) };
    },
  });

  routes.add({
    method: 'POST',
    path: '/api/auth/login',
    limiter: limitedByAddress(limits.signIns),
    body: credentialsSchema,
    operation: {
      id: 'signIn',
      tag: 'Accounts',
      summary: 'Sign in',
      description:
        'Signs in with e-mail address and password. Unknown addresses and wrong passwords are answered alike.',
      headers: NEEDS_TOKEN,
      bodyExample: { email: 'ada@forge.example', password: 'three hammers and a tong' },
      answers: { 200: { description: 'Signed in', schema: signedInSchema, example: EXAMPLE } },
      problems: [
        'invalid-request',
        'wrong-credentials',
        'csrf-token',
        'cross-site',
        'too-many-requests',
        'storage-unavailable',
      ],
    },
    handle: async ({ body, request, response }) => {
      // Passport reads the body itself, so it is given the checked one.
      request.body = body;
      const account = await signIn.withPassword(request, response, body.email);
      return { status: 200, json: await service.signedIn(account) };
    },
  });

  routes.add({
    method: 'POST',
    path: '/api/auth/logout',
    operation: {
      id: 'signOut',
      tag: 'Accounts',
      summary: 'Sign out',
      description: 'Ends the session at once, here and on the server. Does no harm when nobody is signed in.',
      headers: NEEDS_TOKEN,
      answers: { 204: { description: 'Nobody is signed in any more' } },
      problems: ['csrf-token', 'cross-site', 'storage-unavailable'],
    },
    handle: async ({ request, response }) => {
      await signIn.end(request, response);
      return { status: 204 };
    },
  });

  routes.add({
    method: 'GET',
    path: '/api/auth/me',
    operation: {
      id: 'whoAmI',
      tag: 'Accounts',
      summary: 'Say who is signed in',
      description: 'The account of this session and the shops it belongs to.',
      answers: { 200: { description: 'Who is signed in', schema: signedInSchema, example: EXAMPLE } },
      problems: ['sign-in-required'],
    },
    handle: async ({ account }) => ({ status: 200, json: await service.signedIn(account) }),
  });

  routes.add({
    method: 'GET',
    path: '/api/auth/session',
    operation: {
      id: 'getSession',
      tag: 'Accounts',
      summary: 'Say whether anyone is signed in',
      description: 'For a page that opens: who is signed in, or that nobody is, which is no error.',
      answers: {
        200: {
          description: 'Who is signed in, if anyone',
          schema: sessionSchema,
          example: { signedIn: EXAMPLE },
        },
      },
      problems: [],
    },
    handle: async ({ request }) => ({
      status: 200,
      json: { signedIn: request.user ? await service.signedIn(request.user) : null },
    }),
  });
}
