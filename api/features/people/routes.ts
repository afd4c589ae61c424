import { routes } from '@shared/contract';
import type { Mount } from '../../platform/http/mount';
import { changePerson } from './changePerson';
import { everyone, findPerson } from './findPerson';

export function peopleRoutes(mount: Mount): void {
  mount(routes.people, ({ inside }) => inside(everyone));
  mount(routes.person, ({ params, caller, inside }) =>
    inside((org) => findPerson(org, params.id, caller.role)),
  );
  mount(routes.changePerson, ({ params, body, ifMatch, now, inside }) =>
    inside((org) => changePerson(org, params.id, ifMatch, body, now)),
  );
}
