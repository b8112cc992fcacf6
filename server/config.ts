import { existsSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { DEFAULT_RATE_LIMITS, type RateLimitConfig } from './http/rate-limits.js';

/** The settings of a server; each has a default, so that none has to be given. */
export interface Config {
  readonly port: number;
  readonly host: string;
  readonly dataFolder: string;
  /** Where people reach the site, as `https://forge.example`; null when nobody said. */
  readonly publicOrigin: string | null;
  /** Null: one is made and kept in the data folder. */
  readonly sessionSecret: string | null;
  /** A new database begins with an invented shop. */
  readonly hasDemo: boolean;
  readonly logLevel: LogLevel;
  readonly trustedProxies: number;
  readonly limits: RateLimitConfig;
  readonly webFolder: string | null;
}

const LOG_LEVELS = ['fatal', 'error', 'warn', 'info', 'debug', 'silent'] as const;
type LogLevel = (typeof LOG_LEVELS)[number];

const MIN_SECRET_LENGTH = 32;

/** A setting has a value that it cannot have. */
export class ConfigError extends Error {
  override readonly name = 'ConfigError';

  constructor(variable: string, value: string, expected: string) {
    super(`${variable} is ${JSON.stringify(value)}; it has to be ${expected}.`);
  }
}

type Environment = Readonly<Record<string, string | undefined>>;

/** Reads the settings; an empty value counts as none. Throws {@link ConfigError} naming the first that is wrong. */
export function configFrom(environment: Environment): Config {
  const given = (name: string): string | null => environment[name]?.trim() || null;
  const publicOrigin = originOf(given('PUBLIC_URL'));
  // Nothing but a proxy can give people HTTPS here.
  const proxies = publicOrigin?.startsWith('https:') ? 1 : 0;
  return {
    port: wholeNumber('PORT', given('PORT'), 4210, 65_535),
    host: hostOf(given('HOST')),
    dataFolder: resolve(given('DATA_DIR') ?? 'data'),
    publicOrigin,
    sessionSecret: secretOf(given('SESSION_SECRET')),
    hasDemo: flag('SEED_DEMO', given('SEED_DEMO'), true),
    logLevel: logLevelOf(given('LOG_LEVEL')),
    trustedProxies: wholeNumber('TRUST_PROXY', given('TRUST_PROXY'), proxies, 10),
    limits: DEFAULT_RATE_LIMITS,
    webFolder: builtPage(),
  };
}

function wholeNumber(name: string, value: string | null, otherwise: number, max: number): number {
  if (value === null) return otherwise;
  if (/^\d+$/.test(value) && Number(value) <= max) return Number(value);
  throw new ConfigError(name, value, `a whole number from 0 to ${max}`);
}

function hostOf(value: string | null): string {
  if (value === null) return '127.0.0.1';
  if (/^[\w.:-]+$/.test(value)) return value;
  throw new ConfigError('HOST', value, 'an address or a host name');
}

function originOf(value: string | null): string | null {
  if (value === null) return null;
  const url = URL.canParse(value) ? new URL(value) : null;
  const isOrigin =
    url && ['http:', 'https:'].includes(url.protocol) && url.pathname === '/' && !url.search && !url.hash;
  if (isOrigin && !url.username) return url.origin;
  throw new ConfigError('PUBLIC_URL', value, 'an address without a path, as https://forge.example');
}

function secretOf(value: string | null): string | null {
  if (value === null || value.length >= MIN_SECRET_LENGTH) return value;
  // Said without the value: it would end up in a log.
  throw new ConfigError('SESSION_SECRET', '…', `at least ${MIN_SECRET_LENGTH} characters long`);
}

function flag(name: string, value: string | null, otherwise: boolean): boolean {
  if (value === null) return otherwise;
  if (value === '0' || value === '1') return value === '1';
  throw new ConfigError(name, value, '0 or 1');
}

function logLevelOf(value: string | null): LogLevel {
  const level = LOG_LEVELS.find((name) => name === (value ?? 'info'));
  if (level) return level;
  throw new ConfigError('LOG_LEVEL', value ?? '', `one of ${LOG_LEVELS.join(', ')}`);
}

/** The built page of the project that this file belongs to, as a source or compiled; null when it was not built. */
function builtPage(): string | null {
  let folder = import.meta.dirname;
  while (!existsSync(join(folder, 'package.json'))) {
    const parent = dirname(folder);
    if (parent === folder) return null;
    folder = parent;
  }
  const page = join(folder, 'dist', 'web');
  return existsSync(join(page, 'index.html')) ? page : null;
}
