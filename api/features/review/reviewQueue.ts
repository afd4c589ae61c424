import type { QueueEntry } from '@shared/contract';
import type { InOrganisation } from '../../platform/db/doors';
import { casesToReview } from '../cases/repository';

/** Closed cases that wait for review, those with most risk first. */
export const reviewQueue = async (org: InOrganisation): Promise<{ cases: QueueEntry[] }> => ({
  cases: await casesToReview(org),
});
