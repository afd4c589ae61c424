import compression from 'compression';
import { Router, type RequestHandler } from 'express';
import staticGzip from 'express-static-gzip';
import { join } from 'node:path';
import { Refusal } from '../refusal';
import { documentHeaders } from './headers';

/** `main-ABCDEFGH.js`: the build names such a file by its content, so it never changes. */
const namedByContent = /-[A-Z0-9]{8}\.(js|css|woff2)$/;
/** Seconds of a year. */
const YEAR = 31_536_000;

/**
 * The built client. Navigations (no dot in the path) get index.html; an asset that is not there answers
 * 404, never a page. The service worker's files and the page itself are asked for again each time.
 */
export function clientFiles(folder: string): Router {
  const router = Router();
  router.use(documentHeaders, compression());
  router.use(
    staticGzip(folder, {
      index: false,
      // Written by the build at the best quality: a phone's first load is the one that counts.
      enableBrotli: true,
      orderPreference: ['br'],
      serveStatic: {
        redirect: false,
        dotfiles: 'ignore',
        setHeaders: (response, path) =>
          response.setHeader(
            'Cache-Control',
            namedByContent.test(path.replace(/\.br$/, ''))
              ? `public, max-age=${YEAR}, immutable`
              : 'no-cache',
          ),
      },
    }),
  );
  router.get('/{*path}', page(folder));
  return router;
}

const page =
  (folder: string): RequestHandler =>
  (request, response, next) => {
    if (request.path.includes('.')) throw new Refusal('not_found');
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(join(folder, 'index.html'), (error?: Error) => {
      // The phone went away in the middle: there is nobody to tell.
      if (error && !response.headersSent) next(error);
    });
  };
