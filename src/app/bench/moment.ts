import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { READER_LOCALE } from '../core/settings/reader-locale';

/** A point in time in the reader's form and time zone. */
@Component({
  selector: 'lw-moment',
  template: '<time [attr.datetime]="iso()">{{ words() }}</time>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Moment {
  private readonly form = formOf(inject(READER_LOCALE));
  /** UTC, ISO 8601. */
  readonly iso = input.required<string>();
  protected readonly words = computed(() => this.form.format(new Date(this.iso())));
}

function formOf(locale: string): Intl.DateTimeFormat {
  return new Intl.DateTimeFormat(locale, { dateStyle: 'medium', timeStyle: 'short' });
}
