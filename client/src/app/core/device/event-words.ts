import { readEvent, type CaseEvent, type EventType, type KnownEvent } from '@shared/cases';

const names: Readonly<Record<EventType, string>> = {
  'case opened': $localize`Case opened`,
  'arrival checked': $localize`Arrival checked`,
  'reading taken': $localize`Reading`,
  'relay seen': $localize`Relay seen`,
  'device seen': $localize`Device seen`,
  'could not reach': $localize`Can't reach`,
  'suggestion declined': $localize`Suggestion set aside`,
  'place changed': $localize`Place`,
  'state changed': $localize`Lift state`,
  'event withdrawn': $localize`Entry taken back`,
  'caution acknowledged': $localize`Caution read`,
  'advice shown': $localize`Next step shown`,
  'danger raised': $localize`Dangerous finding`,
  'link fitted': $localize`Temporary link fitted`,
  'link removed': $localize`Temporary link removed`,
  'thing disturbed': $localize`Disturbed`,
  'thing restored': $localize`Restored`,
  'person entered': $localize`Person entered`,
  'person left': $localize`Person left`,
  isolated: $localize`Isolated`,
  're-energised': $localize`Re-energised`,
  'finding stated': $localize`Finding`,
  'repair done': $localize`Repair`,
  'device proven': $localize`Device proven`,
  'returned to service': $localize`Returned to service`,
  'note written': $localize`Note`,
  'case closed': $localize`Case closed`,
  'review accepted': $localize`Accepted`,
  'review returned': $localize`Returned with a question`,
};

/** What an event is, and what it says, in a few words each. */
export interface EventWords {
  readonly what: string;
  readonly says: string;
}

export function eventWords(event: CaseEvent): EventWords {
  const read = readEvent(event);
  if (read.kind !== 'known') {
    const what = Object.hasOwn(names, event.type) ? names[event.type as EventType] : event.type;
    return { what, says: '' };
  }
  return { what: names[read.event.type], says: said(read.event) };
}

function said({ type, payload, state }: KnownEvent): string {
  switch (type) {
    case 'case opened':
      return payload.complaint;
    case 'reading taken':
      return `${payload.black} – ${payload.red}: ${payload.volts} V`;
    case 'relay seen':
      return `${payload.relay}: ${payload.position}`;
    case 'device seen':
      return `${payload.part}: ${payload.seen}`;
    case 'could not reach':
      return payload.what;
    case 'place changed':
    case 'caution acknowledged':
      return payload.place;
    case 'state changed':
      return Object.entries(state)
        .map(([name, value]) => `${name} ${value}`)
        .join(', ');
    case 'link fitted':
      return `${payload.mark}: ${payload.from} – ${payload.to}`;
    case 'thing disturbed':
      return payload.what;
    case 'person entered':
      return `${payload.who}, ${payload.place}`;
    case 'finding stated':
      return `${payload.device}: ${payload.cause}`;
    case 'repair done':
      return payload.what;
    case 'device proven':
      return `${payload.device}: ${payload.result}`;
    case 'note written':
      return payload.text;
    case 'case closed':
      return payload.outcome;
    case 'review returned':
      return payload.question;
    default:
      return '';
  }
}
