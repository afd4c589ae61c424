import { describe, expect, it } from 'vitest';
import { CONTROLLER, type LiftState } from '@shared/circuit';
import { createEngine, USUAL_METER, type Observation, type Step } from '@shared/diagnosis';
import { solve } from '@shared/solver';
import { huntCircuit, huntFault, huntState } from './huntCircuit';
import { circuits, scenarios, type Scenario } from './referenceData';

/*
 * Scenarios of the trade through the whole engine. Readings: ngspice 39's of `data/reference.json` where
 * the pair was sampled there; of other pairs the solver's, which agrees with it (scenarios.spec.ts).
 */
const MOST_STEPS = 40;
const WAY = 5;

/** What the novice concludes in each of them, by the trade's experience (common practice). */
const hunts = [
  { name: 'F1', part: 'landing lock contact 5', novice: ['lock relay', 'car gate contact'] },
  { name: 'F2', part: 'governor switch', novice: [] },
  { name: 'F4, black on R', part: 'return wire', novice: ['supply', 'safety relay'] },
  { name: 'F6, idle', part: 'car gate contact', novice: ['supply', 'direction contactor'] },
  { name: 'F9', part: 'bridge', novice: ['supply', 'car gate contact'] },
  { name: 'F15', part: 'top final limit', novice: [] },
  { name: 'F16', part: 'tension-weight switch', novice: ['pit stop'] },
] as const;

function play({ circuit: id, faults, state: stateName, samples }: Scenario): Step {
  const drawn = huntCircuit(circuits.find((each) => each.id === id)!);
  // The reference circuits say where terminals are and not how far: five minutes to each place.
  const ways = Object.fromEntries(drawn.places.map(({ name }) => [name, WAY]));
  const circuit = { ...drawn, minutes: { [CONTROLLER]: ways } };
  const engine = createEngine(circuit);
  const hidden = faults.map(huntFault);
  const observations: Observation[] = [];
  const sampled: LiftState = huntState(circuit, stateName);
  let state = sampled;
  let place = CONTROLLER;
  for (let k = 0; k < MOST_STEPS; k++) {
    const { step } = engine.advise({
      observations,
      place,
      state,
      unreachable: [],
      declined: [],
      meter: USUAL_METER,
    });
    if (step.kind !== 'suggestion') return step;
    const { relay, red = '', black = '', function: range = 'dc volts' } = step.suggestion;
    state = step.suggestion.state;
    place = step.suggestion.place;
    const lift = solve(circuit, state, hidden);
    const id = String(k);
    if (relay !== undefined) {
      observations.push({ kind: 'relay', id, relay, position: lift.relays[relay]!, state });
      continue;
    }
    const sample = samples.find((each) => each.red === red && each.black === black);
    const here = JSON.stringify(state) === JSON.stringify(sampled);
    const solved = lift.read({ red, black, meterOhms: USUAL_METER.ohms });
    const [dc, ac] = sample && here ? [sample.dc, sample.ac] : [solved.mean, solved.ripple];
    const volts = Math.round((range === 'dc volts' ? dc : ac) * 10) / 10;
    observations.push({
      kind: 'reading',
      id,
      red,
      black,
      function: range,
      volts,
      meter: USUAL_METER,
      state,
      place,
    });
  }
  throw new Error(`no end of the hunt of ${id}`);
}

describe.each(hunts)('$name', ({ name, part, novice }) => {
  const scenario = scenarios.find((each) => each.name === name)!;

  it(`ends with ${part}, measured on it, and not where a novice ends`, () => {
    const step = play(scenario);
    expect(step.kind).toBe('finding');
    if (step.kind !== 'finding') return;
    const found = step.suspect.faults.map((fault) => fault.part);
    expect(found[0]).toBe(part);
    for (const wrong of novice) expect(found[0]).not.toBe(wrong);
    expect(step.directObservation).toBeTruthy();
  });
});
