import type { Circuit } from '@shared/circuit';
import type { Pack } from '@shared/contract';

/** The pack as the phone keeps it; its events go through the log. */
export interface KeptPack extends Omit<Pack, 'events' | 'position'> {
  /** When it was fetched, ISO 8601. */
  readonly fetchedAt: string;
}

export const circuitKey = (id: string | null, revision: number | null): string =>
  `${id} ${revision}`;

/** Circuits by id and revision. */
export function circuitsOf(pack: KeptPack | undefined): ReadonlyMap<string, Circuit> {
  return new Map(
    (pack?.circuits ?? []).map(({ circuitId, revision, circuit }) => [
      circuitKey(circuitId, revision),
      circuit,
    ]),
  );
}

/**
 * The newer pack, holding the older one's circuit objects where the revision is the same: issued
 * revisions never change, and another object would make every engine anew.
 */
export function withSameCircuits(older: KeptPack | undefined, newer: KeptPack): KeptPack {
  const known = circuitsOf(older);
  return {
    ...newer,
    circuits: newer.circuits.map((revision) => ({
      ...revision,
      circuit: known.get(circuitKey(revision.circuitId, revision.revision)) ?? revision.circuit,
    })),
  };
}
