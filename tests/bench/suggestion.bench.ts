import { companies } from '../../seeds/companies';
import { playHunt } from '../../seeds/cases/playHunt';
import { CONTROLLER, restingState, singleFaults } from '../../shared/circuit';
import { createEngine, USUAL_METER, type Observation } from '../../shared/diagnosis';

/*
 * One suggestion on the demo's largest circuit, tables built, over the observations of whole hunts. The
 * reference is the target: 50 ms at the median (a screen that answers at once).
 */
const TARGET = 50;
const HUNTS = 12;

const circuit = companies
  .flatMap(({ circuits }) => Object.values(circuits))
  .reduce((a, b) => (b.parts.length > a.parts.length ? b : a));
const faults = singleFaults(circuit).filter(({ fault }) => fault.mode === 'open');
const engine = createEngine(circuit);
const ask = (observations: readonly Observation[], place: string) => {
  const begun = performance.now();
  engine.advise({
    observations,
    place,
    state: restingState(circuit),
    unreachable: [],
    declined: [],
    meter: USUAL_METER,
  });
  return performance.now() - begun;
};

const first = ask([], CONTROLLER);
const times: number[] = [];
for (let k = 0; k < HUNTS; k++) {
  const { fault } = faults[Math.floor((k * faults.length) / HUNTS)]!;
  const { steps } = playHunt(circuit, [fault], String);
  const seen: Observation[] = [];
  for (const { observation, suggestion } of steps) {
    seen.push(observation);
    times.push(ask(seen, suggestion.place));
  }
}
times.sort((a, b) => a - b);
const at = (share: number) => times[Math.min(times.length - 1, Math.floor(share * times.length))]!;
const line = (name: string, value: number, target: string) =>
  process.stdout.write(`${name.padEnd(48)} ${value.toFixed(1).padStart(8)} ms  ${target}\n`);
process.stdout.write(
  `${circuit.name}: ${circuit.parts.length} parts, ${times.length} suggestions\n`,
);
line('first suggestion, with all tables', first, '');
line('next suggestion, median', at(0.5), `target < ${TARGET} ms`);
line('next suggestion, 95th percentile', at(0.95), '');
