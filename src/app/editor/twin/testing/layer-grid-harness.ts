import { ComponentHarness, type TestElement, type TestKey } from '@angular/cdk/testing';

/** Keys held down while another is pressed. */
export interface Held {
  readonly alt?: boolean;
  readonly shift?: boolean;
  readonly control?: boolean;
}

/** Drives a `lw-layer-grid` by keys and by what is typed into its cells. */
export class LayerGridHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-layer-grid';

  private readonly rows = this.locatorForAll('[role=row]');
  private readonly selected = this.locatorForAll('[role=row][aria-selected=true]');
  private readonly current = this.locatorFor('[role=gridcell][tabindex="0"]');
  private readonly editor = this.locatorFor('.editor');
  private readonly refusal = this.locatorForOptional('.refusal');

  /** Rows as they read, the top layer first; those out of view are not in the page. */
  async getRows(): Promise<string[]> {
    return Promise.all(
      (await this.rows()).map(async (row) => (await row.text()).replace(/\s+/g, ' ').trim()),
    );
  }

  async getSelected(): Promise<string[]> {
    return Promise.all(
      (await this.selected()).map(async (row) => (await row.text()).replace(/\s+/g, ' ').trim()),
    );
  }

  /** The cell in the tab order, as it is read out. */
  async getCurrent(): Promise<string | null> {
    return (await this.current()).getAttribute('aria-label');
  }

  async isFocused(): Promise<boolean> {
    return (await this.current()).isFocused();
  }

  async getRefusal(): Promise<string | null> {
    return (await (await this.refusal())?.text()) ?? null;
  }

  async press(key: TestKey | string, held: Held = {}): Promise<void> {
    const cell = await this.focused();
    await cell.sendKeys(held, key);
  }

  /** Types into the editor that is open. */
  async type(text: string): Promise<void> {
    const editor = await this.editor();
    await editor.clear();
    await editor.sendKeys(text);
  }

  async endEditing(key: TestKey): Promise<void> {
    await (await this.editor()).sendKeys(key);
  }

  /** What stands in the editor that is open. */
  async getEdited(): Promise<string> {
    return (await this.editor()).getProperty<string>('value');
  }

  async chooseSteel(index: number): Promise<void> {
    const editor = await this.editor();
    await editor.selectOptions(index);
    await editor.dispatchEvent('change');
  }

  private async focused(): Promise<TestElement> {
    const cell = await this.current();
    await cell.focus();
    return cell;
  }
}
