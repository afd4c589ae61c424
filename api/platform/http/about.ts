import { routes } from '@shared/contract';
import type { Services } from '../services';
import type { Mount } from './mount';
import { describeRoutes } from './openapi';

/** What the API says of itself. */
export function aboutRoutes(mount: Mount, { config, database }: Services): void {
  let description: object | undefined;

  mount(routes.health, async () => {
    await database.beforeSignIn(({ db }) => db.execute('select 1'));
    return { status: 'ok' as const, build: config.build };
  });

  mount(routes.openapi, async () => {
    description ??= describeRoutes(routes, config.build);
    return description as Record<string, unknown>;
  });
}
