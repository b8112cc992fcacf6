import type { z } from 'zod';
import type { ProblemCode } from '../http/problem.js';

/** What the documentation says about an answer. */
export interface DocumentedAnswer {
  readonly description: string;
  /** What the JSON looks like; without it the answer has another type, or no body. */
  readonly schema?: z.ZodType;
  /** Media type, if it is not JSON. */
  readonly type?: string;
  readonly example?: unknown;
  /** Headers that matter, with what they say. */
  readonly headers?: Readonly<Record<string, string>>;
}

/** What the documentation says about a route, beside its schemas. */
export interface Operation {
  /** A name for it in a program. */
  readonly id: string;
  readonly tag: string;
  /** A few words. */
  readonly summary: string;
  /** What one has to know to use it. */
  readonly description: string;
  readonly bodyExample?: unknown;
  /** What the body is, where the route itself checks but a part of it. */
  readonly bodySchema?: z.ZodType;
  /** What the parameters in the path mean. */
  readonly params?: Readonly<Record<string, string>>;
  /** Headers that are needed, with what they say. */
  readonly headers?: Readonly<Record<string, string>>;
  readonly answers: Readonly<Record<number, DocumentedAnswer>>;
  readonly problems: readonly ProblemCode[];
}
