import { reached } from '../lifts/reachesServer';

/** Planted: a feature that imports the inside of another one. */
export const other = reached;
