import * as z from 'zod';
import { caseDetailSchema, caseStatusSchema, caseSummarySchema, queueEntrySchema } from './cases';
import {
  checkFindingSchema,
  circuitRevisionSchema,
  liftChangeSchema,
  liftSchema,
  siteSchema,
} from './lifts';
import { personChangeSchema, personSchema } from './people';
import { idSchema, roles, versionSchema } from './primitives';
import { route } from './route';
import { sessionSchema, signInSchema } from './session';
import { eventBatchSchema, eventResultsSchema, feedSchema, packSchema } from './sync';

const byId = z.object({ id: idSchema });

/** Every route of the API, by the name of what it does. */
export const routes = {
  health: route({
    method: 'get',
    path: '/api/health',
    summary: 'Whether the server can serve.',
    roles: 'open',
    answer: z.object({ status: z.literal('ok'), build: z.string() }),
  }),
  openapi: route({
    method: 'get',
    path: '/api/openapi.json',
    summary: 'This description.',
    roles: 'open',
    answer: z.record(z.string(), z.unknown()),
  }),
  signIn: route({
    method: 'post',
    path: '/api/session',
    summary: 'Sign in with e-mail address and password.',
    roles: 'open',
    body: signInSchema,
    answer: sessionSchema,
  }),
  session: route({
    method: 'get',
    path: '/api/session',
    summary: 'Who is signed in.',
    roles,
    answer: sessionSchema,
  }),
  refreshSession: route({
    method: 'post',
    path: '/api/session/refresh',
    summary: 'Take a new access token for the refresh cookie.',
    roles: 'open',
    answer: sessionSchema,
  }),
  signOut: route({
    method: 'delete',
    path: '/api/session',
    summary: 'End this session.',
    roles: 'open',
    status: 204,
  }),
  people: route({
    method: 'get',
    path: '/api/people',
    summary: 'Everyone of the organisation.',
    roles: ['supervisor', 'administrator'],
    answer: z.object({ people: z.array(personSchema) }),
  }),
  person: route({
    method: 'get',
    path: '/api/people/:id',
    summary: 'One person: administrators and supervisors, or oneself.',
    roles,
    params: byId,
    answer: personSchema,
  }),
  changePerson: route({
    method: 'patch',
    path: '/api/people/:id',
    summary: 'Change a role, disable, or rename.',
    roles: ['administrator'],
    params: byId,
    body: personChangeSchema,
    answer: personSchema,
    versioned: true,
    keyed: true,
  }),
  lifts: route({
    method: 'get',
    path: '/api/lifts',
    summary: 'Lifts with their sites; `label` finds one by its label code.',
    roles,
    query: z.object({ label: z.string().max(20).optional() }),
    answer: z.object({ sites: z.array(siteSchema), lifts: z.array(liftSchema) }),
  }),
  lift: route({
    method: 'get',
    path: '/api/lifts/:id',
    summary: 'One lift.',
    roles,
    params: byId,
    answer: liftSchema,
  }),
  changeLift: route({
    method: 'patch',
    path: '/api/lifts/:id',
    summary: "Change a lift's name, notes or hazards.",
    roles: ['engineer', 'administrator'],
    params: byId,
    body: liftChangeSchema,
    answer: liftSchema,
    versioned: true,
    keyed: true,
  }),
  circuit: route({
    method: 'get',
    path: '/api/circuits/:id/revisions/:revision',
    summary: 'An issued revision of a circuit.',
    roles,
    params: z.object({ id: idSchema, revision: z.coerce.number().pipe(versionSchema) }),
    answer: circuitRevisionSchema,
  }),
  checkCircuit: route({
    method: 'post',
    path: '/api/circuits/check',
    summary: 'Findings on a circuit; nothing is stored.',
    roles: ['engineer', 'administrator'],
    body: z.unknown(),
    answer: z.object({ findings: z.array(checkFindingSchema) }),
  }),
  pack: route({
    method: 'get',
    path: '/api/sync/pack',
    summary: 'All that a phone needs to work without signal.',
    roles,
    answer: packSchema,
  }),
  sendEvents: route({
    method: 'post',
    path: '/api/sync/events',
    summary: 'Send case events; the answer has one result per event.',
    roles,
    body: eventBatchSchema,
    answer: eventResultsSchema,
  }),
  feed: route({
    method: 'get',
    path: '/api/sync/feed',
    summary: 'Events after a position, in commit order.',
    roles,
    query: z.object({
      after: z.coerce.number().pipe(z.int().min(0)).default(0),
      limit: z.coerce.number().pipe(z.int().min(1).max(500)).default(200),
    }),
    answer: feedSchema,
  }),
  cases: route({
    method: 'get',
    path: '/api/cases',
    summary: 'Cases, latest first.',
    roles,
    query: z.object({
      liftId: idSchema.optional(),
      status: caseStatusSchema.optional(),
      before: z.iso.datetime().optional(),
      limit: z.coerce.number().pipe(z.int().min(1).max(100)).default(50),
    }),
    answer: z.object({ cases: z.array(caseSummarySchema) }),
  }),
  case: route({
    method: 'get',
    path: '/api/cases/:id',
    summary: 'One case with all its events.',
    roles,
    params: byId,
    answer: caseDetailSchema,
  }),
  reviewQueue: route({
    method: 'get',
    path: '/api/review/queue',
    summary: 'Closed cases that wait for review, those with most risk first.',
    roles: ['supervisor'],
    answer: z.object({ cases: z.array(queueEntrySchema) }),
  }),
} as const;
export type RouteName = keyof typeof routes;
