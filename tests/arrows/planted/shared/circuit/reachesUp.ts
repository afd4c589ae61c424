import { first } from '../solver/first';

/** Planted: the lower engine imports the upper one. */
export const upper = first;
