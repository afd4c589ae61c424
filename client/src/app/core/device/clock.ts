import { InjectionToken } from '@angular/core';

/** Time, ids and chance are passed in, so that a spec can replay a run. */
export interface Clock {
  /** Milliseconds since 1970. */
  now(): number;
}
export const CLOCK = new InjectionToken<Clock>('clock', {
  providedIn: 'root',
  factory: () => ({ now: () => Date.now() }),
});
