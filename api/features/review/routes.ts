import { routes } from '@shared/contract';
import type { Mount } from '../../platform/http/mount';
import { reviewQueue } from './reviewQueue';

export function reviewRoutes(mount: Mount): void {
  mount(routes.reviewQueue, ({ inside }) => inside(reviewQueue));
}
