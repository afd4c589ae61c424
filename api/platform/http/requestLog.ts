import type { RequestHandler } from 'express';
import { pinoHttp } from 'pino-http';
import type { Logger } from 'pino';
import { requestId } from '../db/doors';

/** What we take as a request id from outside: enough to find it again, nothing that could forge a line. */
const acceptable = /^[A-Za-z0-9-]{8,64}$/;

/** Takes the request's id over or makes one, answers it, and keeps it for all that runs on from here. */
export const giveRequestId =
  (ids: () => string): RequestHandler =>
  (request, response, next) => {
    const given = request.get('X-Request-Id');
    const id = given !== undefined && acceptable.test(given) ? given : ids();
    request.id = id;
    response.setHeader('X-Request-Id', id);
    requestId.run(id, next);
  };

/** One line per request: id, method, path, status, milliseconds. No headers, no query, no body. */
export const logRequests = (logger: Logger): RequestHandler =>
  pinoHttp({
    logger,
    genReqId: (request) => request.id,
    customLogLevel: (_request, response, error) =>
      error !== undefined || response.statusCode >= 500 ? 'error' : 'info',
    // The translator has logged what happened; here only that it did.
    customErrorObject: () => ({}),
    serializers: {
      req: (request: { id: unknown; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?', 1)[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  });
