import { CONTROLLER, circuitSchema, EARTH, type Circuit } from '../../shared/circuit';
import { atController, lineParts, lineTerminals, placesOf } from './seriesLine';
import { doorLine, stopLine } from './usualDevices';

const RELAY = {
  kind: 'coil',
  place: CONTROLLER,
  ohms: 9000,
  current: 'direct',
  ratedVolts: 220,
  pullInMilliamps: 16.1,
  dropOutMilliamps: 7.3,
  delaySeconds: 0.03,
  weight: 1.5,
} as const;

/** 220 V DC from the building, not earthed, with two earth lamps; two relays. */
export function unearthedHighVolts(landings: number): Circuit {
  const tag = (step: number, inside?: number) =>
    `D${step}${inside === undefined ? '' : `/${inside}`}`;
  const naming = { tag, landings };
  const devices = [...stopLine(naming), ...doorLine(naming)];
  const everywhere = placesOf(landings).places.map(({ name }) => name);
  const back = 'DM';
  const lamp = (name: string, pole: string) => ({
    kind: 'lamp' as const,
    name,
    place: CONTROLLER,
    weight: 0,
    between: [pole, EARTH] as [string, string],
    ohms: 4000,
  });
  return circuitSchema.parse({
    name: `Unearthed 220 V string, two relays, ${landings} landings`,
    drawing: 'Q 7, revised by hand',
    nominalVolts: 220,
    stringCurrent: 'direct',
    ...placesOf(landings),
    conditions: [],
    terminals: [
      atController('D+', 'house supply, plus'),
      atController('D-', 'house supply, minus'),
      atController(tag(0), 'behind the fuse'),
      atController(back, 'return', everywhere.slice(1)),
      ...lineTerminals(devices),
    ],
    parts: [
      {
        kind: 'supply',
        name: 'house supply',
        place: CONTROLLER,
        weight: 2,
        between: ['D+', 'D-'],
        current: 'direct',
        volts: 220,
        ohms: 2,
      },
      {
        kind: 'fuse',
        name: 'control fuse',
        device: 'control fuse',
        place: CONTROLLER,
        weight: 6,
        between: ['D+', tag(0)],
        ohms: 0.1,
        inspection: 'A fuse that breaks DC at this voltage. Never uprate; find the cause.',
      },
      ...lineParts(tag(0), devices),
      { ...RELAY, name: 'stop relay', device: 'stop relay', between: [tag(8), back] },
      { ...RELAY, name: 'lock relay', device: 'lock relay', between: [tag(11), back] },
      {
        kind: 'conductor',
        name: 'return wire',
        device: 'return wire',
        place: CONTROLLER,
        weight: 2,
        between: [back, 'D-'],
        ohms: 0.1,
      },
      lamp('earth lamp, plus', 'D+'),
      lamp('earth lamp, minus', 'D-'),
    ],
    strings: [
      { name: 'safety string', from: tag(0), to: tag(11), return: back, supplyReturn: 'D-' },
    ],
  });
}
