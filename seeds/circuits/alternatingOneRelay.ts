import { CONTROLLER, circuitSchema, EARTH, type Circuit } from '../../shared/circuit';
import { atController, lineParts, lineTerminals, placesOf } from './seriesLine';
import { doorLine, stopLine } from './usualDevices';

/**
 * 110 V AC, one pole earthed and used as the return; one string, one relay at its end. The travelling
 * cable couples a little of the supply into its cores.
 */
export function alternatingOneRelay(landings: number): Circuit {
  const tag = (step: number, inside?: number) =>
    `k${step + 1}${inside === undefined ? '' : `.${inside}`}`;
  const naming = { tag, landings };
  const devices = [...stopLine(naming), ...doorLine(naming)];
  const everywhere = placesOf(landings).places.map(({ name }) => name);
  const back = 'kn';
  return circuitSchema.parse({
    name: `Alternating string, one relay, ${landings} landings`,
    drawing: 'BW 33 sheet 2',
    nominalVolts: 110,
    stringCurrent: 'alternating',
    ...placesOf(landings),
    conditions: [],
    terminals: [
      atController('s1', 'winding'),
      atController('s2', 'winding, earthed'),
      atController(tag(0), 'behind the fuse'),
      atController(back, 'return', everywhere.slice(1)),
      ...lineTerminals(devices),
    ],
    parts: [
      {
        kind: 'supply',
        name: 'control winding',
        place: CONTROLLER,
        weight: 2,
        between: ['s1', 's2'],
        current: 'alternating',
        volts: 110,
        hertz: 50,
        ohms: 1.5,
      },
      {
        kind: 'fuse',
        name: 'control fuse',
        device: 'control fuse',
        place: CONTROLLER,
        weight: 6,
        between: ['s1', tag(0)],
        ohms: 0.1,
        inspection:
          'Dead: continuity and rating against the drawing. Never uprate; find the cause.',
      },
      ...lineParts(tag(0), devices),
      {
        kind: 'coil',
        name: 'lock relay',
        device: 'lock relay',
        place: CONTROLLER,
        weight: 1.5,
        between: [tag(11), back],
        ohms: 3300,
        current: 'alternating',
        ratedVolts: 110,
        pullInMilliamps: 21.8,
        dropOutMilliamps: 9.1,
        delaySeconds: 0.03,
      },
      {
        kind: 'conductor',
        name: 'return wire',
        device: 'return wire',
        place: CONTROLLER,
        weight: 2,
        between: [back, 's2'],
        ohms: 0.1,
      },
      {
        kind: 'link',
        name: 'earth link',
        place: CONTROLLER,
        weight: 0,
        between: ['s2', EARTH],
        ohms: 0.05,
      },
      {
        kind: 'capacitor',
        name: 'core to core',
        place: 'car top',
        weight: 0,
        between: ['s1', tag(7)],
        farads: 4e-9,
      },
      {
        kind: 'capacitor',
        name: 'core to earth',
        place: 'car top',
        weight: 0,
        between: [tag(7), 's2'],
        farads: 5e-9,
      },
    ],
    strings: [
      { name: 'safety string', from: tag(0), to: tag(11), return: back, supplyReturn: 's2' },
    ],
  });
}
