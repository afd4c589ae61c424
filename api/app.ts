import compression from 'compression';
import express, { type Express, type Request } from 'express';
import type { Route } from '@shared/contract';
import { caseRoutes } from './features/cases/routes';
import { circuitRoutes } from './features/circuits/routes';
import { liftRoutes } from './features/lifts/routes';
import { peopleRoutes } from './features/people/routes';
import { reviewRoutes } from './features/review/routes';
import { syncRoutes } from './features/sync/routes';
import { sessionRoutes } from './features/session/routes';
import { Standing } from './features/session/standing';
import { aboutRoutes } from './platform/http/about';
import { accessTokens } from './platform/http/accessToken';
import { clientFiles } from './platform/http/clientFiles';
import { refuseCrossSite } from './platform/http/crossSite';
import { apiHeaders } from './platform/http/headers';
import { mounting, type Caller } from './platform/http/mount';
import { nothingHere, translateErrors } from './platform/http/problem';
import { giveRequestId, logRequests } from './platform/http/requestLog';
import type { Services } from './platform/services';

export interface Application {
  readonly app: Express;
  /** What is served, as data: the role matrix is made of it. */
  readonly mounted: readonly Route[];
}

/** The API and the client's files; everything it needs comes in by `services`. */
export function createApp(services: Services): Application {
  const { config, ids, logger } = services;
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.set('trust proxy', config.trustedProxies ?? false);
  app.set('query parser', 'simple');

  const tokens = accessTokens(config.secret);
  const standing = new Standing(services);
  const callerOf = async (request: Request): Promise<Caller | undefined> => {
    const token = await tokens.read(request);
    const role = token && (await standing.roleOf(token));
    return token && role ? { ...token, role } : undefined;
  };

  app.use(giveRequestId(ids), logRequests(logger));
  app.use('/api', apiHeaders, refuseCrossSite, compression());
  const { mount, mounted } = mounting({ app, services, callerOf });
  aboutRoutes(mount, services);
  sessionRoutes(mount, services, tokens, standing);
  peopleRoutes(mount);
  liftRoutes(mount);
  circuitRoutes(mount);
  syncRoutes(mount, services);
  caseRoutes(mount);
  reviewRoutes(mount);
  app.use('/api', nothingHere);
  app.use(clientFiles(config.clientFolder));
  app.use(nothingHere);
  app.use(translateErrors(logger));
  return { app, mounted };
}
