import type { Feed } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { eventsAfter } from './repository';

/**
 * Events after a cursor, without a gap: positions are given at commit, so the next one is always the last
 * plus one. If it ever were not, the answer ends before the gap instead of passing it (L7).
 */
export async function readFeed(org: InOrganisation, after: number, limit: number): Promise<Feed> {
  const read = await eventsAfter(org, after, limit + 1);
  const whole = read.filter(({ position }, k) => position === after + k + 1);
  const events = whole.slice(0, limit);
  return {
    events,
    position: events.at(-1)?.position ?? after,
    more: whole.length > limit,
  };
}
