import { readFileSync } from 'node:fs';
import type { HuntCircuit, HuntFault, HuntSample } from './huntCircuit';

/**
 * Source: readings of three invented lifts (a rectified string, an AC string, an unearthed DC string) by
 * ngspice 39 (Debian), 1,000 to 2,000 steps a cycle, opens 1 Gohm, diodes IS=1e-9 N=1.7 RS=0.05, 1 Tohm
 * from each node to earth, meter connected. They are carried in `data/reference.json`.
 */
export interface Scenario {
  readonly name: string;
  readonly circuit: string;
  readonly faults: readonly HuntFault[];
  readonly state: string;
  readonly meterOhms: number;
  readonly relays: Readonly<Record<string, string>>;
  readonly samples: readonly HuntSample[];
}

const file = new URL('./data/reference.json', import.meta.url);
export const { circuits, scenarios } = JSON.parse(readFileSync(file, 'utf8')) as {
  readonly circuits: readonly HuntCircuit[];
  readonly scenarios: readonly Scenario[];
};
