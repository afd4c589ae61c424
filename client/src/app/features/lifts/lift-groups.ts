import type { CaseState } from '@shared/cases';
import type { Lift, Site } from '@shared/contract';

export interface LiftRow {
  readonly lift: Lift;
  /** A case that is open, or that waits for an answer. */
  readonly open: CaseState | undefined;
}

export interface SiteGroup {
  readonly site: Site;
  readonly rows: readonly LiftRow[];
}

/** Found lifts by site, in the order of the best found one. */
export function liftGroups(
  sites: readonly Site[],
  lifts: readonly Lift[],
  cases: readonly CaseState[],
  found: readonly string[],
): readonly SiteGroup[] {
  const groups = new Map<string, LiftRow[]>();
  for (const id of found) {
    const lift = lifts.find((each) => each.id === id);
    if (!lift) continue;
    const open = cases.find(
      ({ liftId, status }) => liftId === id && (status === 'open' || status === 'returned'),
    );
    groups.set(lift.siteId, [...(groups.get(lift.siteId) ?? []), { lift, open }]);
  }
  return [...groups].flatMap(([siteId, rows]) => {
    const site = sites.find(({ id }) => id === siteId);
    return site ? [{ site, rows }] : [];
  });
}
