export { organisation } from './organisation';
export { person, personDetails } from './people';
export { refreshToken, session } from './sessions';
export { throttle } from './throttle';
export { circuit, circuitRevision } from './circuits';
export { lift, site } from './lifts';
export { caseRow } from './cases';
export { caseEvent, counter, quarantine } from './events';
export { audit, auditHead, idempotency } from './writes';
