import type { Circuit } from '../circuit';
import type { CautionCode } from './advice';
import type { Candidate } from './candidates';

/** Direct volts above this need an authorisation and a meter rated for them (common practice). */
const HIGH_DIRECT_VOLTS = 120;

export interface CautionContext {
  readonly changesState: boolean;
  /** The return has not been shown to be whole. */
  readonly returnDoubtful: boolean;
}

/** What can happen at a reading, most dangerous first. */
export function cautionsOf(
  circuit: Circuit,
  { place, red, black }: Pick<Candidate, 'place' | 'red' | 'black'>,
  { changesState, returnDoubtful }: CautionContext,
): CautionCode[] {
  const codes: CautionCode[] = [];
  const say = (code: CautionCode, when: boolean) => {
    if (when) codes.push(code);
  };
  const shaft = circuit.places.find(({ name }) => name === place)?.shaft ?? false;
  const hazardous = circuit.terminals.some(
    ({ tag, hazard }) => (tag === red || tag === black) && hazard === 'mains',
  );
  say('people and motion', changesState);
  say('pit', shaft && place.includes('pit'));
  say('car top', shaft && place.includes('car top'));
  say('shaft entry', shaft && !place.includes('pit') && !place.includes('car top'));
  say('landing door', place.startsWith('landing'));
  say('mains', hazardous);
  say(
    'high voltage dc',
    circuit.stringCurrent === 'direct' && circuit.nominalVolts > HIGH_DIRECT_VOLTS,
  );
  say('live terminals', true);
  say('may start when cleared', true);
  say('return may be live', returnDoubtful);
  return codes;
}
