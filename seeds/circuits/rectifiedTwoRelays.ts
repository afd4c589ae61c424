import { CONTROLLER, circuitSchema, EARTH, type Circuit } from '../../shared/circuit';
import { atController, lineParts, lineTerminals, placesOf } from './seriesLine';
import { doorLine, stopLine } from './usualDevices';

/** Relay coils of the string: pull-in 72 V, drop-out 30 V of 110 (common practice for DC relays). */
const RELAY = {
  ohms: 3300,
  current: 'direct',
  ratedVolts: 110,
  pullInMilliamps: 21.8,
  dropOutMilliamps: 9.1,
  delaySeconds: 0.03,
} as const;

/**
 * 110 V DC from a bridge behind a 124 V winding, negative earthed by a link; a stop line with its relay, a
 * door and lock line with its relay, and a direction contactor that hangs on it while a call is answered.
 */
export function rectifiedTwoRelays(landings: number): Circuit {
  const tag = (step: number, inside?: number) =>
    `${20 + step}${inside === undefined ? '' : String.fromCharCode(96 + inside)}`;
  const naming = { tag, landings };
  const devices = [...stopLine(naming), ...doorLine(naming)];
  const everywhere = placesOf(landings).places.map(({ name }) => name);
  const back = '40';
  const coil = (name: string, at: string, weight = 1.5) => ({
    ...RELAY,
    kind: 'coil' as const,
    name,
    device: name,
    place: CONTROLLER,
    between: [at, back] as [string, string],
    weight,
  });
  return circuitSchema.parse({
    name: `Rectified string, two relays, ${landings} landings`,
    drawing: 'LW 210 sheet 4',
    nominalVolts: 110,
    stringCurrent: 'direct',
    ...placesOf(landings),
    conditions: [{ name: 'call registered', values: ['no', 'yes'], moves: true }],
    terminals: [
      atController('11', 'winding'),
      atController('12', 'winding'),
      atController('15', 'plus'),
      atController('16', 'minus'),
      atController(tag(0), 'behind the fuse'),
      atController(back, 'return', everywhere.slice(1)),
      ...lineTerminals(devices),
      atController('50', 'direction contactor'),
    ],
    parts: [
      {
        kind: 'supply',
        name: 'control winding',
        place: CONTROLLER,
        weight: 2,
        between: ['11', '12'],
        current: 'alternating',
        volts: 124,
        hertz: 50,
        ohms: 1.4,
      },
      {
        kind: 'bridge',
        name: 'rectifier',
        place: CONTROLLER,
        weight: 3,
        between: ['11', '12', '15', '16'],
        inspection: 'Smell, plates, heat; ripple against mean.',
      },
      {
        kind: 'fuse',
        name: 'control fuse',
        device: 'control fuse',
        place: CONTROLLER,
        weight: 6,
        between: ['15', tag(0)],
        ohms: 0.1,
        inspection:
          'Dead: continuity and rating against the drawing. Never uprate; find the cause.',
      },
      ...lineParts(tag(0), devices),
      coil('stop relay', tag(8)),
      coil('lock relay', tag(11)),
      {
        kind: 'contact',
        name: 'call contact',
        device: 'call contact',
        place: CONTROLLER,
        weight: 1,
        between: [tag(11), '50'],
        ohms: 0.05,
        condition: { name: 'call registered', closedWhen: ['yes'] },
      },
      {
        ...coil('direction contactor', '50'),
        ohms: 550,
        pullInMilliamps: 160,
        dropOutMilliamps: 80,
      },
      {
        kind: 'conductor',
        name: 'return wire',
        device: 'return wire',
        place: CONTROLLER,
        weight: 2,
        between: [back, '16'],
        ohms: 0.1,
      },
      {
        kind: 'link',
        name: 'earth link',
        place: CONTROLLER,
        weight: 0,
        between: ['16', EARTH],
        ohms: 0.05,
      },
    ],
    strings: [
      { name: 'safety string', from: tag(0), to: tag(11), return: back, supplyReturn: '16' },
    ],
  });
}
