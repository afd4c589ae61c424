import { CONTROLLER, type Circuit, type Part, type Terminal } from '../../shared/circuit';

/** One device of a line and the tag that stands behind it. */
export interface LineDevice {
  readonly name: string;
  readonly place: string;
  /** Tag after the device. */
  readonly tag: string;
  readonly label?: string;
  /** Where that tag is reached; default: where the device is. */
  readonly places?: readonly string[];
  readonly weight: number;
  readonly ohms?: number;
  readonly reset?: 'self' | 'manual' | 'maintained';
  readonly inspection?: string;
}

/** Ohms of a clean contact with its wire (judgement, from ordinary relay-logic lifts). */
const CONTACT_OHMS = 0.2;

/** The contacts of a line in the order wired, from a first tag. */
export function lineParts(first: string, devices: readonly LineDevice[]): Part[] {
  return devices.map((device, k) => ({
    kind: 'contact',
    name: device.name,
    device: device.name,
    place: device.place,
    between: [k === 0 ? first : devices[k - 1]!.tag, device.tag],
    ohms: device.ohms ?? CONTACT_OHMS,
    weight: device.weight,
    ...(device.reset ? { reset: device.reset } : {}),
    ...(device.inspection ? { inspection: device.inspection } : {}),
  }));
}

/** The tags behind the devices; a tag is also reached at the next device. */
export function lineTerminals(devices: readonly LineDevice[]): Terminal[] {
  return devices.map((device, k) => {
    const next = devices[k + 1];
    const places = device.places ?? [device.place, ...(next ? [next.place] : [])];
    return {
      tag: device.tag,
      ...(device.label ? { label: device.label } : {}),
      places: [...new Set(places)],
      reachable: true,
      hazard: 'low' as const,
    };
  });
}

export const atController = (
  tag: string,
  label?: string,
  more: readonly string[] = [],
): Terminal => ({
  tag,
  ...(label ? { label } : {}),
  places: [CONTROLLER, ...more],
  reachable: true,
  hazard: 'low',
});

export const landing = (k: number): string => `landing ${k}`;

/**
 * Places and minutes of a building with some landings (judgement: stairs, barriers, stop switches proven,
 * covers off). The machine room is at the top.
 */
export function placesOf(landings: number): Pick<Circuit, 'places' | 'minutes' | 'readingMinutes'> {
  const shaft = (name: string, setUpMinutes: number) => ({ name, setUpMinutes, shaft: true });
  const open = (name: string, setUpMinutes: number) => ({ name, setUpMinutes, shaft: false });
  const numbers = Array.from({ length: landings }, (_, k) => k + 1);
  const minutes: Record<string, Record<string, number>> = {
    [CONTROLLER]: {
      'machine room': 0.3,
      'shaft top': 3,
      'car top': 4,
      'in car': 3,
      [landing(landings)]: 2,
    },
    pit: { [landing(1)]: 1.5 },
    'in car': { 'car top': 2, [landing(Math.ceil(landings / 2))]: 1 },
  };
  for (const k of numbers.slice(1)) minutes[landing(k)] = { [landing(k - 1)]: 0.7 };
  return {
    places: [
      open(CONTROLLER, 0),
      open('machine room', 0),
      shaft('shaft top', 5),
      shaft('pit', 5),
      shaft('car top', 6),
      open('in car', 1),
      ...numbers.map((k) => open(landing(k), 2)),
    ],
    minutes,
    readingMinutes: 0.5,
  };
}
