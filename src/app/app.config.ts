import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import { type ApplicationConfig, ErrorHandler, provideBrowserGlobalErrorListeners } from '@angular/core';
import { provideRouter, TitleStrategy, withComponentInputBinding, withRouterConfig } from '@angular/router';
import { routes } from './app.routes';
import { PageTitle } from './core/page-title';
import { problemInterceptor } from './core/problem-interceptor';
import { sessionInterceptor } from './core/session-interceptor';
import { UnexpectedErrors } from './core/unexpected-errors';

/** What the whole app shares. */
export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    { provide: ErrorHandler, useExisting: UnexpectedErrors },
    provideRouter(routes, withComponentInputBinding(), withRouterConfig({ paramsInheritanceStrategy: 'always' })),
    { provide: TitleStrategy, useExisting: PageTitle },
    provideHttpClient(withFetch(), withInterceptors([sessionInterceptor, problemInterceptor])),
  ],
};
