import { second } from './second';

/** Planted: two files that need each other. */
export const first = (): unknown => second;
