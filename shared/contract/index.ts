export {
  emailSchema,
  idSchema,
  passwordSchema,
  roleSchema,
  roles,
  versionSchema,
  type Role,
} from './primitives';
export { problemSchema, type Problem } from './problem';
export { sessionSchema, signInSchema, type Session, type SignIn } from './session';
export { personChangeSchema, personSchema, type Person, type PersonChange } from './people';
export {
  checkFindingSchema,
  circuitRevisionSchema,
  labelCodeSchema,
  liftChangeSchema,
  liftSchema,
  siteSchema,
  type CircuitRevision,
  type Lift,
  type LiftChange,
  type Site,
} from './lifts';
export {
  caseDetailSchema,
  caseStatusSchema,
  caseSummarySchema,
  queueEntrySchema,
  weaknessSchema,
  type CaseDetail,
  type CaseSummary,
  type QueueEntry,
  type Weakness,
} from './cases';
export {
  MOST_EVENTS_IN_BATCH,
  eventBatchSchema,
  eventResultSchema,
  eventResultsSchema,
  feedSchema,
  packSchema,
  type EventBatch,
  type EventResult,
  type EventResults,
  type Feed,
  type Pack,
} from './sync';
export { route, type Route } from './route';
export { routes, type RouteName } from './routes';
export { hasSentence, sentenceOf, sentences, useSentences } from './sentences/sentenceOf';
export {
  cautionSentences,
  dangerSentence,
  faultSentence,
  modeWord,
  reasonSentence,
  refusalSentence,
} from './sentences/engineWords';
