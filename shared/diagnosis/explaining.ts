import type { Advice, Reason, Suspect } from './advice';
import type { Consultation } from './consultation';
import { deviationsOff } from './likelihood';
import type { ReadingObservation } from './observation';
import { reason } from './reasons';

/** So many deviations off, a reading speaks against a fault; so close, it speaks for it. */
const AGAINST = 4;
const FOR = 2;
/** A part is cleared when all its faults together are believed less than this. */
const CLEARED = 1e-3;
/** Reasons shown for one suspect. */
const MOST_REASONS = 3;

const tenth = (volts: number): number => Math.round(volts * 10) / 10;

/** Why a suspect is one: readings that fit it and that a healthy lift would not show. */
export function becauseOf(about: Consultation, members: readonly number[]): Reason[] {
  const [first] = members;
  if (first === undefined) return [];
  const pointing = about.readings
    .map((reading) => ({ reading, ...misfits(about, reading, first) }))
    .filter(({ ofFault, ofHealthy }) => ofFault < FOR && ofHealthy > AGAINST)
    .sort((a, b) => b.ofHealthy - a.ofHealthy)
    .slice(0, MOST_REASONS)
    .map(({ reading, healthyVolts }) =>
      reason('reads as with this fault', {
        tags: [reading.red, reading.black],
        numbers: { volts: tenth(reading.volts), healthy: tenth(healthyVolts) },
        observations: [reading.id],
      }),
    );
  return pointing.length > 0
    ? pointing
    : [reason('fits the readings', { observations: about.readings.map(({ id }) => id) })];
}

function misfits(about: Consultation, reading: ReadingObservation, h: number) {
  const row = about.rowOf(reading);
  const scale = about.belief.supply.mean;
  const off = (volts: number) => deviationsOff(reading.volts, volts * scale, reading.meter);
  return {
    ofFault: row[h]!.floating ? 0 : off(row[h]!.volts),
    ofHealthy: off(row[0]!.volts),
    healthyVolts: row[0]!.volts * scale,
    faultVolts: row[h]!.volts * scale,
  };
}

/** Each cleared part with the reading that speaks most against it. */
export function clearedOf(about: Consultation): Advice['cleared'] {
  const byPart = new Map<string, number[]>();
  about.hypotheses.forEach(({ fault }, h) => {
    if (fault) byPart.set(fault.part, [...(byPart.get(fault.part) ?? []), h]);
  });
  return [...byPart].flatMap(([part, members]) => {
    if (about.share(members) >= CLEARED) return [];
    const usual = members.reduce((a, b) =>
      about.hypotheses[b]!.prior > about.hypotheses[a]!.prior ? b : a,
    );
    const worst = about.readings
      .map((reading) => ({ reading, ...misfits(about, reading, usual) }))
      .sort((a, b) => b.ofFault - a.ofFault)[0];
    if (!worst || worst.ofFault < AGAINST) return [];
    const { reading, faultVolts } = worst;
    const because = reason('would read otherwise', {
      tags: [reading.red, reading.black],
      numbers: { volts: tenth(reading.volts), would: tenth(faultVolts) },
      observations: [reading.id],
    });
    return [{ part, because: [because] }];
  });
}

export function suspectOf(about: Consultation, members: readonly number[]): Suspect {
  const faults = members.flatMap((h) => about.hypotheses[h]!.fault ?? []);
  return { faults, probability: about.share(members), because: becauseOf(about, members) };
}
