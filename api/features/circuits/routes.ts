import { routes } from '@shared/contract';
import type { Mount } from '../../platform/http/mount';
import { checkACircuit } from './checkACircuit';
import { findRevision } from './findRevision';

/** Largest circuit that is checked, bytes. */
const MOST_CIRCUIT_BYTES = 1024 * 1024;

export function circuitRoutes(mount: Mount): void {
  mount(routes.circuit, ({ params, inside }) =>
    inside((org) => findRevision(org, params.id, params.revision)),
  );
  mount(routes.checkCircuit, ({ body }) => Promise.resolve(checkACircuit(body)), {
    mostBytes: MOST_CIRCUIT_BYTES,
  });
}
