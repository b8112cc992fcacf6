import {
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatIcon } from '@angular/material/icon';
import {
  NavigationEnd,
  NavigationStart,
  Router,
  RouterLink,
  RouterLinkActive,
  RouterOutlet,
} from '@angular/router';
import { filter, pairwise } from 'rxjs';
import { DraftStore } from '../drafts/draft-store';
import { UnexpectedErrors } from '../errors/app-error-handler';
import { ConnectionStore } from '../http/connection-store';
import { SessionStore } from '../session/session-store';
import { AppearanceStore } from '../appearance/appearance-store';
import { AppearanceSwitch } from './appearance-switch';
import { Mark } from './mark';
import { UnitSwitch } from './unit-switch';

/** The frame around every page: the bar at the top, what is wrong with everything at once, and the page itself. */
@Component({
  selector: 'lw-shell',
  imports: [AppearanceSwitch, Mark, MatIcon, RouterLink, RouterLinkActive, RouterOutlet, UnitSwitch],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  private readonly router = inject(Router);
  protected readonly session = inject(SessionStore);
  protected readonly connection = inject(ConnectionStore);
  protected readonly errors = inject(UnexpectedErrors);
  protected readonly drafts = inject(DraftStore);
  private readonly page = viewChild.required<ElementRef<HTMLElement>>('page');
  private readonly panels = viewChild.required<ElementRef<HTMLElement>>('accountPanel');

  protected readonly signOutFailed = signal(false);
  /** Where to come back to after signing in. */
  protected readonly here = signal('/');
  protected readonly signInParams = computed(() => (this.here() === '/' ? {} : { to: this.here() }));

  constructor() {
    // Made here so that the reader's choice holds from the first page on.
    inject(AppearanceStore);
    this.session.load();
    this.router.events.pipe(takeUntilDestroyed()).subscribe((event) => {
      if (event instanceof NavigationStart) this.errors.dismiss();
      if (event instanceof NavigationEnd && !event.urlAfterRedirects.startsWith('/account')) {
        this.here.set(event.urlAfterRedirects);
      }
    });
    this.router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        pairwise(),
        takeUntilDestroyed(),
      )
      .subscribe(([before, now]) => {
        // A new page begins where a reader would: at its top, and so does the keyboard.
        if (pathOf(before) !== pathOf(now)) this.focusPage();
      });
  }

  protected skip(event: Event): void {
    event.preventDefault();
    this.focusPage();
  }

  protected signOut(): void {
    this.signOutFailed.set(false);
    this.session.signOut().subscribe({
      next: () => {
        this.panels().nativeElement.hidePopover();
        void this.router.navigateByUrl('/');
      },
      error: () => this.signOutFailed.set(true),
    });
  }

  private focusPage(): void {
    this.page().nativeElement.focus({ preventScroll: true });
  }
}

function pathOf({ urlAfterRedirects }: NavigationEnd): string | undefined {
  return urlAfterRedirects.split(/[?#]/)[0];
}
