import { routes } from '@shared/contract';
import type { Mount } from '../../platform/http/mount';
import type { Services } from '../../platform/services';
import { makePack } from './makePack';
import { readFeed } from './readFeed';
import { sendEvents } from './sendEvents';

/** Largest batch, bytes: a phone cuts its batches at half of this. */
const MOST_BATCH_BYTES = 1024 * 1024;

export function syncRoutes(mount: Mount, { config, ids }: Services): void {
  mount(routes.pack, ({ inside }) => inside((org) => makePack(org, config.build)));
  mount(
    routes.sendEvents,
    ({ body, caller, now, inside }) =>
      sendEvents({ role: caller.role, device: body.device, events: body.events, now, ids, inside }),
    { mostBytes: MOST_BATCH_BYTES },
  );
  mount(routes.feed, ({ query, inside }) =>
    inside((org) => readFeed(org, query.after, query.limit)),
  );
}
