import {
  ChangeDetectionStrategy,
  Component,
  booleanAttribute,
  computed,
  effect,
  input,
  output,
} from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInputModule } from '@angular/material/input';

/** A field for words that take effect while they are typed. A required one that was emptied takes its words back when left. */
@Component({
  selector: 'lw-text-field',
  imports: [MatFormFieldModule, MatInputModule, ReactiveFormsModule],
  templateUrl: './text-field.html',
  styleUrl: './text-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TextField {
  readonly label = input.required<string>();
  readonly value = input.required<string>();
  readonly maxLength = input(120);
  readonly isLong = input(false, { transform: booleanAttribute });
  readonly isRequired = input(false, { transform: booleanAttribute });

  readonly valueChange = output<string>();

  protected readonly control = new FormControl('', { nonNullable: true });
  protected readonly rows = computed(() => Math.min(8, Math.max(2, this.value().split('\n').length)));

  constructor() {
    effect(() => {
      if (this.control.value.trim() !== this.value()) this.control.setValue(this.value());
    });
  }

  protected typed(): void {
    const text = this.control.value.trim();
    if (text !== this.value() && !(this.isRequired() && text === '')) this.valueChange.emit(text);
  }

  protected left(): void {
    if (this.control.value !== this.value()) this.control.setValue(this.value());
  }
}
