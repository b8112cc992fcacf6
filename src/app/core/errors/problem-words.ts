import { ProblemError } from '../http/problem-error';

/** What a failure means for the reader and what to do, in one or two sentences. */
export function problemWords(error: unknown): string {
  if (!(error instanceof ProblemError)) return 'Something went wrong in this page. Reload it and try again.';
  if (error.isOffline) return 'The server can’t be reached. Check the connection and try again.';
  const known = WORDS[error.code];
  if (known !== undefined) return known;
  if (error.status >= 500) return 'Something went wrong on the server. Try again in a moment.';
  const detail = error.issues[0]?.message ?? error.detail;
  return detail === undefined ? `${error.title}.` : `${error.title}. ${detail}`;
}

const WORDS: Readonly<Record<string, string | undefined>> = {
  'sign-in-required': 'You are signed out. Sign in again to go on.',
  'wrong-credentials': 'E-mail address or password is wrong.',
  'csrf-token': 'This page has been open for too long. Reload it and try again.',
  'not-found': 'It is not there any more, or not yours to see.',
  'email-taken': 'There is an account with this e-mail address. Sign in instead.',
  'stale-revision': 'It was changed elsewhere meanwhile. Open it again to see how it is now.',
  'too-many-requests': 'Too many tries in a short time. Wait a few minutes, then try again.',
  'storage-unavailable': 'The server can’t store anything at the moment. Try again in a moment.',
  'too-busy': 'The server has too much to do at the moment. Try again in a moment.',
};
