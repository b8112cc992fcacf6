import { type BaseHarnessFilters, ComponentHarness, HarnessPredicate } from '@angular/cdk/testing';

/** Reads a `lw-figure`. */
export class FigureHarness extends ComponentHarness {
  static readonly hostSelector = 'lw-figure';

  private readonly label = this.locatorFor('.label');
  private readonly value = this.locatorFor('.value');

  static with(options: BaseHarnessFilters & { readonly label?: string | RegExp } = {}) {
    return new HarnessPredicate(FigureHarness, options).addOption('label', options.label, (figure, label) =>
      HarnessPredicate.stringMatches(figure.getLabel(), label),
    );
  }

  async getLabel(): Promise<string> {
    return (await this.label()).text();
  }

  /** All that is read out, spaces evened. */
  async getValue(): Promise<string> {
    return (await (await this.value()).text()).replace(/\s+/g, ' ').trim();
  }
}
