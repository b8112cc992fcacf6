/** One thing wrong with a field of what was sent. */
export interface ProblemIssue {
  /** JSON pointer into the request body, `/email`. */
  readonly pointer: string;
  readonly code?: string;
  readonly message: string;
}

/** Why a request was not done: the server's problem document (RFC 9457), or no answer at all (status 0). */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';

  constructor(
    readonly status: number,
    /** Stable name of the kind of problem: the last part of the document's `type`; `offline` without an answer. */
    readonly code: string,
    readonly title: string,
    readonly detail: string | undefined,
    readonly issues: readonly ProblemIssue[] = [],
    /** Everything the document said. */
    readonly document: Readonly<Record<string, unknown>> = {},
  ) {
    super(detail ?? title);
  }

  /** No server could be reached; what was asked may be asked again later. */
  get isOffline(): boolean {
    return this.status === 0;
  }

  /** Nothing is wrong with what was asked: the same request may be done in a moment. */
  get isPassing(): boolean {
    return this.isOffline || this.status === 429 || this.status === 503;
  }

  /** The first message about a field, if the server named it. */
  issueAt(pointer: string): string | undefined {
    return this.issues.find((issue) => issue.pointer === pointer)?.message;
  }
}
