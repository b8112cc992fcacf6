import { ComponentHarness, type TestKey } from '@angular/cdk/testing';

/** What fields for quantities have in common in a test. */
export abstract class TypedEntryHarness extends ComponentHarness {
  private readonly input = this.locatorFor('input');
  private readonly error = this.locatorForOptional('mat-error');
  private readonly hint = this.locatorForOptional('mat-hint');
  private readonly label = this.locatorFor('mat-label');
  private readonly suffix = this.locatorForOptional('.unit');

  async getLabel(): Promise<string> {
    return (await this.label()).text();
  }

  async getText(): Promise<string> {
    return (await this.input()).getProperty<string>('value');
  }

  async getPlaceholder(): Promise<string> {
    return (await this.input()).getProperty<string>('placeholder');
  }

  async getUnit(): Promise<string | null> {
    return (await (await this.suffix())?.text()) ?? null;
  }

  async getError(): Promise<string | null> {
    return (await (await this.error())?.text()) ?? null;
  }

  async getHint(): Promise<string | null> {
    return (await (await this.hint())?.text()) ?? null;
  }

  /** Types over what is there and stays in the field. */
  async type(text: string): Promise<void> {
    const input = await this.input();
    await input.clear();
    if (text !== '') await input.sendKeys(text);
  }

  /** Types over what is there and leaves the field. */
  async enter(text: string): Promise<void> {
    await this.type(text);
    await this.leave();
  }

  async leave(): Promise<void> {
    await (await this.input()).blur();
  }

  async press(key: TestKey, isShift = false): Promise<void> {
    await (await this.input()).sendKeys({ shift: isShift }, key);
  }
}
