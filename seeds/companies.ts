import type { Circuit, Fault } from '../shared/circuit';
import { firstCompanyAccounts, secondCompanyAccounts, type DemoAccount } from './accounts';
import { alternatingOneRelay } from './circuits/alternatingOneRelay';
import { rectifiedTwoRelays } from './circuits/rectifiedTwoRelays';
import { stringBeforeBridge } from './circuits/stringBeforeBridge';
import { unearthedHighVolts } from './circuits/unearthedHighVolts';

export interface SeedLift {
  readonly name: string;
  readonly label: string;
  readonly maker: string;
  readonly controller: string;
  readonly landings: readonly string[];
  readonly hazards: readonly string[];
  readonly notes: string;
  /** Key into the company's circuits. */
  readonly circuit: string;
  /** What *play the meter* has hidden; the README lists them. */
  readonly hidden: readonly Fault[];
}

export interface SeedSite {
  readonly name: string;
  readonly address: string;
  readonly lifts: readonly SeedLift[];
}

export interface SeedCompany {
  readonly key: string;
  readonly name: string;
  readonly timeZone: string;
  readonly accounts: readonly DemoAccount[];
  readonly circuits: Readonly<Record<string, Circuit>>;
  readonly sites: readonly SeedSite[];
}

const eight = ['Vaults', 'Street', 'Gallery', 'First', 'Second', 'Third', 'Fourth', 'Roof'];
const six = ['Dock', 'Carding', 'Spinning', 'Weaving', 'Finishing', 'Loft'];
const four = ['Garden', 'Street', 'Upper', 'Attic'];
const five = ['Quay', 'Weighing', 'Store 1', 'Store 2', 'Hoist loft'];

const asbestos = 'Arc shields of the old contactors may hold asbestos: do not break or brush them.';
const noCarTopStop = 'No stop switch on the car top. Stop and ask before anyone steps on.';
const water = 'Pit takes water after rain. Look from the bottom landing first.';
const highVolts = '220 V DC on bare terminals, not earthed. Both poles are live to earth.';

const firstCompany: SeedCompany = {
  key: 'fennimore',
  name: 'Fennimore & Daughters Lifts',
  timeZone: 'Europe/London',
  accounts: firstCompanyAccounts,
  circuits: {
    rectified: rectifiedTwoRelays(8),
    alternating: alternatingOneRelay(6),
    bridged: stringBeforeBridge(4),
  },
  sites: [
    {
      name: 'Saltmarsh House',
      address: '2 Saltmarsh Row, Eastmere',
      lifts: [
        {
          name: 'Lift 1',
          label: 'SA1T7M3',
          maker: 'Brightwater & Pike',
          controller: 'BP relay, 1958',
          landings: eight,
          hazards: [asbestos],
          notes: 'Machine room at the roof, key at the porter. Mind the low beam.',
          circuit: 'rectified',
          hidden: [{ part: 'lock contact, landing 5', mode: 'open' }],
        },
        {
          name: 'Lift 2',
          label: 'SA2T7M4',
          maker: 'Brightwater & Pike',
          controller: 'BP relay, 1958',
          landings: eight,
          hazards: [asbestos],
          notes: 'Twin of lift 1; both controllers share one room.',
          circuit: 'rectified',
          hidden: [{ part: 'governor switch', mode: 'open' }],
        },
        {
          name: 'Service lift',
          label: 'SA3T7M5',
          maker: 'Brightwater & Pike',
          controller: 'BP relay, 1958',
          landings: eight,
          hazards: [water],
          notes: 'Used for laundry; overloaded at times.',
          circuit: 'rectified',
          hidden: [{ part: 'rectifier', mode: 'diode open', diode: 2 }],
        },
      ],
    },
    {
      name: 'Copper Lane Mill',
      address: 'Copper Lane, Holme Ferry',
      lifts: [
        {
          name: 'Goods lift',
          label: 'CM1W2K8',
          maker: 'Osgarth Works',
          controller: 'OW 33',
          landings: six,
          hazards: [water, noCarTopStop],
          notes: 'Ask the foreman before you isolate: the dye house hangs on the same board.',
          circuit: 'alternating',
          hidden: [{ part: 'pit stop', mode: 'open' }],
        },
        {
          name: 'Passenger lift',
          label: 'CM2W2K9',
          maker: 'Osgarth Works',
          controller: 'OW 33',
          landings: six,
          hazards: [],
          notes: '',
          circuit: 'alternating',
          hidden: [{ part: 'car gate contact', mode: 'resistive', ohms: 3000 }],
        },
      ],
    },
    {
      name: 'Orchard Terrace',
      address: '14 Orchard Terrace, Eastmere',
      lifts: [
        {
          name: 'Lift',
          label: 'RT1A6B2',
          maker: 'Tallow Brothers',
          controller: 'TB 5',
          landings: four,
          hazards: ['Mains terminals beside the control terminals, uncovered.'],
          notes: 'Tenants on every landing: tell them before you isolate.',
          circuit: 'bridged',
          hidden: [{ part: 'control fuse', mode: 'blown' }],
        },
      ],
    },
  ],
};

const secondCompany: SeedCompany = {
  key: 'caldervale',
  name: 'Calder Vale Lift Care',
  timeZone: 'Europe/London',
  accounts: secondCompanyAccounts,
  circuits: { unearthed: unearthedHighVolts(5) },
  sites: [
    {
      name: 'Quayside Stores',
      address: 'Old Quay, Port Merrow',
      lifts: [
        {
          name: 'North hoist',
          label: 'QS1N5H7',
          maker: 'Merrow Engine Co.',
          controller: 'House supply, 1931',
          landings: five,
          hazards: [highVolts, noCarTopStop],
          notes: 'Drawing revised by hand; the paper hangs in the machine room.',
          circuit: 'unearthed',
          hidden: [{ part: 'return wire', mode: 'open' }],
        },
        {
          name: 'South hoist',
          label: 'QS2N5H8',
          maker: 'Merrow Engine Co.',
          controller: 'House supply, 1931',
          landings: five,
          hazards: [highVolts],
          notes: '',
          circuit: 'unearthed',
          hidden: [{ part: 'stop relay', mode: 'open' }],
        },
      ],
    },
  ],
};

/** The demo: two invented companies, 4 sites, 8 lifts on four circuits. */
export const companies: readonly SeedCompany[] = [firstCompany, secondCompany];
