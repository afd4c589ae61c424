import type { EventType } from '@shared/cases';

const words: Readonly<Record<EventType, string>> = {
  'case opened': $localize`Case opened`,
  'arrival checked': $localize`Arrival checked`,
  'reading taken': $localize`Reading`,
  'relay seen': $localize`Relay seen`,
  'device seen': $localize`Device seen`,
  'could not reach': $localize`Could not reach`,
  'suggestion declined': $localize`Not sure: set aside`,
  'place changed': $localize`Moved`,
  'state changed': $localize`Lift state changed`,
  'event withdrawn': $localize`Entry taken back`,
  'caution acknowledged': $localize`Caution read`,
  'advice shown': $localize`Advice shown`,
  'danger raised': $localize`Danger raised`,
  'link fitted': $localize`Link entered`,
  'link removed': $localize`Link removed`,
  'thing disturbed': $localize`Thing disturbed`,
  'thing restored': $localize`Thing put back`,
  'person entered': $localize`Person entered`,
  'person left': $localize`Person left`,
  isolated: $localize`Isolated`,
  're-energised': $localize`Re-energised`,
  'finding stated': $localize`Finding stated`,
  'repair done': $localize`Repair done`,
  'device proven': $localize`Device proven`,
  'returned to service': $localize`Returned to service`,
  'note written': $localize`Note`,
  'case closed': $localize`Case closed`,
  'review accepted': $localize`Accepted by the supervisor`,
  'review returned': $localize`Returned with a question`,
};

/** What an event is called; one of a later version is shown by its own name. */
export const eventWord = (type: string): string =>
  Object.hasOwn(words, type) ? words[type as EventType] : type;
