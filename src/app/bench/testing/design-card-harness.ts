import { ComponentHarness } from '@angular/cdk/testing';

/** One design on the bench. */
export class DesignCardHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-design-card';
  private readonly link = this.locatorFor('h2 a');
  private readonly tools = this.locatorForAll('.tools button');

  async name(): Promise<string> {
    return (await this.link()).text();
  }

  async isFocused(): Promise<boolean> {
    return (await this.link()).isFocused();
  }

  async figures(): Promise<readonly string[]> {
    const values = await this.locatorForAll('dd')();
    return Promise.all(values.map((value) => value.text()));
  }

  /** Whether it says that its changes are not saved. */
  async isUnsaved(): Promise<boolean> {
    return (await this.locatorForOptional('.unsaved')()) !== null;
  }

  /** @param verb what the button's name begins with */
  async press(verb: 'Duplicate' | 'Delete'): Promise<void> {
    for (const tool of await this.tools()) {
      if ((await tool.getAttribute('aria-label'))?.startsWith(verb)) return tool.click();
    }
    throw new Error(`No button to ${verb}`);
  }
}
