export {
  EARTH,
  circuitSchema,
  conditionSchema,
  faultModeSchema,
  faultModes,
  faultSchema,
  hazardSchema,
  partSchema,
  placeSchema,
  relayPositionSchema,
  stringSchema,
  terminalSchema,
  type Circuit,
  type Condition,
  type Fault,
  type FaultMode,
  type LiftState,
  type Part,
  type PartKind,
  type PartOf,
  type Place,
  type RelayPosition,
  type StringLine,
  type Terminal,
} from './circuit';
export type { CheckFinding } from './finding';
export { completeState, contactClosed, isResting, liftStateKey, restingState } from './liftState';
export { tagsOf } from './tags';
export {
  PART_KINDS,
  modesOf,
  proofsOf,
  type ModeBehaviour,
  type PartKindBehaviour,
  type Proof,
} from './partKinds';
export { RESISTIVE_OHMS, faultKey, singleFaults, type WeightedFault } from './faults';
export { travelOf, type Travel } from './travel';
export {
  CONTROLLER,
  finestSections,
  sectionsOf,
  stringSteps,
  stringTags,
  type Section,
  type StringStep,
} from './sections';
export {
  SPEC_TAGS,
  buildStringCircuit,
  type SpecCoil,
  type SpecPart,
  type StringSpec,
  type StringStop,
} from './stringCircuit';
export { stringCircuit } from './stringNotation';
export { checkCircuit, circuitFindings, hasErrors, type CheckedCircuit } from './validator';
