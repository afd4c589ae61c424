import type { Circuit } from './circuit';
import {
  buildStringCircuit,
  type SpecPart,
  type StringSpec,
  type StringStop,
} from './stringCircuit';

/**
 * A circuit in one line:
 *
 *     110 V DC earthed: T0 (pit stop@pit) T1 ~core 0.5 ohm~ T2@pit,car [SR 3300 ohm] (hold when SR=in) T3
 *
 * Head: volts, `DC`, `AC` or `bridge` (an alternating supply rectified), then `earthed` if it is.
 * Then tags in the order wired, each with its places after `@`, and between them a contact in round
 * brackets or a core in waves; a coil from its tag to the return in square brackets.
 * Ohms and places may be left out. `when SR=in` closes a contact with a relay, `when call=yes` with a
 * condition of the values no and yes. Throws SyntaxError: the line is written by us, not by users.
 */
export function stringCircuit(line: string): Circuit {
  const split = line.indexOf(':');
  const head = /^\s*([\d.]+) V (DC|AC|bridge)( earthed)?\s*$/.exec(line.slice(0, split));
  if (split < 0 || !head) throw new SyntaxError(`no supply in: ${line}`);
  const currents = { DC: 'direct', AC: 'alternating', bridge: 'rectified' } as const;
  const spec: StringSpec = {
    name: line.trim().slice(0, 80),
    volts: Number(head[1]),
    current: currents[head[2] as keyof typeof currents],
    earthed: head[3] !== undefined,
    stops: stopsOf(line.slice(split + 1)),
  };
  return buildStringCircuit(spec);
}

interface OpenStop {
  tag: string;
  places?: string[];
  coils: { name: string; ohms?: number }[];
  next?: SpecPart;
}

function stopsOf(body: string): StringStop[] {
  const stops: OpenStop[] = [];
  for (const [token] of body.matchAll(/\[[^\]]*\]|\([^)]*\)|~[^~]*~|\S+/g)) {
    const inner = token.slice(1, -1);
    if (token.startsWith('[')) lastOf(stops, token).coils.push(named(inner));
    else if (token.startsWith('('))
      lastOf(stops, token).next = { kind: 'contact', ...named(inner) };
    else if (token.startsWith('~')) lastOf(stops, token).next = { kind: 'core', ...named(inner) };
    else {
      const [tag, places] = token.split('@');
      stops.push({ tag: tag!, places: places?.replaceAll('_', ' ').split(','), coils: [] });
    }
  }
  if (stops.length < 2) throw new SyntaxError(`fewer than two tags in: ${body}`);
  return stops;
}

function lastOf(stops: OpenStop[], token: string): OpenStop {
  const last = stops.at(-1);
  if (!last) throw new SyntaxError(`a part before the first tag: ${token}`);
  return last;
}

/** `name@place 0.2 ohm when SR=in`, all but the name as wanted. */
function named(text: string): Pick<SpecPart, 'name' | 'place' | 'ohms' | 'when'> {
  const match = /^(.+?)(?:@(.+?))?(?: ([\d.]+) ohm)?(?: when (.+?)=(\S+))?$/.exec(text.trim());
  if (!match) throw new SyntaxError(`not a part: ${text}`);
  const [, name, place, ohms, subject, value] = match;
  return {
    name: name!,
    place,
    ohms: ohms === undefined ? undefined : Number(ohms),
    when: subject === undefined ? undefined : whenOf(subject, value!),
  };
}

function whenOf(name: string, value: string): SpecPart['when'] {
  return value === 'in' || value === 'out'
    ? { relay: { name, closedWhen: value } }
    : { condition: { name, closedWhen: [value] } };
}
