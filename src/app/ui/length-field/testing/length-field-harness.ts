import { type BaseHarnessFilters, HarnessPredicate } from '@angular/cdk/testing';
import { TypedEntryHarness } from '../../typed-entry/testing/typed-entry-harness';

/** Drives a `lw-length-field`. */
export class LengthFieldHarness extends TypedEntryHarness {
  static readonly hostSelector = 'lw-length-field';

  static with(options: BaseHarnessFilters & { readonly label?: string | RegExp } = {}) {
    return new HarnessPredicate(LengthFieldHarness, options).addOption(
      'label',
      options.label,
      (field, label) => HarnessPredicate.stringMatches(field.getLabel(), label),
    );
  }
}
