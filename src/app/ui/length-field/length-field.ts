import { ChangeDetectionStrategy, Component, booleanAttribute, computed, input, output } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { type UnitSystem, formatFor, readLengthField } from '@shared/units';
import { type Reading, TypedEntry } from '../typed-entry/typed-entry';
import { steppedLengthMm } from './length-step';

/**
 * A field for a length. Takes `3/32`, `3/32"`, `0.094 in`, `2.4 mm` in either system; arrow keys step along the rule in use,
 * with Shift ten times as far; a wrong entry is explained and kept.
 */
@Component({
  selector: 'lw-length-field',
  imports: [MatFormFieldModule, MatInputModule, ReactiveFormsModule],
  templateUrl: './length-field.html',
  styleUrl: '../typed-entry/typed-entry.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LengthField {
  readonly label = input.required<string>();
  /** Millimetres; undefined for an optional length that is not given. */
  readonly valueMm = input.required<number | undefined>();
  /** What a bare number means, and how the length is written. */
  readonly system = input.required<UnitSystem>();
  readonly minMm = input(0);
  readonly maxMm = input(100_000);
  /** What holds when an optional field is left empty; shown in its place and stepped from, mm. */
  readonly defaultMm = input<number>();
  readonly hint = input<string>();
  readonly isOptional = input(false, { transform: booleanAttribute });

  /** A new length within the limits, mm; undefined when an optional field was emptied. */
  readonly valueMmChange = output<number | undefined>();

  private readonly format = computed(() => formatFor(this.system()));
  private readonly shown = computed(() => {
    const mm = this.valueMm();
    return mm === undefined ? '' : this.format().lengthParts(mm).number;
  });
  protected readonly unit = computed(() => (this.system() === 'mm' ? 'mm' : 'in'));
  protected readonly placeholder = computed(() => {
    const mm = this.defaultMm();
    return mm === undefined ? '' : this.format().lengthParts(mm).number;
  });
  /** Fractions need the stroke that a keypad for figures lacks. */
  protected readonly inputMode = computed(() => (this.system() === 'mm' ? 'decimal' : 'text'));

  protected readonly entry = new TypedEntry<number | undefined>({
    value: this.valueMm,
    shown: this.shown,
    read: (text) => this.read(text),
    stepped: (mm, direction, isBig) => this.stepped(mm, direction, isBig),
    emit: (mm) => this.valueMmChange.emit(mm),
  });

  private read(text: string): Reading<number | undefined> {
    if (text.trim() === '' && this.isOptional()) return { ok: true, value: undefined };
    const reading = readLengthField(text, { text: this.shown(), mm: this.valueMm() ?? NaN }, this.system());
    if (!reading.ok) return reading;
    const { mm } = reading;
    if (mm < this.minMm()) return this.outside(text, 'less', 'least', this.minMm());
    if (mm > this.maxMm()) return this.outside(text, 'more', 'most', this.maxMm());
    return { ok: true, value: mm };
  }

  private outside(
    text: string,
    than: 'less' | 'more',
    end: 'least' | 'most',
    limitMm: number,
  ): Reading<number> {
    const limit = this.format().length(limitMm);
    return {
      ok: false,
      reason: `“${text.trim()}” is ${than} than ${limit}, the ${end} that can be worked with here.`,
    };
  }

  private stepped(mm: number | undefined, direction: 1 | -1, isBig: boolean): number {
    const next = steppedLengthMm(mm ?? this.defaultMm() ?? this.minMm(), direction, isBig, this.system());
    return Math.min(this.maxMm(), Math.max(this.minMm(), next));
  }
}
