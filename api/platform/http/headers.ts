import type { RequestHandler } from 'express';
import helmet from 'helmet';

/**
 * For every document of the client, online and (kept by the service worker) offline. Inline *styles*
 * are allowed, because Angular injects component styles at run time; inline scripts never.
 */
const documentPolicy: Record<string, string[]> = {
  'default-src': ["'none'"],
  'base-uri': ["'self'"],
  'script-src': ["'self'"],
  'style-src': ["'self'", "'unsafe-inline'"],
  'img-src': ["'self'", 'data:', 'blob:'],
  'font-src': ["'self'"],
  'connect-src': ["'self'"],
  'worker-src': ["'self'"],
  'manifest-src': ["'self'"],
  'object-src': ["'none'"],
  'frame-ancestors': ["'none'"],
  'form-action': ["'self'"],
  'require-trusted-types-for': ["'script'"],
  'trusted-types': ['angular', 'angular#components', 'dompurify', 'default'],
};

/** Seconds of a year: how long a browser keeps to https once it has come by https. */
const YEAR = 31_536_000;

const shared = {
  xFrameOptions: { action: 'deny' },
  referrerPolicy: { policy: 'no-referrer' },
  strictTransportSecurity: { maxAge: YEAR, includeSubDomains: true },
  crossOriginOpenerPolicy: { policy: 'same-origin' },
  crossOriginResourcePolicy: { policy: 'same-origin' },
} as const;

const permissions =
  'accelerometer=(), camera=(self), geolocation=(), gyroscope=(), microphone=(), payment=(), usb=()';

const withPermissions =
  (protect: RequestHandler): RequestHandler =>
  (request, response, next) => {
    response.setHeader('Permissions-Policy', permissions);
    protect(request, response, next);
  };

/** Headers of documents and assets. */
export const documentHeaders = withPermissions(
  helmet({
    ...shared,
    contentSecurityPolicy: { useDefaults: false, directives: documentPolicy },
  }),
);

const apiPolicy = helmet({
  ...shared,
  contentSecurityPolicy: {
    useDefaults: false,
    directives: { 'default-src': ["'none'"], 'frame-ancestors': ["'none'"] },
  },
});

/** Headers of the API's answers, errors included: never shown as a document, never kept by a cache. */
export const apiHeaders = withPermissions((request, response, next) => {
  response.setHeader('Cache-Control', 'no-store');
  apiPolicy(request, response, next);
});
