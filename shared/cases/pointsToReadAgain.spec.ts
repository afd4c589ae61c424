import { describe, expect, it } from 'vitest';
import { foldCase } from './foldCase';
import { observationsForEngine } from './observationsForEngine';
import { pointKey, pointsToReadAgain, readAgain } from './pointsToReadAgain';
import {
  sampleEvent,
  sampleFinding,
  sampleId,
  sampleOpening,
  sampleReading,
  sampleRepair,
} from './sampleEvents';

type Read = readonly [red: string, black: string, volts: number];
const opened = sampleEvent(1, 'case opened', sampleOpening());
const log = (...reads: readonly Read[]) => [
  opened,
  ...reads.map((read, k) => sampleEvent(k + 2, 'reading taken', sampleReading(...read))),
];
const points = (events: ReturnType<typeof log>) =>
  pointsToReadAgain(foldCase(events)!).map(pointKey);

describe('the points to read again', () => {
  it('are the supply proof, what read dead, and the part itself', () => {
    expect(points(sampleRepair().slice(0, 8))).toEqual(['5 9', '7 9', '6 7']);
  });

  it('are not where 0 V is healthy: across a closed contact', () => {
    expect(points(log(['5', '9', 110], ['5', '6', 0], ['6', '9', 110]))).toEqual(['5 9']);
  });

  it('are those that read low too', () => {
    expect(points(log(['5', '9', 110], ['7', '9', 58]))).toEqual(['5 9', '7 9']);
  });

  it('are not judged by the mains that was read in between', () => {
    expect(points(log(['5', '9', 110], ['M1', 'M2', 230], ['6', '9', 109]))).toEqual(['5 9']);
  });

  it('are proven by the other pole where the return is open', () => {
    expect(points(log(['5', '9', 0], ['5', '8', 110], ['9', '8', 110]))).toEqual(['5 9', '9 8']);
  });

  it('count once, whichever way the probes were put', () => {
    expect(points(log(['5', '9', 110], ['7', '9', 0], ['9', '7', 0]))).toEqual(['5 9', '7 9']);
  });

  it('leave out what could not be reached', () => {
    const hidden = sampleEvent(9, 'could not reach', { what: '7' });
    expect(points([...log(['5', '9', 110], ['7', '9', 0]), hidden])).toEqual(['5 9']);
  });

  it('count as read only after the last repair, with the same function and lift state', () => {
    const repair = sampleEvent(20, 'repair done', { what: 'x', devices: ['lock 2'], parts: [] });
    const finding = sampleEvent(19, 'finding stated', sampleFinding(sampleId(2)));
    const before = [...log(['5', '9', 110]), finding, repair];
    const point = pointsToReadAgain(foldCase(before)!)[0]!;
    const done = (...more: ReturnType<typeof log>) =>
      readAgain(foldCase([...before, ...more])!, point);
    const again = sampleEvent(21, 'reading taken', sampleReading('9', '5', -110));
    expect(done()).toBe(false);
    expect(done(again)).toBe(true);
    expect(done({ ...again, state: { call: 'yes' } })).toBe(false);
    expect(done({ ...again, payload: { ...again.payload, function: 'ac volts' } })).toBe(false);
    expect(done(again, { ...repair, id: sampleId(22) })).toBe(false);
  });
});

describe('what the engine is given', () => {
  it('is what was seen before the repair, or after it', () => {
    const state = foldCase(sampleRepair())!;
    const ids = (stage: 'finding' | 'after repair') =>
      observationsForEngine(state, stage).map(({ id }) => id);
    expect(ids('finding')).toEqual([3, 4, 5, 6, 7].map(sampleId));
    expect(ids('after repair')).toEqual([10, 11, 12].map(sampleId));
    expect(observationsForEngine(state)[0]).toMatchObject({
      kind: 'reading',
      red: '5',
      volts: 110.2,
    });
  });
});
