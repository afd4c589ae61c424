import { InjectionToken } from '@angular/core';

/** Tells the other tabs of this phone that cases changed in the store. */
export interface TabChannel {
  post(caseIds: readonly string[]): void;
  listen(heard: (caseIds: readonly string[]) => void): void;
}

const CHANNEL = 'lampline-cases';

export const TAB_CHANNEL = new InjectionToken<TabChannel>('tab channel', {
  providedIn: 'root',
  factory: () => {
    if (typeof BroadcastChannel === 'undefined') {
      return { post: () => undefined, listen: () => undefined };
    }
    const channel = new BroadcastChannel(CHANNEL);
    return {
      post: (caseIds) => channel.postMessage(caseIds),
      listen: (heard) => {
        channel.onmessage = ({ data }: MessageEvent<readonly string[]>) => heard(data);
      },
    };
  },
});
