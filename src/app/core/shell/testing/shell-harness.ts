import { ComponentHarness } from '@angular/cdk/testing';

/** The frame around every page. */
export class ShellHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-shell';
  private readonly page = this.locatorFor('main');
  private readonly skipLink = this.locatorFor('.skip');

  /** What is said above the page about everything at once. */
  async notices(): Promise<readonly string[]> {
    const notices = await this.locatorForAll('.notice')();
    return Promise.all(notices.map((notice) => notice.text()));
  }

  /** Where "Sign in" leads; null when there is no such link. */
  async signInAddress(): Promise<string | null> {
    const link = await this.locatorForOptional('.sign-in')();
    return link ? link.getAttribute('href') : null;
  }

  async skipToPage(): Promise<void> {
    await (await this.skipLink()).click();
  }

  async isPageFocused(): Promise<boolean> {
    return (await this.page()).isFocused();
  }

  async chooseUnits(words: RegExp): Promise<void> {
    for (const label of await this.locatorForAll('lw-unit-switch label')()) {
      if (words.test(await label.text())) return label.click();
    }
    throw new Error(`No units called ${String(words)}`);
  }

  async signOut(): Promise<void> {
    await (await this.locatorFor('#account-panel button')()).click();
  }
}
