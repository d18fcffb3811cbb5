import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { type ApplicationConfig, inject, provideBrowserGlobalErrorListeners } from '@angular/core';
import { MAT_RIPPLE_GLOBAL_OPTIONS, MATERIAL_ANIMATIONS } from '@angular/material/core';
import { MAT_SNACK_BAR_DEFAULT_OPTIONS } from '@angular/material/snack-bar';
import {
  provideRouter,
  RedirectCommand,
  Router,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
  withNavigationErrorHandler,
} from '@angular/router';
import { problemInterceptor } from './api/problem-interceptor';
import { routes } from './app-routes';
import { PageTitle } from './shell/page-title';

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideRouter(
      routes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
      withNavigationErrorHandler((error) => {
        console.error(error.error);
        return new RedirectCommand(inject(Router).parseUrl('/failed'), {
          skipLocationChange: true,
        });
      }),
    ),
    // XMLHttpRequest, not fetch: only it tells how far an upload has come.
    provideHttpClient(withInterceptors([problemInterceptor])),
    { provide: TitleStrategy, useClass: PageTitle },
    { provide: MATERIAL_ANIMATIONS, useValue: { animationsDisabled: true } },
    { provide: MAT_RIPPLE_GLOBAL_OPTIONS, useValue: { disabled: true } },
    { provide: MAT_SNACK_BAR_DEFAULT_OPTIONS, useValue: { duration: 6000 } },
  ],
};
