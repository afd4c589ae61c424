import { stringCircuit } from '@shared/circuit';
import { USUAL_METER, createEngine, type Observation } from '@shared/diagnosis';
import { lampLine, levelOf } from './line-model';

const circuit = stringCircuit(
  '110 V DC earthed: T0 (pit stop@pit) T1 (car stop@car) T2 [SR 3300 ohm] (lock 1@landing_1) L1@landing_1 (lock 2@landing_1) T3 [LR 3300 ohm]',
);
const readingOf = (
  id: string,
  red: string,
  black: string,
  volts: number,
  state: Record<string, string> = {},
): Observation => ({
  kind: 'reading',
  id,
  red,
  black,
  function: 'dc volts',
  volts,
  meter: USUAL_METER,
  state,
  place: 'controller',
});
const adviceOn = (observations: readonly Observation[]) =>
  createEngine(circuit).advise({
    observations,
    place: 'controller',
    state: {},
    unreachable: ['SR', 'LR'],
    declined: [],
    meter: USUAL_METER,
  });

describe('lampLine', () => {
  it('runs from the supply over the shaft to the return, in the order wired', () => {
    const { lamps, sections } = lampLine({ circuit, observations: [], state: {} });
    expect(lamps.map(({ tag }) => tag)).toEqual(['T0', 'T1', 'T2', 'L1', 'T3', 'R']);
    expect(lamps.filter(({ away }) => away).map(({ tag }) => tag)).toEqual(['L1']);
    expect(sections).toHaveLength(5);
  });

  it('lights what reads full to the return, whichever probe is where', () => {
    const observations = [readingOf('a', 'T0', 'R', 109.8), readingOf('b', 'R', 'T2', -109.5)];
    const { lamps, sections } = lampLine({ circuit, observations, state: {} });
    expect(lamps.map(({ level }) => level)).toEqual([
      ...['live', 'unread', 'live', 'unread', 'unread', 'unread'],
    ]);
    expect(lamps[2]!.value).toBe('109.5');
    expect(sections.slice(0, 3).map(({ state }) => state)).toEqual(['live', 'live', 'unknown']);
  });

  it('leaves readings across a part to the card: they say nothing of a lamp', () => {
    const observations = [readingOf('a', 'L1', 'T3', 109.6)];
    const { lamps } = lampLine({ circuit, observations, state: {} });
    expect(lamps.every(({ level }) => level === 'unread')).toBe(true);
  });

  it('hatches what was read in another lift state, and lights nothing by it', () => {
    const observations = [readingOf('a', 'T2', 'R', 109.8, { call: 'registered' })];
    const { lamps, sections } = lampLine({ circuit, observations, state: { call: 'none' } });
    expect(lamps[2]).toMatchObject({ level: 'live', stale: true });
    expect(sections[0]!.state).toBe('unknown');
  });

  it('shows the latest reading of a tag', () => {
    const observations = [readingOf('a', 'T2', 'R', 109.8), readingOf('b', 'T2', 'R', 0)];
    const { lamps } = lampLine({ circuit, observations, state: {} });
    expect(lamps[2]).toMatchObject({ level: 'none', value: '0.0' });
  });

  it('rings the next tag and widens suspected sections with the belief', () => {
    const advice = adviceOn([
      readingOf('a', 'T0', 'R', 109.9),
      readingOf('b', 'T0', 'N', 109.9),
      readingOf('c', 'T2', 'R', 109.9),
    ]);
    const { lamps, sections } = lampLine({ circuit, observations: [], state: {}, advice });
    expect(lamps.filter(({ next }) => next)).not.toEqual([]);
    const suspected = sections.filter(({ state }) => state === 'suspected');
    expect(suspected.length).toBeGreaterThan(0);
    expect(suspected.every(({ share }) => share > 0 && share <= 1)).toBe(true);
  });

  it('draws every lamp as proven dead after prove, test, prove again', () => {
    const observations = [readingOf('a', 'T0', 'R', 109.8)];
    const { lamps } = lampLine({ circuit, observations, state: {}, provenDead: true });
    expect(lamps.every(({ level, value }) => level === 'proven dead' && value === '')).toBe(true);
  });
});

describe('levelOf', () => {
  it.each([
    [109, 'live'],
    [-109, 'live'],
    [95, 'live'],
    [90, 'between'],
    [12, 'between'],
    [10, 'none'],
    [0, 'none'],
  ])('%d V of 110 is %s', (volts, level) => {
    expect(levelOf(volts, 110)).toBe(level);
  });
});
