import { DestroyRef, DOCUMENT, inject, Injectable, signal } from '@angular/core';

/** Whether the server can be reached, as far as the last request and the browser know. */
@Injectable({ providedIn: 'root' })
export class ConnectionStore {
  private readonly window = inject(DOCUMENT).defaultView;
  private readonly online = signal(this.window?.navigator.onLine !== false);

  readonly isOnline = this.online.asReadonly();

  constructor() {
    const goneOnline = () => this.online.set(true);
    const goneOffline = () => this.online.set(false);
    this.window?.addEventListener('online', goneOnline);
    this.window?.addEventListener('offline', goneOffline);
    inject(DestroyRef).onDestroy(() => {
      this.window?.removeEventListener('online', goneOnline);
      this.window?.removeEventListener('offline', goneOffline);
    });
  }

  /** A request was answered, whatever the answer. */
  answered(): void {
    this.online.set(true);
  }

  /** A request got no answer. */
  failed(): void {
    this.online.set(false);
  }
}
