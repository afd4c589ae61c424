import type { Fault } from '../../shared/circuit';

/** One closed case of the demo: the fault that was there, and what people said and did. */
export interface PastCase {
  readonly company: string;
  readonly lift: string;
  /** When it was opened, ISO 8601. */
  readonly openedAt: string;
  readonly complaint: string;
  readonly fault: Fault;
  readonly cause: string;
  readonly repair: string;
  readonly part?: { readonly description: string; readonly number?: string };
  readonly runs: number;
  readonly review?: 'accepted' | { readonly question: string };
  /** How the record is weaker than it should be; the review shows it. */
  readonly weak?: 'hasty' | 'no notices';
}

const open = (part: string): Fault => ({ part, mode: 'open' });

/** Twelve closed cases; their readings are played by engine and solver. */
export const pastCases: readonly PastCase[] = [
  {
    company: 'fennimore',
    lift: 'SA1T7M3',
    openedAt: '2026-09-03T07:40:00.000Z',
    complaint: 'Dead at the street landing since the morning',
    fault: open('car gate contact'),
    cause: 'Contact finger worn; gate rebounds and leaves no pressure on it',
    repair: 'Finger and spring replaced, rebound buffer of the gate renewed',
    part: { description: 'Gate contact finger with spring', number: 'BP 1140' },
    runs: 10,
    review: 'accepted',
  },
  {
    company: 'fennimore',
    lift: 'SA1T7M3',
    openedAt: '2026-10-19T13:05:00.000Z',
    complaint: 'Stops between floors, then dead',
    fault: open('lock contact, landing 3'),
    cause: 'Keeper loose, bolt stopped on its lip',
    repair: 'Keeper reset and pinned; bolt engagement measured before contact',
    runs: 12,
    review: 'accepted',
  },
  {
    company: 'fennimore',
    lift: 'SA2T7M4',
    openedAt: '2026-09-21T09:15:00.000Z',
    complaint: 'Does not start, no relay in',
    fault: { part: 'control fuse', mode: 'blown' },
    cause: 'Travelling cable chafed at the hanger, core touched earth in one car position',
    repair:
      'Core moved to a spare, cable tied clear of the edge, fuse of the rating on the drawing',
    part: { description: 'Control fuse 2 A, DC rated' },
    runs: 14,
    review: 'accepted',
  },
  {
    company: 'fennimore',
    lift: 'SA2T7M4',
    openedAt: '2026-11-11T16:20:00.000Z',
    complaint: 'Door shut, nothing happens',
    fault: open('door contact, landing 6'),
    cause: 'Door had dropped on its hinge, finger bent',
    repair: 'Hinge packed, finger set; checked with the door pushed both ways',
    runs: 8,
  },
  {
    company: 'fennimore',
    lift: 'SA3T7M5',
    openedAt: '2026-10-02T06:50:00.000Z',
    complaint: 'Laundry lift dead after the night',
    fault: open('pit stop'),
    cause: 'Pressed by the cleaners when they emptied the pit; switch itself sound',
    repair: 'Found who set it and spoke to them; released by them; notice renewed',
    runs: 4,
    review: { question: 'Who was in the pit, and how do we know that nobody was left there?' },
  },
  {
    company: 'fennimore',
    lift: 'SA3T7M5',
    openedAt: '2026-11-17T10:30:00.000Z',
    complaint: 'Stops at once when the gate closes',
    fault: { part: 'stop relay', mode: 'open' },
    cause: 'Coil burnt through at the leading-out wire, old solder',
    repair: 'Coil replaced by one of the same ohms; pull-in and drop-out measured',
    part: { description: 'Relay coil 3300 ohm', number: 'BP 2203' },
    runs: 6,
  },
  {
    company: 'fennimore',
    lift: 'CM1W2K8',
    openedAt: '2026-09-29T08:10:00.000Z',
    complaint: 'Goods lift dead, doors all shut',
    fault: open('lock contact, landing 2'),
    cause: 'Fluff packed behind the roller arm, bolt not home',
    repair: 'Cleaned, arm freed; guard plate asked for',
    runs: 10,
    review: 'accepted',
  },
  {
    company: 'fennimore',
    lift: 'CM1W2K8',
    openedAt: '2026-11-20T14:45:00.000Z',
    complaint: 'Dead again, second time this autumn',
    fault: open('bottom final limit'),
    cause: 'Roller seized after water in the pit',
    repair: 'Limit switch replaced, pump float freed',
    part: { description: 'Limit switch with roller', number: 'OW 71' },
    runs: 6,
    weak: 'no notices',
  },
  {
    company: 'fennimore',
    lift: 'CM2W2K9',
    openedAt: '2026-10-27T11:00:00.000Z',
    complaint: 'Works sometimes, dead now',
    fault: open('governor switch'),
    cause: 'Lever knocked while the sheave was cleaned; no speed event, gear not set',
    repair: 'Checked rope, sheave and gear; reset once; setting left sealed',
    runs: 6,
    review: 'accepted',
  },
  {
    company: 'fennimore',
    lift: 'RT1A6B2',
    openedAt: '2026-11-24T18:30:00.000Z',
    complaint: 'Dead, tenants upstairs waiting',
    fault: open('car gate contact'),
    cause: 'Bent gate picket',
    repair: 'Picket straightened, contact cleaned',
    runs: 1,
    weak: 'hasty',
  },
  {
    company: 'caldervale',
    lift: 'QS1N5H7',
    openedAt: '2026-10-08T07:20:00.000Z',
    complaint: 'Hoist dead at the weighing floor',
    fault: open('safety-gear switch'),
    cause: 'Linkage spring weak, switch bounced open; gear not set, no marks on the guides',
    repair: 'Spring replaced, linkage freed, gear tried by its maker’s method',
    runs: 8,
    review: 'accepted',
  },
  {
    company: 'caldervale',
    lift: 'QS2N5H8',
    openedAt: '2026-11-19T09:05:00.000Z',
    complaint: 'No relay in, lamps lit',
    fault: open('return wire'),
    cause: 'Return terminal loose since the contactor was changed',
    repair: 'Terminal cleaned, new ferrule, all returns tightened and tugged',
    runs: 5,
  },
];
