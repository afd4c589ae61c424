import { routes } from '@shared/contract';
import type { Mount } from '../../platform/http/mount';
import { findCase, findCases } from './findCases';

export function caseRoutes(mount: Mount): void {
  mount(routes.cases, ({ query, inside }) => inside((org) => findCases(org, query)));
  mount(routes.case, ({ params, inside }) => inside((org) => findCase(org, params.id)));
}
