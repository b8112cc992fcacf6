import type { Response } from 'supertest';
import { PROBLEMS, type ProblemCode, typeOf } from '../http/problem.js';
import { problemSchema } from '../openapi/openapi.js';

/** Expects an answer to be a proper problem document of a kind. */
export function expectProblem(answer: Response, code: ProblemCode, context = ''): void {
  expect(answer.body.type).withContext(context).toBe(typeOf(code));
  expect(answer.status).withContext(context).toBe(PROBLEMS[code].status);
  expectProblemDocument(answer, context);
}

/** Expects an answer to be a proper problem document, of whichever kind. */
export function expectProblemDocument(answer: Response, context = ''): void {
  expect(answer.headers['content-type']).withContext(context).toContain('application/problem+json');
  expect(problemSchema.safeParse(answer.body).error).withContext(context).toBeUndefined();
  expect(answer.body.status).withContext(context).toBe(answer.status);
  expect(answer.body.instance).withContext(context).toBe(`urn:uuid:${answer.headers['x-request-id']}`);
}
