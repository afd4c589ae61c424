import { eq } from 'drizzle-orm';
import { lift } from '../../platform/db/schema';

/** Legal: repositories know the schema and Drizzle. */
export const known = [eq, lift];
