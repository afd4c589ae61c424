import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CONTROLLER, stringCircuit, type Fault, type LiftState } from '../circuit';
import { solve } from '../solver';
import type { AdviceRequest, Suggestion } from './advice';
import { createEngine } from './advise';
import { forbidden } from './forbidden';
import { USUAL_METER, type Observation } from './observation';

const SEED = 20261201;
const HUNTS = 60;
const MOST_STEPS = 14;

/** A string of some contacts, with a call that moves one of them, in a building with a pit. */
const lift = fc
  .record({
    parts: fc.integer({ min: 3, max: 9 }),
    coilAt: fc.integer({ min: 1, max: 8 }),
    inPit: fc.integer({ min: 0, max: 8 }),
    call: fc.boolean(),
    kind: fc.constantFrom('DC', 'AC', 'bridge'),
    earthed: fc.boolean(),
    volts: fc.constantFrom(48, 110, 220),
    faultAt: fc.integer({ min: 0, max: 8 }),
    mode: fc.constantFrom('open', 'resistive', 'not there'),
    refuse: fc.array(fc.integer({ min: 0, max: 12 }), { maxLength: 4 }),
    slips: fc.array(fc.boolean(), { minLength: MOST_STEPS, maxLength: MOST_STEPS }),
  })
  .map((drawn) => {
    const { parts, coilAt, inPit, call, kind, earthed, volts } = drawn;
    const body = Array.from({ length: parts }, (_, k) => {
      const place = k === inPit ? '@pit' : '';
      const places = k === inPit ? `@controller,pit` : '';
      const when = call && k === parts - 1 ? ' when call=yes' : '';
      const coil = k === coilAt ? ' [SR 3300 ohm]' : '';
      return `T${k}${places}${coil} (part ${k}${place}${when})`;
    });
    const head = `${volts} V ${kind}${earthed ? ' earthed' : ''}`;
    const drawnCircuit = stringCircuit(`${head}: ${body.join(' ')} T${parts} [LR 3300 ohm]`);
    const circuit = {
      ...drawnCircuit,
      conditions: drawnCircuit.conditions.map((each) => ({ ...each, moves: true })),
      places: drawnCircuit.places.map((place) =>
        place.name === 'pit' ? { ...place, shaft: true, setUpMinutes: 5 } : place,
      ),
      minutes: { controller: { pit: 4 } },
    };
    return { ...drawn, circuit };
  });

type Lift = typeof lift extends fc.Arbitrary<infer T> ? T : never;

/** Every suggestion of one hunt, with what was asked. */
function suggestionsOf(drawn: Lift): { request: AdviceRequest; suggestion: Suggestion }[] {
  const { circuit, faultAt, parts, mode } = drawn;
  const engine = createEngine(circuit);
  const part = `part ${faultAt % parts}`;
  const faults: Fault[] =
    mode === 'not there' ? [] : [{ part, mode, ...(mode === 'resistive' ? { ohms: 2000 } : {}) }];
  const observations: Observation[] = [];
  const unreachable: string[] = [];
  const seen: { request: AdviceRequest; suggestion: Suggestion }[] = [];
  let place = CONTROLLER;
  let state: LiftState = Object.fromEntries(
    circuit.conditions.map(({ name, values }) => [name, values[0]!]),
  );
  for (let k = 0; k < MOST_STEPS; k++) {
    const request = {
      observations: [...observations],
      place,
      state,
      unreachable: [...unreachable],
      declined: [],
      meter: USUAL_METER,
    };
    const { step } = engine.advise(request);
    const suggestion =
      step.kind === 'suggestion' || step.kind === 'contradiction' ? step.suggestion : undefined;
    if (!suggestion) break;
    seen.push({ request, suggestion });
    const { relay, red = '', black = '', function: range = 'dc volts' } = suggestion;
    if (drawn.refuse.includes(k)) {
      unreachable.push(relay ?? red);
      continue;
    }
    place = suggestion.place;
    state = suggestion.state;
    const solution = solve(circuit, state, faults);
    const id = String(k);
    if (relay !== undefined) {
      observations.push({ kind: 'relay', id, relay, position: solution.relays[relay]!, state });
      continue;
    }
    const { mean, ripple } = solution.read({ red, black, meterOhms: USUAL_METER.ohms });
    // A slip: what a meter on the wrong tag might show.
    const volts =
      drawn.slips[k] && k % 5 === 4 ? drawn.volts / 3 : range === 'dc volts' ? mean : ripple;
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
  return seen;
}

describe('what is never suggested', () => {
  it('is not, on random circuits with random faults, refusals and slips', () => {
    let checked = 0;
    fc.assert(
      fc.property(lift, (drawn) => {
        for (const { request, suggestion } of suggestionsOf(drawn)) {
          checked += 1;
          expect(forbidden(drawn.circuit, request, suggestion)).toBeUndefined();
          const touched = [suggestion.red, suggestion.black, suggestion.relay];
          expect(request.unreachable.some((what) => touched.includes(what))).toBe(false);
        }
      }),
      { seed: SEED, numRuns: HUNTS },
    );
    expect(checked).toBeGreaterThan(HUNTS * 3);
  }, 60_000);

  const circuit = stringCircuit('110 V DC earthed: T0 (stop) T1 (gate when call=yes) T2 [LR]');
  const moving = {
    ...circuit,
    conditions: circuit.conditions.map((each) => ({ ...each, moves: true })),
  };
  const request: AdviceRequest = {
    observations: [],
    place: CONTROLLER,
    state: { call: 'no' },
    unreachable: [],
    declined: [],
    meter: USUAL_METER,
  };
  const suggestion: Suggestion = {
    kind: 'reading',
    purpose: 'locate',
    place: CONTROLLER,
    red: 'T1',
    black: 'R',
    function: 'dc volts',
    state: { call: 'no' },
    minutes: 1,
    outcomes: [],
    because: [],
    cautions: ['live terminals'],
  };

  it('would be noticed: a call without people and motion, a lamp across, a tag out of reach', () => {
    expect(forbidden(moving, request, suggestion)).toBeUndefined();
    expect(forbidden(moving, request, { ...suggestion, state: { call: 'yes' } })).toBe(
      'condition that moves, without people and motion',
    );
    const lamp = { ...request, meter: { ...USUAL_METER, kind: 'lamp' as const, ohms: 3000 } };
    expect(forbidden(moving, lamp, { ...suggestion, black: 'T2' })).toBe(
      'lamp or low impedance across a part',
    );
    expect(forbidden(moving, { ...request, unreachable: ['T1'] }, suggestion)).toBe(
      'not reached together',
    );
    expect(forbidden(moving, request, { ...suggestion, cautions: [] })).toBe(
      'no caution for live terminals',
    );
  });
});
