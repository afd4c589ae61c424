import type { CircuitRevision } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { found } from '../../platform/refusal';
import { revisionOf } from './repository';

export const findRevision = async (
  org: InOrganisation,
  circuitId: string,
  revision: number,
): Promise<CircuitRevision> => found(await revisionOf(org, circuitId, revision));
