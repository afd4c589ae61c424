import type { RequestHandler } from 'express';
import { Refusal } from '../refusal';

/** Sent by our client with every unsafe request; a form of another site can't send it. */
export const OUR_HEADER = 'X-Lampline';
const safe = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Lets unsafe requests in only from our own pages: by Sec-Fetch-Site, else by Origin, and always with our
 * own header (which makes a cross-site request ask first, and nobody answers that).
 */
export const refuseCrossSite: RequestHandler = (request, _response, next) => {
  if (!safe.has(request.method) && !isOurs(request)) throw new Refusal('cross_site');
  next();
};

function isOurs(request: Parameters<RequestHandler>[0]): boolean {
  if (request.get(OUR_HEADER) !== '1') return false;
  const site = request.get('Sec-Fetch-Site');
  if (site !== undefined) return site === 'same-origin';
  const origin = request.get('Origin');
  if (origin === undefined) return false;
  try {
    return new URL(origin).host === request.get('Host');
  } catch {
    return false;
  }
}
