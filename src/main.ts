import { bootstrapApplication } from '@angular/platform-browser';
import { App } from './app/app';
import { appConfig } from './app/app.config';

// Nothing is on the page yet that could say it: the browser's own log is the only place left.
bootstrapApplication(App, appConfig).catch((error: unknown) => reportError(error));
