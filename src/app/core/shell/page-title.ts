import { inject, Injectable } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { type RouterStateSnapshot, TitleStrategy } from '@angular/router';

/** Window titles: what the page is, then whose it is. */
@Injectable()
export class PageTitle extends TitleStrategy {
  private readonly title = inject(Title);

  override updateTitle(snapshot: RouterStateSnapshot): void {
    this.set(this.buildTitle(snapshot));
  }

  /** For pages whose title is known only after something was loaded. */
  set(page: string | undefined): void {
    this.title.setTitle(page === undefined ? 'Layerwright' : `${page} · Layerwright`);
  }
}
