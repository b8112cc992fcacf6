import type { StoredDesign } from '../../core/designs/designs-api';
import type { ProblemError } from '../../core/http/problem-error';

/** Where the work stands against the server's copy. */
export type KeepState =
  /** The server has this very document. */
  | { readonly kind: 'saved' }
  /** Changed; a save follows by itself. */
  | { readonly kind: 'unsaved' }
  | { readonly kind: 'saving' }
  /** No server to be reached; the changes are in this browser and will be saved. */
  | { readonly kind: 'offline' }
  /** Someone saved in between: `theirs` is what the server has now, null until it could be fetched. */
  | { readonly kind: 'conflict'; readonly theirs: StoredDesign | null }
  /** The session is over; after signing in again the changes are saved. */
  | { readonly kind: 'signed-out' }
  /** Deleted elsewhere, or no longer this account's. */
  | { readonly kind: 'gone' }
  /** The server refused the document. */
  | { readonly kind: 'refused'; readonly problem: ProblemError }
  /** A visitor's design: kept in this browser. */
  | { readonly kind: 'browser' };

/** The state in words, short enough for the bar above the page. */
export function keepWords(state: KeepState, isKeptInBrowser: boolean): string {
  switch (state.kind) {
    case 'saved':
      return 'Saved';
    case 'unsaved':
      return 'Not saved yet';
    case 'saving':
      return 'Saving …';
    case 'offline':
      return isKeptInBrowser ? 'Offline: kept in this browser' : 'Offline: not saved';
    case 'conflict':
      return 'Changed elsewhere: not saved';
    case 'signed-out':
      return isKeptInBrowser ? 'Signed out: kept in this browser' : 'Signed out: not saved';
    case 'gone':
      return 'Deleted elsewhere: not saved';
    case 'refused':
      return 'Not saved';
    case 'browser':
      return isKeptInBrowser ? 'Kept in this browser' : 'Not kept: lost when this page is closed';
  }
}

/** Whether the reader has to do something before anything is saved again. */
export function needsReader(state: KeepState): boolean {
  return ['conflict', 'signed-out', 'gone', 'refused'].includes(state.kind);
}
