import type { TestRequest } from '@angular/common/http/testing';

/** Answers a request with a problem document, as the server does. */
export function answerProblem(
  request: TestRequest,
  status: number,
  code: string,
  members: Readonly<Record<string, unknown>> = {},
): void {
  const document = { type: `/api/docs#${code}`, title: `Title of ${code}`, status, ...members };
  request.flush(document, { status, statusText: code });
}

/** Answers a request as a broken line does: not at all. */
export function answerNothing(request: TestRequest): void {
  request.error(new ProgressEvent('error'));
}
