import { HttpErrorResponse, type HttpInterceptorFn } from '@angular/common/http';
import { inject, Injector } from '@angular/core';
import { routes } from '@shared/contract';
import { catchError, from, switchMap, throwError } from 'rxjs';
import { SessionStore } from './session-store';

/** A request that finds its access token ended is sent once more after one refresh. */
export const refreshInterceptor: HttpInterceptorFn = (request, next) => {
  const injector = inject(Injector);
  const ofSession = request.url.startsWith(routes.signIn.path);
  return next(request).pipe(
    catchError((error: unknown) => {
      const ended = error instanceof HttpErrorResponse && error.status === 401;
      if (!ended || (ofSession && request.method !== 'GET')) return throwError(() => error);
      return from(injector.get(SessionStore).refresh()).pipe(
        switchMap((fresh) => (fresh ? next(request) : throwError(() => error))),
      );
    }),
  );
};
