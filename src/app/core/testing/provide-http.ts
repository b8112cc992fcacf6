import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { provideHttpClientTesting } from '@angular/common/http/testing';
import type { EnvironmentProviders, Provider } from '@angular/core';
import { csrfInterceptor } from '../http/csrf-interceptor';
import { problemInterceptor } from '../http/problem-interceptor';
import { expiredSessionInterceptor } from '../session/expired-session-interceptor';

/** HTTP as the application has it, with a server that the spec plays. */
export function provideHttpForSpec(): (EnvironmentProviders | Provider)[] {
  return [
    provideHttpClient(withInterceptors([expiredSessionInterceptor, problemInterceptor, csrfInterceptor])),
    provideHttpClientTesting(),
  ];
}
