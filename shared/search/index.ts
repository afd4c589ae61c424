export { asLabel, normalise, termsOf } from './normalise';
export { liftSearch, liftSearchOptions, type LiftSearch, type SearchedLift } from './liftSearch';
