import { describe, expect, it } from 'vitest';
import { stringCircuit, type Fault } from '../circuit';
import { solve } from '../solver';
import { createEngine, USUAL_METER, type Observation, type Step } from './index';

const LINE =
  '110 V DC earthed: T0 (overload) T1 (stop) T2 (governor) T3 [SR] (gate) T4 (lock) T5 [LR]';
const MOST_STEPS = 30;

/** The solver answers what the engine asks, without noise, until the engine stops asking. */
function play(line: string, faults: readonly Fault[]): Step {
  const circuit = stringCircuit(line);
  const engine = createEngine(circuit);
  const lift = solve(circuit, {}, faults);
  const observations: Observation[] = [];
  for (let k = 0; k < MOST_STEPS; k++) {
    const { step } = engine.advise({
      observations,
      place: 'controller',
      state: {},
      unreachable: [],
      declined: [],
      meter: USUAL_METER,
    });
    if (step.kind !== 'suggestion') return step;
    const { relay, red, black } = step.suggestion;
    const id = String(k);
    if (relay !== undefined) {
      observations.push({ kind: 'relay', id, relay, position: lift.relays[relay]!, state: {} });
      continue;
    }
    const { mean } = lift.read({ red: red!, black: black!, meterOhms: USUAL_METER.ohms });
    observations.push({
      kind: 'reading',
      id,
      red: red!,
      black: black!,
      function: 'dc volts',
      volts: Math.round(mean * 10) / 10,
      meter: USUAL_METER,
      state: {},
      place: 'controller',
    });
  }
  throw new Error(`no end of the hunt for ${JSON.stringify(faults)}`);
}

describe('a hunt on a clean string', () => {
  it.each(['overload', 'stop', 'governor', 'gate', 'lock'])('finds %s open', (part) => {
    const step = play(LINE, [{ part, mode: 'open' }]);
    expect(step.kind).toBe('finding');
    if (step.kind === 'finding') expect(step.suspect.faults.map((f) => f.part)).toContain(part);
  });

  it('begins with a free look at a relay', () => {
    const { step } = createEngine(stringCircuit(LINE)).advise({
      observations: [],
      place: 'controller',
      state: {},
      unreachable: [],
      declined: [],
      meter: USUAL_METER,
    });
    expect(step).toMatchObject({ kind: 'suggestion', suggestion: { kind: 'relay', minutes: 0 } });
  });
});
