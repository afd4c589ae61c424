import { lift } from '../../../../../api/platform/db/schema';

/** Planted: a screen that imports the server. */
export const reached = lift;
