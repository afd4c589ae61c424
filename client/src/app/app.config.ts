import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import {
  inject,
  isDevMode,
  provideAppInitializer,
  provideBrowserGlobalErrorListeners,
  provideZonelessChangeDetection,
  type ApplicationConfig,
} from '@angular/core';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
} from '@angular/router';
import { provideServiceWorker } from '@angular/service-worker';
import { appRoutes } from './app.routes';
import { DeviceStore } from './core/device/device-store';
import { EnginePort } from './core/engine/engine-port';
import { WorkerEngine } from './core/engine/worker-engine';
import { markInterceptor } from './core/session/mark-interceptor';
import { refreshInterceptor } from './core/session/refresh-interceptor';
import { SessionStore } from './core/session/session-store';
import { PageTitle } from './core/shell/page-title';

/** Opens what this phone holds before the first screen; the network is not asked. */
async function openPhone(): Promise<void> {
  const sessions = inject(SessionStore);
  const store = inject(DeviceStore);
  await sessions.restore();
  const session = sessions.session();
  if (session) await store.open(session);
}

export const appConfig: ApplicationConfig = {
  providers: [
    provideZonelessChangeDetection(),
    provideBrowserGlobalErrorListeners(),
    provideHttpClient(withFetch(), withInterceptors([refreshInterceptor, markInterceptor])),
    provideRouter(
      appRoutes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled' }),
    ),
    provideServiceWorker('ngsw-worker.js', {
      enabled: !isDevMode(),
      registrationStrategy: 'registerImmediately',
    }),
    { provide: TitleStrategy, useClass: PageTitle },
    { provide: EnginePort, useClass: WorkerEngine },
    provideAppInitializer(openPhone),
  ],
};
