import { ChangeDetectionStrategy, Component, booleanAttribute, computed, input, output } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';
import { formatNumber } from '@shared/units';
import { type Reading, TypedEntry } from '../typed-entry/typed-entry';
import { parseNumber } from './number-parse';

/**
 * A field for a number that is no length: a count, an angle, a temperature, minutes, a share. Arrow keys step, with Shift ten times
 * as far; a wrong entry is explained and kept.
 */
@Component({
  selector: 'lw-number-field',
  imports: [MatFormFieldModule, MatInputModule, ReactiveFormsModule],
  templateUrl: './number-field.html',
  styleUrl: '../typed-entry/typed-entry.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NumberField {
  readonly label = input.required<string>();
  /** In `unit`; undefined for an optional number that is not given. */
  readonly value = input.required<number | undefined>();
  readonly min = input(0);
  readonly max = input(Number.MAX_SAFE_INTEGER);
  readonly isWhole = input(false, { transform: booleanAttribute });
  /** What an arrow key adds or takes away. */
  readonly step = input(1);
  /** Most decimals shown. */
  readonly digits = input(2);
  /** Sign behind the number; may be typed or left out. */
  readonly unit = input('');
  /** What holds when an optional field is left empty; shown in its place and stepped from. */
  readonly defaultValue = input<number>();
  readonly hint = input<string>();
  readonly isOptional = input(false, { transform: booleanAttribute });

  /** A new number within the limits; undefined when an optional field was emptied. */
  readonly valueChange = output<number | undefined>();

  private readonly shown = computed(() => this.written(this.value()));
  protected readonly placeholder = computed(() => this.written(this.defaultValue()));
  protected readonly inputMode = computed(() =>
    this.isWhole() ? 'numeric' : this.min() < 0 ? 'text' : 'decimal',
  );

  protected readonly entry = new TypedEntry<number | undefined>({
    value: this.value,
    shown: this.shown,
    read: (text) => this.read(text),
    stepped: (value, direction, isBig) => this.stepped(value, direction, isBig),
    emit: (value) => this.valueChange.emit(value),
  });

  private written(value: number | undefined): string {
    return value === undefined ? '' : formatNumber(value, this.digits());
  }

  private read(text: string): Reading<number | undefined> {
    const typed = text.trim();
    if (typed === '' && this.isOptional()) return { ok: true, value: undefined };
    // The text that the field itself wrote stands for the value behind it, however it was rounded.
    if (typed === this.shown()) return { ok: true, value: this.value() };
    const reading = parseNumber(text, [this.unit()]);
    if (!reading.ok) return reading;
    const { value } = reading;
    if (this.isWhole() && !Number.isInteger(value)) {
      return { ok: false, reason: `“${typed}” is not a whole number.` };
    }
    if (value < this.min()) {
      return {
        ok: false,
        reason: `“${typed}” is less than ${this.limit(this.min())}, the least that can be.`,
      };
    }
    if (value > this.max()) {
      return {
        ok: false,
        reason: `“${typed}” is more than ${this.limit(this.max())}, the most that can be.`,
      };
    }
    return { ok: true, value };
  }

  private limit(value: number): string {
    const unit = this.unit();
    return formatNumber(value, this.digits()) + (unit === '' || unit === '°' ? unit : ` ${unit}`);
  }

  private stepped(value: number | undefined, direction: 1 | -1, isBig: boolean): number {
    const size = this.step() * (isBig ? 10 : 1);
    const from = value ?? this.defaultValue() ?? Math.max(0, this.min());
    const next = Math.round((from + direction * size) * 1e6) / 1e6;
    return Math.min(this.max(), Math.max(this.min(), next));
  }
}
