import type { HttpErrorResponse } from '@angular/common/http';
import { ProblemError, type ProblemIssue } from './problem-error';

/** Statuses by which a proxy says that the server behind it does not answer. */
const GATEWAY_STATUSES = [502, 503, 504];

/** Reads a failed answer. What is no problem document gets a title of our own. */
export function problemOf(response: HttpErrorResponse): ProblemError {
  const document = asObject(response.error);
  const isProblem = document !== undefined && typeof document['title'] === 'string';
  if (response.status === 0 || (!isProblem && GATEWAY_STATUSES.includes(response.status))) {
    return new ProblemError(0, 'offline', 'The server can’t be reached', undefined);
  }
  if (!isProblem) {
    return new ProblemError(
      response.status,
      `http-${response.status}`,
      response.status >= 500 ? 'The server failed' : 'The server refused this',
      undefined,
    );
  }
  return new ProblemError(
    response.status,
    codeOf(document['type'], response.status),
    document['title'] as string,
    typeof document['detail'] === 'string' ? document['detail'] : undefined,
    issuesOf(document['issues']),
    document,
  );
}

/** Failed requests for anything but JSON carry the document as text. */
function asObject(body: unknown): Record<string, unknown> | undefined {
  if (typeof body === 'string') {
    try {
      return asObject(JSON.parse(body));
    } catch {
      return undefined;
    }
  }
  return typeof body === 'object' && body !== null && !Array.isArray(body)
    ? (body as Record<string, unknown>)
    : undefined;
}

function codeOf(type: unknown, status: number): string {
  const last = typeof type === 'string' ? type.split(/[/:#]/).at(-1) : undefined;
  return last ? last : `http-${status}`;
}

function issuesOf(issues: unknown): readonly ProblemIssue[] {
  if (!Array.isArray(issues)) return [];
  return issues.flatMap((issue: unknown): ProblemIssue[] => {
    const object = asObject(issue);
    const message = object?.['message'] ?? object?.['detail'];
    if (object === undefined || typeof message !== 'string') return [];
    return [
      {
        pointer: typeof object['pointer'] === 'string' ? object['pointer'] : '',
        ...(typeof object['code'] === 'string' && { code: object['code'] }),
        message,
      },
    ];
  });
}
