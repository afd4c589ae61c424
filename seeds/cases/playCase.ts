import type { CaseEvent, EventType, PayloadOf } from '../../shared/cases';
import { foldCase, pointsToReadAgain, refusalOf, type FoldedEvent } from '../../shared/cases';
import { restingState, type Circuit, type LiftState } from '../../shared/circuit';
import { USUAL_METER } from '../../shared/diagnosis';
import { solve } from '../../shared/solver';
import { seedId } from '../seedId';
import type { PastCase } from './pastCases';
import { playHunt, type PlayedHunt } from './playHunt';

/** A demo event with who wrote it. */
export interface PlayedEvent {
  readonly event: CaseEvent;
  readonly actor: string;
}

export interface CasePeople {
  readonly technician: string;
  readonly supervisor: string;
}

/** Minutes that things take beside the readings (judgement). */
const TAKES = { arrival: 6, finding: 3, repair: 25, proving: 8, service: 6, review: 60 * 20 };
/** Minutes of each entry of a record that was written in haste. */
const HASTE = 0.02;

/** Writes the events of one case as the people and their phones would have. */
class CaseWriter {
  readonly events: PlayedEvent[] = [];
  private readonly folded: FoldedEvent[] = [];
  private at: number;

  constructor(
    private readonly caseId: string,
    openedAt: string,
    private readonly pace: number,
  ) {
    this.at = Date.parse(openedAt);
  }

  wait(minutes: number): void {
    this.at += minutes * this.pace * 60_000;
  }

  write<T extends EventType>(
    by: { readonly actor: string; readonly role: string },
    type: T,
    payload: PayloadOf<T>,
    state: LiftState,
    id = seedId(`${this.caseId} ${this.events.length}`),
  ): void {
    const device = seedId(`device of ${by.actor}`);
    const event: CaseEvent = {
      id,
      caseId: this.caseId,
      device,
      // Given in the order of all cases when they are loaded.
      sequence: 1,
      schema: 1,
      type,
      payload: JSON.parse(JSON.stringify(payload)) as Record<string, unknown>,
      recordedAt: new Date(this.at).toISOString(),
      state: { ...state },
    };
    const folded = { ...event, actor: by.actor };
    const refusal = refusalOf(this.state, folded, { role: by.role });
    if (refusal) throw new Error(`${this.caseId} ${type}: ${JSON.stringify(refusal)}`);
    this.folded.push(folded);
    this.events.push({ event, actor: by.actor });
  }

  get state() {
    return foldCase(this.folded);
  }
}

/** One past case, hunted by the engine on the solver's lift, repaired, proven, closed and reviewed. */
export function playCase(
  past: PastCase,
  ids: { readonly caseId: string; readonly liftId: string; readonly circuitId: string },
  circuit: Circuit,
  people: CasePeople,
): readonly PlayedEvent[] {
  const writer = new CaseWriter(ids.caseId, past.openedAt, past.weak === 'hasty' ? HASTE : 1);
  const technician = { actor: people.technician, role: 'technician' };
  const supervisor = { actor: people.supervisor, role: 'supervisor' };
  const rest = restingState(circuit);
  const hunt = playHunt(circuit, [past.fault], (k) => seedId(`${ids.caseId} seen ${k}`));

  writer.write(
    technician,
    'case opened',
    {
      liftId: ids.liftId,
      circuitId: ids.circuitId,
      circuitRevision: 1,
      complaint: past.complaint,
      practice: false,
    },
    rest,
  );
  writer.wait(TAKES.arrival);
  writer.write(
    technician,
    'arrival checked',
    {
      peopleSafe: true,
      noticesUp: past.weak !== 'no notices',
      meterProven: true,
      linksFound: 0,
    },
    rest,
  );
  writeHunt(writer, hunt, technician);
  writeRepair(writer, past, hunt, circuit, technician);
  if (past.review) {
    writer.wait(TAKES.review);
    if (past.review === 'accepted') writer.write(supervisor, 'review accepted', {}, rest);
    else writer.write(supervisor, 'review returned', { question: past.review.question }, rest);
  }
  return writer.events;
}

type By = Parameters<CaseWriter['write']>[0];

function writeHunt(writer: CaseWriter, hunt: PlayedHunt, by: By): void {
  for (const { advice, suggestion, observation } of hunt.steps) {
    const { engine, step, suspects, notDescribed, nothingWrong, expectedMinutes } = advice;
    const shownId = seedId(`${observation.id} advice`);
    writer.write(
      by,
      'advice shown',
      { engine, step, suspects, notDescribed, nothingWrong, expectedMinutes },
      observation.state,
      shownId,
    );
    if (suggestion.cautions.length > 0) {
      const codes = suggestion.cautions;
      const payload = { codes: [...codes], place: suggestion.place };
      writer.write(by, 'caution acknowledged', payload, observation.state);
    }
    writer.wait(suggestion.minutes);
    if (observation.kind === 'relay') {
      const { relay, position, id, state } = observation;
      writer.write(by, 'relay seen', { relay, position, answers: shownId }, state, id);
    } else if (observation.kind === 'reading') {
      const { id, state, red, black, volts, meter, place } = observation;
      writer.write(
        by,
        'reading taken',
        {
          red,
          black,
          function: observation.function,
          volts,
          meter,
          place,
          entered: 'digits',
          answers: shownId,
        },
        state,
        id,
      );
    }
  }
}

function writeRepair(
  writer: CaseWriter,
  past: PastCase,
  { end }: PlayedHunt,
  circuit: Circuit,
  by: By,
): void {
  const rest = restingState(circuit);
  if (end.step.kind !== 'finding') {
    throw new Error(`${past.lift} ${past.fault.part}: the hunt ended with ${end.step.kind}`);
  }
  const { suspect, directObservation, restsOnOneReading } = end.step;
  const fault = suspect.faults.find(({ part }) => part === past.fault.part);
  if (!fault) throw new Error(`${past.lift}: found ${suspect.faults[0]!.part}`);
  const device = circuit.parts.find(({ name }) => name === fault.part)?.device ?? fault.part;
  writer.wait(TAKES.finding);
  writer.write(
    by,
    'finding stated',
    {
      faults: [past.fault],
      device,
      cause: past.cause,
      proof: { kind: 'measured', reading: directObservation },
      believed: suspect.probability,
      restsOnOneReading,
    },
    rest,
  );
  writer.wait(TAKES.repair);
  const parts = past.part ? [{ ...past.part, quantity: 1 }] : [];
  writer.write(by, 'repair done', { what: past.repair, devices: [device], parts }, rest);
  writer.wait(TAKES.proving);
  for (const { red, black, function: meterFunction, state } of pointsToReadAgain(writer.state!)) {
    const { mean, ripple } = solve(circuit, state, []).read({
      red,
      black,
      meterOhms: USUAL_METER.ohms,
    });
    const volts = Number((meterFunction === 'dc volts' ? mean : ripple).toFixed(1)) || 0;
    const payload = {
      red,
      black,
      function: meterFunction,
      volts,
      meter: USUAL_METER,
      place: circuit.places[0]!.name,
      entered: 'digits' as const,
    };
    writer.write(by, 'reading taken', payload, state);
    writer.wait(0.5);
  }
  const how = 'Operated; string open and relay out, feed made safe; then the dynamic proof';
  writer.write(by, 'device proven', { device, result: 'stopped', how }, rest);
  writer.wait(TAKES.service);
  writer.write(by, 'returned to service', { runs: past.runs, coversOn: true }, rest);
  writer.write(by, 'case closed', { outcome: 'repaired' }, rest);
}
