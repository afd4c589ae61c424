import { USUAL_METER, createEngine } from '@shared/diagnosis';
import { reading, specCase, specCircuit, eventId, type SpecEvent } from '../case-for-specs';
import { cautionsDue, chosenProbes, probesShown, readingToRepeat, statesToSet } from './find-model';

const here = { place: 'controller', state: {} };

describe('probesShown', () => {
  it('takes what was touched on the line over what is asked', () => {
    const chosen = { red: 'T1', black: 'R' };
    expect(probesShown(undefined, chosen, here)).toEqual({ ...chosen, ...here, asked: false });
  });

  it('keeps what is asked when its probes are swapped', () => {
    const advice = createEngine(specCircuit).advise({
      ...{ observations: [], place: 'controller', state: {}, declined: [], meter: USUAL_METER },
      unreachable: ['SR', 'LR'],
    });
    const asked = probesShown(advice, undefined, here)!;
    const swapped = probesShown(advice, { red: asked.black, black: asked.red }, here);
    expect(asked.asked).toBe(true);
    expect(swapped).toEqual({ ...asked, red: asked.black, black: asked.red });
  });

  it('shows no probes before the first advice', () => {
    expect(probesShown(undefined, undefined, here)).toBeUndefined();
  });
});

describe('chosenProbes', () => {
  it('rests black on the return', () => {
    expect(chosenProbes(specCircuit, 'T2')).toEqual({ red: 'T2', black: 'R' });
  });

  it('reads the return against the other pole', () => {
    expect(chosenProbes(specCircuit, 'R')).toEqual({ red: 'R', black: 'N' });
  });
});

describe('cautionsDue', () => {
  const acknowledged = specCase({
    type: 'caution acknowledged',
    payload: { codes: ['live terminals'], place: 'controller' },
  });

  it('asks once per place and visit', () => {
    const codes = ['live terminals', 'may start when cleared'] as const;
    expect(cautionsDue(acknowledged, codes, 'controller')).toEqual(['may start when cleared']);
    expect(cautionsDue(acknowledged, codes, 'pit')).toEqual(codes);
  });
});

describe('statesToSet', () => {
  it('names what differs from the lift as it is', () => {
    const now = { call: 'none', gate: 'shut' };
    expect(statesToSet({ call: 'registered', gate: 'shut' }, now)).toEqual(['call: registered']);
    expect(statesToSet(now, now)).toEqual([]);
  });
});

describe('readingToRepeat', () => {
  const raised: SpecEvent = {
    type: 'danger raised',
    payload: {
      danger: { code: 'volts beyond open device', part: 'gate', observations: [eventId(1)] },
    },
  };
  const isolated: SpecEvent = {
    type: 'isolated',
    payload: { provenDead: true, noticeFitted: true, left: [] },
  };

  it('waits for isolation', () => {
    expect(readingToRepeat(specCase(reading('T3', 'R', 109), raised))).toBeUndefined();
  });

  it('offers the reading that raised it, once', () => {
    const state = specCase(reading('T3', 'R', 109), raised, isolated);
    expect(readingToRepeat(state)).toEqual({ red: 'T3', black: 'R' });
    const repeated = specCase(reading('T3', 'R', 109), raised, isolated, reading('T3', 'R', 109));
    expect(readingToRepeat(repeated)).toBeUndefined();
  });
});
