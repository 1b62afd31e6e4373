import { HttpBackend } from '@angular/common/http';
import { type ApplicationConfig, CSP_NONCE, inject, mergeApplicationConfig, REQUEST_CONTEXT } from '@angular/core';
import { provideServerRendering, withRoutes } from '@angular/ssr';
import { appConfig } from './app.config';
import { serverRoutes } from './app.routes.server';
import { SsrApiBackend, type RenderContext } from './core/ssr-api-backend';

const serverOnly: ApplicationConfig = {
  providers: [
    provideServerRendering(withRoutes(serverRoutes)),
    { provide: HttpBackend, useClass: SsrApiBackend },
    {
      provide: CSP_NONCE,
      useFactory: () => (inject(REQUEST_CONTEXT, { optional: true }) as RenderContext | null)?.nonce ?? null,
    },
  ],
};

export const serverConfig: ApplicationConfig = mergeApplicationConfig(appConfig, serverOnly);
