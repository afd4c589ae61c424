import { liftStateKey, proofsOf, tagsOf, type Proof } from '../circuit';
import type { Consultation } from './consultation';
import { deviationsOff } from './likelihood';
import type { ReadingObservation } from './observation';

/** So many deviations off the healthy lift's value, a reading shows that something is wrong. */
const NOT_HEALTHY = 3;
/** So many deviations off, a reading is not the fault's. */
const NOT_THIS_FAULT = 4;
/** Proofs that both probes on the part's own terminals can give. */
const ON_OWN_TERMINALS: readonly Proof[] = ['across', 'output', 'with condition'];

/**
 * The reading that measured one of these hypotheses directly, as the kind of fault allows
 * (`PART_KINDS`): both probes on the part's own terminals, showing what the fault shows and a healthy
 * lift does not. Of a coil's faults the reading is the volts across it, and its relay's position, seen in
 * the same lift state, is what a healthy lift does not show. No live reading proves an earth fault.
 */
export function directReading(
  about: Consultation,
  members: readonly number[],
): ReadingObservation | undefined {
  const order = [...members].sort((a, b) => about.belief.shares[b]! - about.belief.shares[a]!);
  for (const h of order) {
    const proof = about.readings.find((reading) => measures(about, reading, h));
    if (proof) return proof;
  }
  return undefined;
}

function measures(about: Consultation, reading: ReadingObservation, h: number): boolean {
  const { fault } = about.hypotheses[h]!;
  const part = fault && about.circuit.parts.find(({ name }) => name === fault.part);
  if (!part) return false;
  const tags = tagsOf(part);
  if (!tags.includes(reading.red) || !tags.includes(reading.black)) return false;
  const proofs = proofsOf(part, fault.mode);
  const row = about.rowOf(reading);
  const scale = about.belief.supply.mean;
  const ofFault = row[h]!;
  // What a floating point shows can be anything; then only that it is not healthy counts.
  const { volts, spread } = ofFault;
  const off = deviationsOff(reading.volts, volts * scale, reading.meter, spread);
  if (!ofFault.floating && off > NOT_THIS_FAULT) return false;
  if (proofs.includes('armature')) return armatureSeen(about, reading, part.name, h);
  const healthy = deviationsOff(reading.volts, row[0]!.volts * scale, reading.meter);
  return healthy > NOT_HEALTHY && proofs.some((proof) => ON_OWN_TERMINALS.includes(proof));
}

/** The relay seen, in the reading's lift state, where the fault has it and a healthy lift has not. */
function armatureSeen(
  { circuit, predictions, request }: Consultation,
  reading: ReadingObservation,
  relay: string,
  h: number,
): boolean {
  const positions = predictions.relay(reading.state, relay);
  return request.observations.some(
    (seen) =>
      seen.kind === 'relay' &&
      seen.relay === relay &&
      liftStateKey(circuit, seen.state) === liftStateKey(circuit, reading.state) &&
      seen.position === positions[h] &&
      seen.position !== positions[0],
  );
}
