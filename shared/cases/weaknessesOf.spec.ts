import { describe, expect, it } from 'vitest';
import type { FoldedEvent } from './caseState';
import { foldCase } from './foldCase';
import {
  sampleArrival,
  sampleEvent,
  sampleFinding,
  sampleId,
  sampleReading,
  sampleRepair,
} from './sampleEvents';
import { riskOf, weaknessesOf } from './weaknessesOf';

const sound = sampleRepair();
const weak = (events: readonly FoldedEvent[]) =>
  weaknessesOf(foldCase(events)!).map(({ code, weight }) => `${weight} ${code}`);
/** The sound case with events replaced by number, or left out. */
const changing = (changed: Readonly<Record<number, FoldedEvent | undefined>>) =>
  sound.flatMap((event, k) => {
    const n = k + 1;
    if (!(n in changed)) return [event];
    return changed[n] ? [changed[n]] : [];
  });
const arrival = (changed: Parameters<typeof sampleArrival>[0]) =>
  changing({ 2: sampleEvent(2, 'arrival checked', sampleArrival(changed)) });
const finding = (changed: Parameters<typeof sampleFinding>[1]) =>
  changing({ 8: sampleEvent(8, 'finding stated', sampleFinding(sampleId(7), changed)) });
const service = (runs: number, coversOn = true) =>
  changing({ 14: sampleEvent(14, 'returned to service', { runs, coversOn }) });

describe('weaknesses of the evidence', () => {
  it('are none in a sound case', () => {
    expect(weak(sound)).toEqual([]);
    expect(riskOf(foldCase(sound)!)).toBe(0);
  });

  it.each([
    ['grave no-arrival', changing({ 2: undefined })],
    ['grave people-not-safe', arrival({ peopleSafe: false })],
    ['note notices-not-up', arrival({ noticesUp: false })],
    ['note meter-not-proven', arrival({ meterProven: false })],
    ['note links-miscounted', arrival({ linksFound: 1 })],
    ['grave not-measured', finding({ proof: { kind: 'not possible', why: 'potted' } })],
    ['grave seen-not-measured', finding({ proof: { kind: 'seen', what: 'broken wire' } })],
    ['note rests-on-one-reading', finding({ restsOnOneReading: true })],
    ['note cause-not-said', finding({ cause: 'lock 2' })],
    ['grave not-read-again', changing({ 11: undefined })],
    ['grave no-runs', service(0)],
    ['note few-runs', service(1)],
    ['note covers-off', service(6, false)],
    [
      'note reset-only',
      changing({
        9: sampleEvent(9, 'repair done', { what: 'Reset, OK', devices: ['lock 2'], parts: [] }),
      }),
    ],
    [
      'grave device-not-provable',
      changing({
        13: sampleEvent(13, 'device proven', {
          device: 'lock 2',
          result: 'not possible',
          how: 'No access',
        }),
      }),
    ],
    ['note few-readings', changing({ 4: undefined, 5: undefined, 6: undefined })],
    [
      'grave no-readings',
      changing({ 3: undefined, 4: undefined, 5: undefined, 6: undefined, 7: undefined }),
    ],
    [
      'grave supply-not-proven',
      changing({
        3: sampleEvent(3, 'reading taken', sampleReading('7', '9', 0)),
        4: sampleEvent(4, 'reading taken', sampleReading('8', '9', 0)),
      }),
    ],
    [
      'note round-numbers',
      changing({
        3: sampleEvent(3, 'reading taken', sampleReading('5', '9', 110)),
        4: sampleEvent(4, 'reading taken', sampleReading('6', '9', 100)),
        6: sampleEvent(6, 'reading taken', sampleReading('7', '9', 10)),
        7: sampleEvent(7, 'reading taken', sampleReading('6', '7', 90)),
      }),
    ],
    ['note hasty', sound.map((event) => ({ ...event, recordedAt: sound[0]!.recordedAt }))],
    [
      'note clock-set-back',
      changing({ 12: { ...sound[11]!, recordedAt: '2026-11-01T08:00:00.000Z' } }),
    ],
  ] as const)('name: %s', (expected, events) => {
    expect(weak(events)).toContain(expected);
  });

  it('name links that were fitted, and those that were found', () => {
    const link = (found: boolean) =>
      sampleEvent(20, 'link fitted', {
        link: sampleId(500),
        mark: '4',
        from: '5',
        to: '6',
        reason: 'x',
        found,
      });
    expect(weak([...sound, link(false)])).toEqual(['note link-used']);
    expect(weak([...sound, link(true)])).toContain('grave link-found');
  });

  it('do not take what was done after a reset for a reset alone', () => {
    const what = 'Rope, sheave and gear looked at and found sound; reset once; seal left as it was';
    const events = changing({
      9: sampleEvent(9, 'repair done', { what, devices: ['lock 2'], parts: [] }),
    });
    expect(weak(events)).toEqual([]);
  });

  it('put dangers first, and practice last in the queue', () => {
    const did = sampleEvent(13, 'device proven', {
      device: 'lock 2',
      result: 'did not stop',
      how: 'Relay stayed in',
    });
    const dangerous = changing({
      13: did,
      14: sampleEvent(14, 'returned to service', { runs: 1, coversOn: true }),
    });
    expect(weak(dangerous)).toEqual(['grave danger', 'grave device-did-not-stop', 'note few-runs']);
    const practice = dangerous.map((event, k) =>
      k === 0 ? { ...event, payload: { ...event.payload, practice: true } } : event,
    );
    const risks = [dangerous, practice, service(0), service(1)].map((log) =>
      riskOf(foldCase(log)!),
    );
    expect(risks).toEqual([...risks].sort((a, b) => b - a));
    expect(new Set(risks).size).toBe(risks.length);
  });
});
