import { createHash } from 'node:crypto';
import { type SessionData, Store } from 'express-session';
import type { Logger } from 'pino';
import { LessThan } from 'typeorm';
import { z } from 'zod';
import { SessionRow } from '../db/entities/index.js';
import type { Units } from '../db/units.js';

declare module 'express-session' {
  interface SessionData {
    passport?: { user?: string };
  }
}

const DAY_MS = 24 * 60 * 60_000;

/** A browser that is not used for so long is signed out: long, since nobody types a password with gloves on. */
export const SESSION_IDLE_MS = 30 * DAY_MS;
/** And after so long in any case. */
export const SESSION_ABSOLUTE_MS = 180 * DAY_MS;

/** Being used is written down this often at most: each time costs a snapshot of the database. */
const TOUCH_MS = 60_000;
const MAX_REMEMBERED = 10_000;

const storedSchema = z.looseObject({ cookie: z.looseObject({ originalMaxAge: z.number().nullable() }) });

type Callback<T = never> = (error?: unknown, result?: T | null) => void;

/** Sessions in the same database as everything else, through the same queue. */
export class SessionStore extends Store {
  /** When each session was last written, so that most touches need no query. */
  readonly #touched = new Map<string, number>();

  constructor(
    private readonly units: Units,
    private readonly log: Logger,
    private readonly now: () => number,
  ) {
    super();
  }

  override get(secret: string, callback: Callback<SessionData>): void {
    this.#load(keyOf(secret)).then((session) => callback(null, session), callback);
  }

  override set(secret: string, session: SessionData, callback?: Callback): void {
    this.#save(keyOf(secret), session).then(
      () => callback?.(),
      (error: unknown) => callback?.(error),
    );
  }

  override destroy(secret: string, callback?: Callback): void {
    const id = keyOf(secret);
    this.#touched.delete(id);
    this.units
      .write((manager) => manager.delete(SessionRow, { id }))
      .then(
        () => callback?.(),
        (error: unknown) => callback?.(error),
      );
  }

  override touch(secret: string, _session: SessionData, callback?: Callback): void {
    const id = keyOf(secret);
    const now = this.now();
    if (now - (this.#touched.get(id) ?? 0) < TOUCH_MS) return callback?.();
    this.#remember(id, now);
    const expiresAt = iso(now + SESSION_IDLE_MS);
    this.units
      .write((manager) => manager.update(SessionRow, { id }, { expiresAt }))
      .then(
        () => callback?.(),
        (error: unknown) => {
          // The request itself was answered from what is there; that it was made is no reason to fail it.
          this.log.warn({ err: error }, 'A session could not be kept alive');
          callback?.();
        },
      );
  }

  /** Clears away sessions that are over. */
  async removeExpired(): Promise<void> {
    const now = this.now();
    await this.units.write(async (manager) => {
      await manager.delete(SessionRow, { expiresAt: LessThan(iso(now)) });
      await manager.delete(SessionRow, { createdAt: LessThan(iso(now - SESSION_ABSOLUTE_MS)) });
    });
  }

  async #load(id: string): Promise<SessionData | null> {
    const row = await this.units.read((manager) => manager.findOneBy(SessionRow, { id }));
    const now = this.now();
    if (!row || Date.parse(row.expiresAt) <= now || Date.parse(row.createdAt) + SESSION_ABSOLUTE_MS <= now)
      return null;
    if (!this.#touched.has(id)) this.#remember(id, Date.parse(row.expiresAt) - SESSION_IDLE_MS);
    const data: unknown = JSON.parse(row.dataJson);
    return storedSchema.parse(data);
  }

  async #save(id: string, session: SessionData): Promise<void> {
    const now = this.now();
    const row = {
      accountId: session.passport?.user ?? null,
      dataJson: JSON.stringify(session),
      expiresAt: iso(now + SESSION_IDLE_MS),
    };
    await this.units.write(async (manager) => {
      const { affected } = await manager.update(SessionRow, { id }, row);
      if (affected === 0) await manager.insert(SessionRow, { id, ...row, createdAt: iso(now) });
    });
    this.#remember(id, now);
  }

  #remember(id: string, at: number): void {
    this.#touched.delete(id);
    this.#touched.set(id, at);
    const [oldest] = this.#touched.keys();
    if (this.#touched.size > MAX_REMEMBERED && oldest !== undefined) this.#touched.delete(oldest);
  }
}

/** The key of the row: the cookie's secret itself is nowhere on disk. */
function keyOf(secret: string): string {
  return createHash('sha256').update(secret).digest('hex');
}

function iso(milliseconds: number): string {
  return new Date(milliseconds).toISOString();
}
