import { provideHttpClient, withInterceptors } from '@angular/common/http';
import {
  type ApplicationConfig,
  inject,
  provideAppInitializer,
  provideBrowserGlobalErrorListeners,
  provideZonelessChangeDetection,
} from '@angular/core';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
} from '@angular/router';
import { routes } from './app.routes';
import { lineInterceptor } from './core/offline/line-interceptor';
import { keptAnswersInterceptor } from './core/session/kept-answers-interceptor';
import { Session } from './core/session/session';
import { tokenInterceptor } from './core/session/token-interceptor';
import { PageTitle } from './core/shell/page-title';

/** Everything the application needs once. */
export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideZonelessChangeDetection(),
    provideHttpClient(
      withInterceptors([keptAnswersInterceptor, tokenInterceptor, lineInterceptor]),
    ),
    provideRouter(
      routes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
    ),
    { provide: TitleStrategy, useClass: PageTitle },
    provideAppInitializer(() => inject(Session).resume()),
  ],
};
