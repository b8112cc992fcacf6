import type { ErrorRequestHandler, Response } from 'express';
import { StorageUnavailableError } from '../db/units.js';
import { Problem, type ProblemCode } from './problem.js';

/** The kinds of error by which Express's own parts say what is wrong with a request. */
const KNOWN_TYPES: Readonly<Record<string, ProblemCode>> = {
  'entity.parse.failed': 'malformed-json',
  'entity.too.large': 'body-too-large',
  'encoding.unsupported': 'unsupported-media-type',
  'charset.unsupported': 'unsupported-media-type',
  'request.size.invalid': 'malformed-json',
  'request.aborted': 'malformed-json',
};

/** The last handler: every error leaves as a problem document, and only the unexpected ones are logged in full. */
export const errorHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  const problem = problemFrom(error);
  if (problem.status >= 500) request.log.error({ err: error }, problem.message);
  if (response.headersSent) {
    // Too late for a document: Express ends the connection, so that half an answer is not taken for a whole one.
    next(error);
    return;
  }
  sendProblem(response, problem);
};

function sendProblem(response: Response, problem: Problem): void {
  response.removeHeader('ETag');
  response.removeHeader('Content-Type');
  response
    .status(problem.status)
    .set({ 'Cache-Control': 'no-store', ...problem.more.headers })
    .type('application/problem+json')
    .send(JSON.stringify(problem.document(String(response.getHeader('X-Request-Id')))));
}

function problemFrom(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (error instanceof StorageUnavailableError) {
    return new Problem('storage-unavailable', {
      detail: 'What you sent was not stored. What was stored before can be read. Try again in a moment.',
      headers: { 'Retry-After': '5' },
    });
  }
  if (error instanceof Error) {
    if ('type' in error && typeof error.type === 'string') {
      const code = KNOWN_TYPES[error.type];
      if (code) return new Problem(code, { detail: error.message });
    }
    // The router's own errors, as for a path that cannot be decoded.
    if ('status' in error && error.status === 400)
      return new Problem('invalid-request', { detail: error.message });
  }
  return new Problem('internal-error', {
    detail: 'The log has more about it, under the number of this request.',
  });
}
