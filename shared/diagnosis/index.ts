export {
  USUAL_METER,
  meterFunctionSchema,
  meterSchema,
  observationSchema,
  type Meter,
  type MeterFunction,
  type Observation,
  type ReadingObservation,
} from './observation';
export {
  adviceSchema,
  cautionCodeSchema,
  cautionCodes,
  clearedSchema,
  dangerSchema,
  outcomeSchema,
  reasonSchema,
  sectionBeliefSchema,
  stepSchema,
  stoppingSchema,
  suggestionSchema,
  suspectSchema,
  type Advice,
  type AdviceRequest,
  type CautionCode,
  type Danger,
  type Outcome,
  type Reason,
  type SectionBelief,
  type Step,
  type Stopping,
  type Suggestion,
  type Suspect,
} from './advice';
export { ENGINE, createEngine, type Engine } from './advise';
export { bestCuts, type CutPlan } from './cutTree';
export {
  describeReading,
  type ReadingDescription,
  type ReadingToDescribe,
} from './describeReading';
export { afterRepair, type PointAfterRepair } from './afterRepair';
export { provingTests, type ProvingTest } from './provingTests';
