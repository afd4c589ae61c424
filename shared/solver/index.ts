export { solve, type SolveOptions } from './solve';
export type { Probes, SettledReading, Solution } from './solution';
export { POWER_RECTIFIER, type DiodeLaw } from './diodeLaw';
