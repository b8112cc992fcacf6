import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { problemWords } from '../core/errors/problem-words';
import type { Role } from '../core/session/auth-api';
import { SessionStore } from '../core/session/session-store';
import { AppearanceSwitch } from '../core/shell/appearance-switch';
import { UnitSwitch } from '../core/shell/unit-switch';

const ROLE_WORDS: Readonly<Record<Role, string>> = { owner: 'owner', smith: 'smith', student: 'student' };

/** Who is signed in, in which shops, and how they like to read. */
@Component({
  selector: 'lw-account-page',
  imports: [AppearanceSwitch, MatButton, UnitSwitch],
  templateUrl: './account-page.html',
  styleUrl: './account-page.scss',
  host: { class: 'lw-page' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountPage {
  private readonly router = inject(Router);
  protected readonly session = inject(SessionStore);
  protected readonly isBusy = signal(false);
  protected readonly failure = signal<string | undefined>(undefined);
  protected readonly shops = computed(() => {
    const state = this.session.state();
    return state.status === 'member'
      ? state.shops.map(({ id, name, role }) => ({ id, name, role: ROLE_WORDS[role] }))
      : [];
  });

  protected signOut(): void {
    this.isBusy.set(true);
    this.failure.set(undefined);
    this.session.signOut().subscribe({
      next: () => void this.router.navigateByUrl('/'),
      error: (error: unknown) => {
        this.isBusy.set(false);
        this.failure.set(problemWords(error));
      },
    });
  }
}
