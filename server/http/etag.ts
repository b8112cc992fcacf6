import { createHash } from 'node:crypto';
import { Problem } from './problem.js';

/** What an ETag is made from: the revision, and the moment, in case a backup brings a number back. */
export interface Revised {
  readonly revision: number;
  /** ISO 8601, UTC. */
  readonly updatedAt: string;
}

/** The ETag that names this very revision. */
export function etagOf({ revision, updatedAt }: Revised): string {
  return `"${revision}-${Date.parse(updatedAt).toString(36)}"`;
}

/** The ETag of something that has no revisions: a hash of its content. */
export function contentEtag(content: string): string {
  return `"${createHash('sha256').update(content).digest('base64url').slice(0, 22)}"`;
}

/**
 * The ETags in an `If-Match` header. Throws when there is none, or when it would match anything: a change has to say
 * which revision it was made from.
 */
export function requiredIfMatch(header: string | undefined): readonly string[] {
  // A proxy that compresses may have marked the tag as weak; it names the revision all the same.
  const tags = [...(header ?? '').matchAll(/(?:W\/)?("[^"]*")/g)].map((match) => match[1] ?? '');
  if (tags.length > 0) return tags;
  throw new Problem('revision-required', {
    detail:
      'Send the ETag of the revision that you changed as If-Match, so that nobody else’s change is lost.',
  });
}

/** Throws unless one of `ifMatch` names the revision that is there now. */
export function requireCurrent(ifMatch: readonly string[], current: Revised): void {
  const etag = etagOf(current);
  if (ifMatch.includes(etag)) return;
  throw new Problem('stale-revision', {
    detail: `It is at revision ${current.revision} now. Nothing was changed.`,
    headers: { ETag: etag },
    members: { revision: current.revision, updatedAt: current.updatedAt, etag },
  });
}
