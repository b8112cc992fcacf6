import { inject, Injectable } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { type Adoption, AdoptDrafts } from '../core/drafts/adopt-drafts';

/** What happens once someone is signed in: their drafts come along, and they get to where they wanted to be. */
@Injectable({ providedIn: 'root' })
export class Entrance {
  private readonly router = inject(Router);
  private readonly adoption = inject(AdoptDrafts);
  private readonly snackBar = inject(MatSnackBar);

  /** @param to the address they came from, as the query said */
  async enter(to: string | undefined): Promise<void> {
    const adopted = await this.adoption.adopt();
    await this.router.navigateByUrl(destination(to, adopted), { replaceUrl: true });
    const words = wordsFor(adopted);
    if (words) this.snackBar.open(words, undefined, { duration: 8_000 });
  }
}

/** An address of ours, or nothing: a link must not lead people elsewhere by way of us. */
export function localPath(to: string | undefined): string | undefined {
  return to !== undefined && /^\/(?![/\\])/.test(to) ? to : undefined;
}

function destination(to: string | undefined, { openId }: Adoption): string {
  const path = localPath(to);
  const isDraft = path === undefined || path === '/' || path.startsWith('/draft');
  if (!isDraft) return path;
  return openId === undefined ? '/' : `/designs/${encodeURIComponent(openId)}`;
}

function wordsFor({ saved, left }: Adoption): string | undefined {
  if (left > 0) return 'Not every draft could be saved. They are still in this browser: see the bench.';
  if (saved === 0) return undefined;
  return saved === 1 ? 'Your draft is saved on your bench' : `${saved} drafts are saved on your bench`;
}
