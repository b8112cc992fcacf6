/** Something wrong in what was sent: where (a JSON pointer into the body), which rule, and in words. */
export interface ProblemIssue {
  readonly pointer: string;
  readonly code: string;
  readonly message: string;
}

/**
 * Every kind of problem that the API answers with. The key is the end of the document's `type` and never changes; the
 * documentation page has an anchor of that name.
 */
export const PROBLEMS = {
  'invalid-request': { status: 400, title: 'The request is not valid' },
  'malformed-json': { status: 400, title: 'The body is not JSON' },
  'sign-in-required': { status: 401, title: 'Sign in first' },
  'wrong-credentials': { status: 401, title: 'E-mail address or password is wrong' },
  'csrf-token': { status: 403, title: 'The token of this page is missing or outdated' },
  'cross-site': { status: 403, title: 'The request comes from another site' },
  'not-found': { status: 404, title: 'Not found' },
  'method-not-allowed': { status: 405, title: 'This cannot be done here' },
  'email-taken': { status: 409, title: 'There is an account with this e-mail address' },
  'too-many-designs': { status: 409, title: 'The bench is full' },
  'newer-stored-document': { status: 409, title: 'The stored design is of a newer version' },
  'stale-revision': { status: 412, title: 'The design has changed meanwhile' },
  'body-too-large': { status: 413, title: 'The body is too large' },
  'unsupported-media-type': { status: 415, title: 'The body has to be JSON' },
  'newer-document': { status: 422, title: 'The design is of a newer version' },
  'refused-step': { status: 422, title: 'A step cannot be done' },
  'too-much-work': { status: 422, title: 'The design takes too long to work out' },
  'revision-required': { status: 428, title: 'Say which revision this changes' },
  'too-many-requests': { status: 429, title: 'Too many requests' },
  'internal-error': { status: 500, title: 'Something went wrong here' },
  'storage-unavailable': { status: 503, title: 'Nothing can be stored at the moment' },
  'too-busy': { status: 503, title: 'Too much to do at the moment' },
} as const satisfies Record<string, { readonly status: number; readonly title: string }>;

export type ProblemCode = keyof typeof PROBLEMS;

export interface ProblemMore {
  /** What happened this time, and what to do. */
  readonly detail?: string;
  readonly issues?: readonly ProblemIssue[];
  readonly headers?: Readonly<Record<string, string>>;
  /** Further members of the document. */
  readonly members?: Readonly<Record<string, unknown>>;
}

/** The body of every error answer: a problem document as RFC 9457 has it. */
export interface ProblemDocument {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail?: string;
  /** Names this very request, as the log does. */
  readonly instance: string;
  readonly issues?: readonly ProblemIssue[];
  readonly [member: string]: unknown;
}

/** An error that is meant for whoever sent the request. */
export class Problem extends Error {
  override readonly name = 'Problem';

  constructor(
    readonly code: ProblemCode,
    readonly more: ProblemMore = {},
  ) {
    super(more.detail ?? PROBLEMS[code].title);
  }

  get status(): number {
    return PROBLEMS[this.code].status;
  }

  document(requestId: string): ProblemDocument {
    const { detail, issues, members } = this.more;
    return {
      type: typeOf(this.code),
      title: PROBLEMS[this.code].title,
      status: this.status,
      ...(detail === undefined ? {} : { detail }),
      instance: `urn:uuid:${requestId}`,
      ...(issues ? { issues } : {}),
      ...members,
    };
  }
}

/** The `type` of a kind of problem: where the API's documentation tells about it. */
export function typeOf(code: ProblemCode): string {
  return `/api/docs#${code}`;
}
