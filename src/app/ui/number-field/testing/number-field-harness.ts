import { type BaseHarnessFilters, HarnessPredicate } from '@angular/cdk/testing';
import { TypedEntryHarness } from '../../typed-entry/testing/typed-entry-harness';

/** Drives a `lw-number-field`. */
export class NumberFieldHarness extends TypedEntryHarness {
  static readonly hostSelector = 'lw-number-field';

  static with(options: BaseHarnessFilters & { readonly label?: string | RegExp } = {}) {
    return new HarnessPredicate(NumberFieldHarness, options).addOption(
      'label',
      options.label,
      (field, label) => HarnessPredicate.stringMatches(field.getLabel(), label),
    );
  }
}
