import { type Signal, effect, inject, DestroyRef, signal } from '@angular/core';
import { FormControl } from '@angular/forms';

/** What was read from typed text: a value, or why it is none, as a sentence for whoever typed it. */
export type Reading<T> =
  { readonly ok: true; readonly value: T } | { readonly ok: false; readonly reason: string };

/** What a field tells its entry. */
export interface EntrySource<T> {
  readonly value: Signal<T>;
  /** The value as the field writes it. */
  readonly shown: Signal<string>;
  readonly read: (text: string) => Reading<T>;
  /** A value by arrow key from the one there is. */
  readonly stepped: (value: T, direction: 1 | -1, isBig: boolean) => T;
  readonly emit: (value: T) => void;
}

/** How long typing rests before what stands in the field takes effect, ms. */
const REST_MS = 350;

/**
 * Text being typed into a field for a quantity. What can be read takes effect when typing rests; what can't is
 * explained when the field is left or Enter is pressed, and stays to be mended. Escape brings the value back.
 *
 * Must be made where `inject()` works.
 */
export class TypedEntry<T> {
  readonly control = new FormControl('', { nonNullable: true });
  /** Why the text was not understood; null while it may still become something. */
  readonly reason = signal<string | null>(null);
  /** Whether the text is the reader's own and not yet the value as the field writes it. */
  readonly isTyped = signal(false);

  private valueBefore: T | undefined;
  private isFocused = false;
  private rest: ReturnType<typeof setTimeout> | undefined;

  constructor(private readonly source: EntrySource<T>) {
    effect(() => this.show(source.value(), source.shown()));
    inject(DestroyRef).onDestroy(() => clearTimeout(this.rest));
  }

  typed(): void {
    this.isTyped.set(true);
    this.explain(null);
    clearTimeout(this.rest);
    this.rest = setTimeout(() => this.take(false), REST_MS);
  }

  focused(): void {
    this.isFocused = true;
  }

  left(): void {
    this.isFocused = false;
    if (this.isTyped()) this.take(true);
  }

  key(event: KeyboardEvent): void {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    if (event.key === 'Enter') {
      if (this.isTyped()) this.take(true);
    } else if (event.key === 'Escape' && this.isTyped()) {
      event.stopPropagation();
      this.restore();
    } else if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      event.preventDefault();
      this.step(event.key === 'ArrowUp' ? 1 : -1, event.shiftKey);
    }
  }

  private step(direction: 1 | -1, isBig: boolean): void {
    const reading = this.isTyped() ? this.source.read(this.control.value) : null;
    const from = reading?.ok ? reading.value : this.source.value();
    const next = this.source.stepped(from, direction, isBig);
    this.settle();
    if (next !== this.source.value()) this.source.emit(next);
    else this.restore();
  }

  private take(isLoud: boolean): void {
    clearTimeout(this.rest);
    const reading = this.source.read(this.control.value);
    if (!reading.ok) {
      if (isLoud) this.explain(reading.reason);
      return;
    }
    if (reading.value !== this.source.value()) this.source.emit(reading.value);
    if (!isLoud) return;
    this.settle();
    // The new value comes back through the field's input; an unchanged one doesn't, and the text must be put right.
    if (reading.value === this.source.value()) this.write(this.source.shown());
  }

  /** The value or the way it is written has changed: shows it, unless that would take away what is being typed. */
  private show(value: T, shown: string): void {
    const isNew = value !== this.valueBefore;
    this.valueBefore = value;
    if (this.isTyped()) {
      if (!isNew) return;
      const reading = this.source.read(this.control.value);
      if (this.isFocused && reading.ok && reading.value === value) return;
    }
    this.settle();
    this.write(shown);
  }

  private restore(): void {
    this.settle();
    this.write(this.source.shown());
  }

  private settle(): void {
    clearTimeout(this.rest);
    this.isTyped.set(false);
    this.explain(null);
  }

  private write(text: string): void {
    if (text !== this.control.value) this.control.setValue(text);
  }

  private explain(reason: string | null): void {
    this.reason.set(reason);
    this.control.setErrors(reason === null ? null : { refused: reason });
    if (reason !== null) this.control.markAsTouched();
  }
}
