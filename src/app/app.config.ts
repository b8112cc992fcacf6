import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import { ErrorHandler, provideBrowserGlobalErrorListeners, type ApplicationConfig } from '@angular/core';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
  withRouterConfig,
} from '@angular/router';
import { routes } from './app.routes';
import { AppErrorHandler } from './core/errors/app-error-handler';
import { csrfInterceptor } from './core/http/csrf-interceptor';
import { problemInterceptor } from './core/http/problem-interceptor';
import { provideIcons } from './core/icons/provide-icons';
import { SHELL_ICONS } from './core/icons/shell-icons';
import { expiredSessionInterceptor } from './core/session/expired-session-interceptor';
import { PageTitle } from './core/shell/page-title';

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    { provide: ErrorHandler, useClass: AppErrorHandler },
    provideHttpClient(
      withFetch(),
      withInterceptors([expiredSessionInterceptor, problemInterceptor, csrfInterceptor]),
    ),
    provideRouter(
      routes,
      withComponentInputBinding(),
      withRouterConfig({ paramsInheritanceStrategy: 'always' }),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
    ),
    { provide: TitleStrategy, useClass: PageTitle },
    provideIcons(SHELL_ICONS),
  ],
};
