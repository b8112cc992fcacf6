import { InjectionToken } from '@angular/core';

/** The language and region that the reader's browser asks for; dates are written in its form. */
export const READER_LOCALE = new InjectionToken<string>('reader locale', {
  providedIn: 'root',
  factory: () => navigator.language || 'en-GB',
});
