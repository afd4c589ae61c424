import type { Logger } from 'pino';
import type { Config } from '../config';
import type { Database } from './db/doors';

/** What features are given; nothing reaches for time, randomness or the environment by itself. */
export interface Services {
  readonly config: Config;
  readonly database: Database;
  readonly clock: () => Date;
  /** A new UUIDv7. */
  readonly ids: () => string;
  readonly logger: Logger;
}
