import { inject, Injectable } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { DesignsApi } from '../designs/designs-api';
import { VISITOR_DRAFT } from './draft';
import { VisitorDrafts } from './visitor-drafts';

/** What became of a visitor's drafts when an account was there to take them. */
export interface Adoption {
  /** Id of the design made of the draft on the anvil; of the newest if none was. */
  readonly openId: string | undefined;
  readonly saved: number;
  /** Drafts that the server did not take; they stay in the browser. */
  readonly left: number;
}

/** Makes a visitor's drafts designs of the account that has just come to be, or come back. */
@Injectable({ providedIn: 'root' })
export class AdoptDrafts {
  private readonly visitor = inject(VisitorDrafts);
  private readonly designs = inject(DesignsApi);

  async adopt(): Promise<Adoption> {
    await this.visitor.load();
    let openId: string | undefined;
    let saved = 0;
    let left = 0;
    // One after the other: each is gone from the browser only once the server has it.
    for (const draft of this.visitor.drafts() ?? []) {
      try {
        const design = await firstValueFrom(this.designs.create(draft.document));
        await this.visitor.remove(draft.key);
        saved += 1;
        if (draft.key === VISITOR_DRAFT || openId === undefined) openId = design.id;
      } catch {
        left += 1;
      }
    }
    return { openId, saved, left };
  }
}
