import type { HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { NEW_ID } from '../device/ids';

/**
 * Marks each request as ours (no other site can set a header) and gives it the id that the logs show. The
 * service worker is passed by: it would answer 504 itself where there is no signal.
 */
export const markInterceptor: HttpInterceptorFn = (request, next) =>
  next(
    request.clone({
      setHeaders: {
        'X-Lampline': '1',
        'X-Request-Id': inject(NEW_ID)(),
        'ngsw-bypass': '1',
      },
    }),
  );
