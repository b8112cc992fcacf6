import type { Design } from '@shared/design';

/** The key of the design that a visitor without an account is at work on. */
export const VISITOR_DRAFT = 'visitor';

/** Work that no server has yet: a visitor's design, or unsaved changes of a stored one. */
export interface Draft {
  /** {@link VISITOR_DRAFT}, or the id of a stored design. */
  readonly key: string;
  readonly document: Design;
  /** Undo and redo, oldest first and next first, if they are to survive a reload. */
  readonly history: { readonly past: readonly Design[]; readonly future: readonly Design[] } | null;
  /** The revision that the work began from; null for a design that no server has. */
  readonly base: { readonly revision: number; readonly etag: string } | null;
  /** The server has this very document; the draft is here for its undo, and for opening it offline. */
  readonly isSaved?: boolean;
  /** UTC, ISO 8601. */
  readonly savedAt: string;
}
