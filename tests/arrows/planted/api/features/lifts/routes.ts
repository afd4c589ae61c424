import { known } from './repository';

/** Planted: routes go through use cases. */
export const routes = known;
