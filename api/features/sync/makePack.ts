import type { Pack } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { casesForPhones } from '../cases/repository';
import { revisionsOf } from '../circuits/repository';
import { listLifts, listSites } from '../lifts/repository';
import { namesOf } from '../people/repository';
import { currentPosition, eventsOfCases } from './repository';

/** Closed cases of each lift that a phone keeps. */
const CLOSED_CASES_OF_A_LIFT = 5;
/** Oldest build number of a client that may still send. */
const OLDEST_CLIENT = 1;

/**
 * All that a phone needs without signal. The position is read first: whatever commits after it comes
 * again by the feed, so nothing is missed between the two.
 */
export async function makePack(org: InOrganisation, build: string): Promise<Pack> {
  const position = await currentPosition(org);
  const sites = await listSites(org);
  const lifts = await listLifts(org);
  const cases = await casesForPhones(org, CLOSED_CASES_OF_A_LIFT);
  const events = await eventsOfCases(
    org,
    cases.map(({ id }) => id),
  );
  const circuits = await revisionsOf(org, [
    ...lifts.flatMap(({ circuitId }) => (circuitId === null ? [] : [circuitId])),
    ...cases.map(({ circuitId }) => circuitId),
  ]);
  const names = await namesOf(
    org,
    events.map(({ actor }) => actor),
  );
  return { sites, lifts, circuits, events, names, position, build, oldestClient: OLDEST_CLIENT };
}
