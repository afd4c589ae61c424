import { InjectionToken } from '@angular/core';

/** Runs `work` if no other tab is sending; else does nothing. Correctness rests on the server's dedupe. */
export type SendLock = (work: () => Promise<void>) => Promise<void>;

export const SEND_LOCK = new InjectionToken<SendLock>('send lock', {
  providedIn: 'root',
  factory: () => async (work) => {
    if (typeof navigator.locks === 'undefined') return work();
    await navigator.locks.request('lampline-send', { ifAvailable: true }, async (lock) => {
      if (lock) await work();
    });
  },
});

/** A number from 0 to 1 that spreads retries. */
export const CHANCE = new InjectionToken<() => number>('chance', {
  providedIn: 'root',
  factory: () => () => Math.random(),
});
