import { CONTROLLER, circuitSchema, EARTH, type Circuit } from '../../shared/circuit';
import { atController, lineParts, lineTerminals, placesOf } from './seriesLine';
import { doorLine, stopLine } from './usualDevices';

/** The lock relay behind the bridge: 110 V winding, some 99 V DC. */
const RELAY_OHMS = 2800;

/**
 * A transformer of two windings, 230 V to 110 V; its string carries alternating current up to a bridge, and
 * behind the bridge direct current feeds the relay.
 */
export function stringBeforeBridge(landings: number): Circuit {
  const tag = (step: number, inside?: number) =>
    `${String.fromCharCode(65 + step)}${inside === undefined ? '0' : inside}`;
  const naming = { tag, landings };
  const devices = [...stopLine(naming), ...doorLine(naming)];
  const everywhere = placesOf(landings).places.map(({ name }) => name);
  const back = 'Z0';
  return circuitSchema.parse({
    name: `Alternating string before a bridge, ${landings} landings`,
    drawing: 'OT 5 sheet 1',
    nominalVolts: 110,
    stringCurrent: 'alternating',
    ...placesOf(landings),
    conditions: [],
    terminals: [
      { ...atController('M1', 'mains'), hazard: 'mains' },
      { ...atController('M2', 'mains'), hazard: 'mains' },
      atController('W1', 'winding'),
      atController('W2', 'winding'),
      atController(tag(0), 'behind the fuse'),
      atController(back, 'return', everywhere.slice(1)),
      ...lineTerminals(devices),
      atController('V+', 'behind the bridge, plus'),
      atController('V-', 'behind the bridge, minus'),
    ],
    parts: [
      {
        kind: 'supply',
        name: 'mains',
        place: CONTROLLER,
        weight: 1,
        between: ['M1', 'M2'],
        current: 'alternating',
        volts: 230,
        hertz: 50,
        ohms: 0.5,
      },
      {
        kind: 'transformer',
        name: 'control transformer',
        device: 'control transformer',
        place: CONTROLLER,
        weight: 2,
        primary: ['M1', 'M2'],
        secondary: ['W1', 'W2'],
        ratio: 110 / 230,
        ohms: 1.5,
      },
      {
        kind: 'fuse',
        name: 'control fuse',
        device: 'control fuse',
        place: CONTROLLER,
        weight: 6,
        between: ['W1', tag(0)],
        ohms: 0.1,
        inspection:
          'Dead: continuity and rating against the drawing. Never uprate; find the cause.',
      },
      ...lineParts(tag(0), devices),
      {
        kind: 'bridge',
        name: 'rectifier',
        device: 'rectifier',
        place: CONTROLLER,
        weight: 3,
        between: [tag(11), back, 'V+', 'V-'],
        inspection: 'Smell, plates, heat; ripple against mean.',
      },
      {
        kind: 'coil',
        name: 'lock relay',
        device: 'lock relay',
        place: CONTROLLER,
        weight: 1.5,
        between: ['V+', 'V-'],
        ohms: RELAY_OHMS,
        current: 'direct',
        ratedVolts: 100,
        pullInMilliamps: 22,
        dropOutMilliamps: 9,
        delaySeconds: 0.03,
      },
      {
        kind: 'conductor',
        name: 'return wire',
        device: 'return wire',
        place: CONTROLLER,
        weight: 2,
        between: [back, 'W2'],
        ohms: 0.1,
      },
      {
        kind: 'link',
        name: 'earth link',
        place: CONTROLLER,
        weight: 0,
        between: ['W2', EARTH],
        ohms: 0.05,
      },
    ],
    strings: [
      { name: 'safety string', from: tag(0), to: tag(11), return: back, supplyReturn: 'W2' },
    ],
  });
}
