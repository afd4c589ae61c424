import { liftStateKey, type Circuit } from '../circuit';
import { solve } from '../solver';
import type { Danger } from './advice';
import type { Observation } from './observation';

/** Below this share of the string's volts there are none; above half of them there are (judgement). */
const NO_VOLTS = 0.1;
const VOLTS = 0.5;

/**
 * Signs that the string does not protect: volts where a device that is seen open must have taken them
 * away, and a relay that is in with nothing across its coil. Only observations in one lift state are
 * put beside each other.
 */
export function dangersOf(circuit: Circuit, observations: readonly Observation[]): Danger[] {
  const dangers: Danger[] = [];
  const full = circuit.nominalVolts;
  for (const seen of observations) {
    if (seen.kind === 'reading') continue;
    const state = liftStateKey(circuit, seen.state);
    const opened =
      seen.kind === 'device' && seen.seen === 'open'
        ? solve(circuit, seen.state, [{ part: seen.part, mode: 'open' }])
        : undefined;
    const coil =
      seen.kind === 'relay' && seen.position === 'in'
        ? circuit.parts.find((part) => part.kind === 'coil' && part.name === seen.relay)
        : undefined;
    for (const reading of observations) {
      if (reading.kind !== 'reading' || liftStateKey(circuit, reading.state) !== state) continue;
      const { red, black, meter } = reading;
      const shown = Math.abs(reading.volts) / full;
      const both = [seen.id, reading.id];
      if (opened && seen.kind === 'device' && shown > VOLTS) {
        const must = opened.read({ red, black, meterOhms: meter.ohms });
        const volts = reading.function === 'dc volts' ? must.mean : must.ripple;
        if (Math.abs(volts) < NO_VOLTS * full) {
          dangers.push({ code: 'volts beyond open device', part: seen.part, observations: both });
        }
      }
      if (coil?.kind === 'coil' && shown < NO_VOLTS) {
        const [a, b] = coil.between;
        const across = (red === a && black === b) || (red === b && black === a);
        const rightRange = (coil.current === 'direct') === (reading.function === 'dc volts');
        if (across && rightRange) {
          dangers.push({ code: 'relay in without volts', part: coil.name, observations: both });
        }
      }
    }
  }
  return dangers;
}
