import { z } from 'zod';
import { jsonPointer } from './json-pointer.js';
import { Problem, type ProblemIssue } from './problem.js';

// No code is made from strings here either, as in the page.
z.config({ jitless: true });

/** The most issues that one answer lists. */
const MAX_ISSUES = 50;

/** What `schema` makes of `input`; throws a problem that names each field that is wrong. */
export function validated<T>(schema: z.ZodType<T>, input: unknown): T {
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  throw invalidRequest(parsed.error.issues.flatMap(issuesOf));
}

/** A problem that lists what is wrong with a request. */
export function invalidRequest(issues: readonly ProblemIssue[]): Problem {
  const shown = issues.slice(0, MAX_ISSUES);
  const more =
    issues.length > shown.length ? ` The first ${shown.length} of ${issues.length} are listed.` : '';
  return new Problem('invalid-request', {
    detail: `${issues.length === 1 ? 'One field is' : `${issues.length} fields are`} not as they should be.${more}`,
    issues: shown,
  });
}

function issuesOf(issue: z.core.$ZodIssue): ProblemIssue[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      pointer: jsonPointer([...issue.path, key]),
      code: 'field-unknown',
      message: `There is no field "${key}" here.`,
    }));
  }
  return [
    { pointer: jsonPointer(issue.path), code: issue.code.replaceAll('_', '-'), message: issue.message },
  ];
}
