import { type BaseHarnessFilters, ComponentHarness, HarnessPredicate } from '@angular/cdk/testing';
import { MatSelectHarness } from '@angular/material/select/testing';

/** Drives a `lw-steel-picker`. */
export class SteelPickerHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-steel-picker';

  private readonly select = this.locatorFor(MatSelectHarness);
  private readonly label = this.locatorFor('mat-label');

  static with(options: BaseHarnessFilters & { readonly label?: string | RegExp } = {}) {
    return new HarnessPredicate(SteelPickerHarness, options).addOption(
      'label',
      options.label,
      (picker, label) => HarnessPredicate.stringMatches(picker.getLabel(), label),
    );
  }

  async getLabel(): Promise<string> {
    return (await this.label()).text();
  }

  async getSteel(): Promise<string> {
    return (await this.select()).getValueText();
  }

  /** Headings and names in the order in which they are offered. */
  async getOffers(): Promise<{ groups: string[]; names: string[] }> {
    const select = await this.select();
    await select.open();
    const groups = await Promise.all((await select.getOptionGroups()).map((group) => group.getLabelText()));
    const names = await Promise.all((await select.getOptions()).map((option) => option.getText()));
    await select.close();
    return { groups, names };
  }

  async choose(name: string | RegExp): Promise<void> {
    await (await this.select()).clickOptions({ text: name });
  }
}
