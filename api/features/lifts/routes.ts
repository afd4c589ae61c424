import { routes } from '@shared/contract';
import type { Mount } from '../../platform/http/mount';
import { changeLift } from './changeLift';
import { findLift, findLifts } from './findLifts';

export function liftRoutes(mount: Mount): void {
  mount(routes.lifts, ({ query, inside }) => inside((org) => findLifts(org, query.label)));
  mount(routes.lift, ({ params, inside }) => inside((org) => findLift(org, params.id)));
  mount(routes.changeLift, ({ params, body, ifMatch, now, inside }) =>
    inside((org) => changeLift(org, params.id, ifMatch, body, now)),
  );
}
