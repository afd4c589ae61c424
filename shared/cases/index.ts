export {
  MOST_VOLTS,
  disturbances,
  eventTypes,
  isReviewType,
  outcomeOfCaseSchema,
  outcomes,
  payloads,
  type EventType,
  type OutcomeOfCase,
  type PayloadOf,
} from './payloads';
export {
  EVENT_SCHEMA,
  MOST_EVENT_BYTES,
  caseEventSchema,
  readEvent,
  storedEventSchema,
  type CaseEvent,
  type KnownEvent,
  type ReadEvent,
  type StoredEvent,
  type Upcaster,
} from './event';
export type {
  CaseRefusal,
  CaseState,
  CaseStatus,
  FoldedEvent,
  ClosingNeed,
  DisturbedThing,
  PersonInShaft,
  PointToReadAgain,
  ProvenDevice,
  ReviewDecision,
  SeenInCase,
  ShownAdvice,
  StatedFinding,
  TemporaryLink,
} from './caseState';
export { applyEvent, foldCase, withdrawable } from './foldCase';
export { closingNeeds, devicesToProve } from './closingNeeds';
export { pointKey, pointsToReadAgain, readAgain } from './pointsToReadAgain';
export { refusalOf, type Writer } from './refusalOf';
export { riskOf, weaknessesOf } from './weaknessesOf';
export type { EvidenceWeakness } from './weakness';
export { observationsForEngine } from './observationsForEngine';
