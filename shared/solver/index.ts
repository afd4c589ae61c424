export { solve, type SolveOptions } from './solve';
export type { Probes, SettledReading, Solution } from './solution';
export { POWER_RECTIFIER, type DiodeLaw } from './diodeLaw';
export { solvable } from './solvable';
export { OPEN_OHMS } from './faultEffects';
export { FLOATING_OHMS } from './settledNetwork';
