/*
 * A feature's routes.ts only translates:
 *
 *   import { routes } from '@shared/contract';
 *   import type { Mount } from '../../platform/http/mount';
 *   import { changeLift } from './changeLift';
 *   import { findLift } from './findLift';
 *
 *   export function liftRoutes(mount: Mount): void {
 *     mount(routes.lift, ({ params, inside }) => inside((org) => findLift(org, params.id)));
 *     mount(routes.changeLift, ({ params, body, ifMatch, inside }) =>
 *       inside((org) => changeLift(org, params.id, ifMatch, body)));
 *   }
 *
 * `inside` opens the caller's organisation: one transaction, whose InOrganisation is the first argument
 * of every repository function. Use cases throw `new Refusal(code, details)` or use `found(row)`; a lost
 * race on a version is `new Refusal('version_conflict', { current: row })`. In a keyed route `inside` is
 * called exactly once: its answer is stored with the write, and given again for the same key.
 */
import express, { type Express, type Request, type Response } from 'express';
import type { z } from 'zod';
import type { Role, Route } from '@shared/contract';
import type { InOrganisation } from '../db/doors';
import { Refusal } from '../refusal';
import type { Services } from '../services';
import type { ReadToken } from './accessToken';
import { answerOnce, digestOf } from '../db/idempotency';
import { fieldsOf, InvalidRequest } from './problem';

/** Who asks; role as the database says now, not as it was at sign-in. */
export interface Caller extends ReadToken {
  readonly role: Role;
}

type Parsed<S, Else> = S extends z.ZodType ? z.output<S> : Else;

export interface Asked<R extends Route> {
  readonly params: Parsed<R['params'], Record<string, never>>;
  readonly query: Parsed<R['query'], Record<string, never>>;
  readonly body: Parsed<R['body'], undefined>;
  /** Undefined only where the route is open. */
  readonly caller: R['roles'] extends 'open' ? undefined : Caller;
  /** The version that the client saw. */
  readonly ifMatch: R['versioned'] extends true ? number : undefined;
  /** When the request came in. */
  readonly now: Date;
  /** One transaction in the caller's organisation. */
  readonly inside: <T>(work: (org: InOrganisation) => Promise<T>) => Promise<T>;
  /** For cookies only. */
  readonly request: Request;
  readonly response: Response;
}

/**
 * What a handler gives back: checked by the route's schema, which also drops what it does not name.
 * Of a route without an answer nothing is sent.
 */
export type Answered<R extends Route> = R['answer'] extends z.ZodType
  ? z.input<R['answer']>
  : unknown;

export type Mount = <R extends Route>(
  route: R,
  handler: (asked: Asked<R>) => Promise<Answered<R>>,
  options?: MountOptions,
) => void;

export interface MountOptions {
  /** Largest body, bytes. */
  readonly mostBytes?: number;
}

/** Largest body where a route says nothing else, bytes. */
const MOST_BYTES = 256 * 1024;
/** Longest idempotency key; ours are UUIDs. */
const keyPattern = /^[A-Za-z0-9_-]{8,80}$/;

export interface Mounting {
  readonly app: Express;
  readonly services: Services;
  /** The caller of a request, if session and person are still good. */
  readonly callerOf: (request: Request) => Promise<Caller | undefined>;
}

/** Makes the function that puts routes on the application; `mounted` lists what was put. */
export function mounting(at: Mounting): { readonly mount: Mount; readonly mounted: Route[] } {
  const mounted: Route[] = [];
  const mount: Mount = (route, handler, options) => {
    mounted.push(route);
    const limit = options?.mostBytes ?? MOST_BYTES;
    const read = express.json({ limit, strict: false, type: 'application/json' });
    at.app[route.method](route.path, async (request, response) => {
      const caller = await allowed(at, route, request);
      if (route.body) await readBody(read, request, response);
      const asked = ask(at, route, request, response, caller);
      const answer = await handler(asked as Parameters<typeof handler>[0]);
      send(route, response, answer);
    });
  };
  return { mount, mounted };
}

async function allowed(
  { callerOf }: Mounting,
  route: Route,
  request: Request,
): Promise<Caller | undefined> {
  if (route.roles === 'open') return undefined;
  const caller = await callerOf(request);
  if (!caller) throw new Refusal('not_signed_in');
  if (!route.roles.includes(caller.role)) throw new Refusal('not_allowed');
  return caller;
}

function readBody(
  read: express.RequestHandler,
  request: Request,
  response: Response,
): Promise<void> {
  if (!request.is('application/json')) throw new Refusal('unsupported_media_type');
  return new Promise((resolve, reject) => {
    void read(request, response, (error?: unknown) =>
      error === undefined ? resolve() : reject(error as Error),
    );
  });
}

function parse(schema: z.ZodType | undefined, value: unknown): unknown {
  if (!schema) return undefined;
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw new InvalidRequest(fieldsOf(parsed.error));
  return parsed.data;
}

function ask(
  { services }: Mounting,
  route: Route,
  request: Request,
  response: Response,
  caller: Caller | undefined,
) {
  const ifMatch = route.versioned ? versionOf(request) : undefined;
  const key = route.keyed ? keyOf(request) : undefined;
  const body = parse(route.body, request.body as unknown);
  const now = services.clock();
  const inside = async <T>(work: (org: InOrganisation) => Promise<T>): Promise<T> => {
    if (!caller) throw new Error(`${route.path} is open: it has no organisation to open.`);
    const { organisationId, personId } = caller;
    if (key === undefined) return services.database.inOrganisation(organisationId, personId, work);
    const digest = digestOf([route.method, request.path, ifMatch ?? null, body ?? null]);
    return answerOnce(services.database, caller, { key, digest, now }, work);
  };
  return {
    params: parse(route.params, request.params) ?? {},
    query: parse(route.query, request.query) ?? {},
    body,
    caller,
    ifMatch,
    now,
    inside,
    request,
    response,
  };
}

/** `If-Match: "3"`: the quoted row version. */
function versionOf(request: Request): number {
  const header = request.get('If-Match');
  if (header === undefined) throw new Refusal('version_missing');
  const version = Number(/^"([1-9]\d{0,8})"$/.exec(header.trim())?.[1]);
  if (Number.isNaN(version)) throw new Refusal('invalid_request', { header: 'If-Match' });
  return version;
}

function keyOf(request: Request): string {
  const key = request.get('Idempotency-Key');
  if (key === undefined) throw new Refusal('key_missing');
  if (!keyPattern.test(key)) throw new Refusal('invalid_request', { header: 'Idempotency-Key' });
  return key;
}

function send(route: Route, response: Response, answer: unknown): void {
  if (!route.answer) {
    response.status(route.status ?? 204).end();
    return;
  }
  const checked = route.answer.parse(answer);
  const { version } = (checked ?? {}) as { version?: unknown };
  if (typeof version === 'number') response.setHeader('ETag', `"${version}"`);
  response.status(route.status ?? 200).json(checked);
}
