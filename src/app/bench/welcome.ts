import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import type { Starter } from '@shared/design';
import { VisitorDrafts } from '../core/drafts/visitor-drafts';
import { SessionStore } from '../core/session/session-store';
import { DraftList } from './draft-list';
import { HeroDrawing } from './hero-drawing';
import { StarterGallery } from './starter-gallery';

/** For whoever has no account, or is not signed in: what this is, a design to begin with at once, and drafts to go on with. */
@Component({
  selector: 'lw-welcome',
  imports: [DraftList, HeroDrawing, MatButton, RouterLink, StarterGallery],
  templateUrl: './welcome.html',
  styleUrl: './welcome.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Welcome {
  private readonly router = inject(Router);
  protected readonly visitor = inject(VisitorDrafts);
  protected readonly session = inject(SessionStore);
  protected readonly isStarting = signal(false);

  constructor() {
    void this.visitor.load();
  }

  /** With thirteen layers of two steels. */
  protected async startPlain(): Promise<void> {
    const { plainestStarter } = await import('./starter-figures');
    await this.start(plainestStarter());
  }

  protected async start(starter: Starter): Promise<void> {
    if (this.isStarting()) return;
    this.isStarting.set(true);
    try {
      await this.visitor.start(starter.design);
      await this.router.navigateByUrl('/draft');
    } finally {
      this.isStarting.set(false);
    }
  }
}
