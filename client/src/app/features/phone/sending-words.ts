import { sentenceOf } from '@shared/contract';
import type { SendFailure } from '../../core/device/outbox-policy';
import type { SyncState } from '../../core/device/sync';

const PLENTY = 429;
const BROKEN = 500;

/** Why what is kept here is not sent yet, and what happens next. */
export function sendingWords(state: SyncState, online: boolean): string {
  if (state.kind === 'working') return $localize`Sending now.`;
  if (state.kind === 'waiting') return failureWords(state.why);
  return online
    ? $localize`The server is reached; what you enter is sent by itself.`
    : $localize`No signal. It is sent by itself when there is some.`;
}

function failureWords(why: SendFailure): string {
  switch (why.kind) {
    case 'unreachable':
      return $localize`The server can't be reached from here. It is tried again by itself.`;
    case 'signed out':
      return sentenceOf('not_signed_in');
    case 'too large':
      return $localize`The server found it too much at once. The next try takes less.`;
    case 'broken':
      return $localize`Something went wrong on this phone. What is kept stays; it is tried again.`;
    case 'answered':
      if (why.status === PLENTY) return $localize`The server asks to wait. It is tried again then.`;
      if (why.status >= BROKEN) {
        return $localize`The server has a trouble of its own. It is tried again by itself.`;
      }
      return $localize`The server does not take this now. What is kept stays; it is tried again.`;
  }
}
