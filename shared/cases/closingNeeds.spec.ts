import { describe, expect, it } from 'vitest';
import type { CaseState, FoldedEvent } from './caseState';
import { closingNeeds, devicesToProve } from './closingNeeds';
import { foldCase } from './foldCase';
import { outcomes } from './payloads';
import {
  sampleArrival,
  sampleEvent,
  sampleFinding,
  sampleId,
  sampleOpening,
  sampleRepair,
} from './sampleEvents';

const opened = sampleEvent(1, 'case opened', sampleOpening());
const arrived = sampleEvent(2, 'arrival checked', sampleArrival());
const ready = sampleRepair().slice(0, 14);
const state = (events: readonly FoldedEvent[]): CaseState => foldCase(events)!;
const needs = (events: readonly FoldedEvent[], outcome: (typeof outcomes)[number] = 'repaired') =>
  closingNeeds(state(events), outcome).map(({ code, what }) => [code, ...what]);

const link = (found: boolean) =>
  sampleEvent(20, 'link fitted', {
    link: sampleId(500),
    mark: '4',
    from: '5',
    to: '6',
    reason: 'x',
    found,
  });
const danger = sampleEvent(21, 'danger raised', {
  danger: { code: 'second earth', observations: [] },
});
const lifted = sampleEvent(22, 'thing disturbed', {
  thing: sampleId(600),
  kind: 'lifted lead',
  what: 'lead of 6',
});
const inPit = sampleEvent(23, 'person entered', { entry: sampleId(7), who: 'J.', place: 'pit' });

describe('closing', () => {
  it('needs nothing more after a whole repair', () => {
    expect(needs(ready)).toEqual([]);
  });

  it('needs the arrival checks, but where there was no access', () => {
    for (const outcome of outcomes) {
      const codes = needs([opened], outcome).map(([code]) => code);
      expect(codes.includes('arrival missing'), outcome).toBe(outcome !== 'no access');
    }
  });

  it.each(outcomes)('as %s needs links out and people out', (outcome) => {
    const log = [...ready, link(false), inPit];
    expect(needs(log, outcome)).toContainEqual(['links out', '4']);
    expect(needs(log, outcome)).toContainEqual(['people in the shaft', 'J.']);
    const out = [
      sampleEvent(30, 'link removed', { link: sampleId(500) }),
      sampleEvent(31, 'person left', { entry: sampleId(7) }),
    ];
    const codes = needs([...log, ...out], outcome).map(([code]) => code);
    expect(codes).not.toContain('links out');
    expect(codes).not.toContain('people in the shaft');
  });

  it('needs every link that was counted on arrival in the register', () => {
    const two = sampleEvent(2, 'arrival checked', sampleArrival({ linksFound: 1 }));
    const out = sampleEvent(24, 'link removed', { link: sampleId(500) });
    expect(needs([opened, two], 'no access')).toEqual([['found links not entered']]);
    expect(needs([opened, two, link(false), out], 'no access')).toEqual([
      ['found links not entered'],
    ]);
    expect(needs([opened, two, link(true), out], 'no access')).toEqual([]);
  });

  it.each(outcomes.filter((outcome) => outcome !== 'left isolated'))(
    'as %s needs things put back and dangers released',
    (outcome) => {
      const found = needs([...ready, danger, lifted], outcome);
      expect(found).toContainEqual(['things disturbed', 'lead of 6']);
      expect(found).toContainEqual(['danger unreleased', 'second earth']);
    },
  );

  it('as left isolated needs proof, notice, someone told, and what is left named', () => {
    const log = [opened, arrived, danger, lifted];
    expect(needs(log, 'left isolated')).toEqual([
      ['isolation not proven'],
      ['nothing named as left'],
    ]);
    const isolated = sampleEvent(25, 'isolated', {
      provenDead: true,
      noticeFitted: true,
      told: 'supervisor',
      left: ['lead of 6', 'second earth'],
    });
    expect(needs([...log, isolated], 'left isolated')).toEqual([]);
    const untold = { ...isolated, payload: { ...isolated.payload, told: undefined } };
    expect(needs([...log, untold], 'left isolated')).toEqual([['isolation not proven']]);
  });

  it('as repaired needs the lift re-energised', () => {
    const isolated = sampleEvent(25, 'isolated', {
      provenDead: true,
      noticeFitted: true,
      told: 'supervisor',
      left: [],
    });
    expect(needs([...ready, isolated])).toEqual([['still isolated']]);
    expect(needs([...ready, isolated, sampleEvent(26, 're-energised', {})])).toEqual([]);
  });

  it('as repaired needs a finding, a repair, proving and runs', () => {
    expect(needs([opened, arrived])).toEqual([
      ['finding missing'],
      ['repair missing'],
      ['not returned to service'],
    ]);
    expect(needs(ready.slice(0, 9))).toEqual([
      ['points not read again', '5 9', '7 9', '6 7'],
      ['devices not proven', 'lock 2'],
      ['not returned to service'],
    ]);
  });

  it('needs everything after a repair again after a further one', () => {
    const again = sampleEvent(30, 'repair done', { what: 'Spring', devices: ['gate'], parts: [] });
    expect(needs([...ready, again])).toEqual([
      ['points not read again', '5 9', '7 9', '6 7'],
      ['devices not proven', 'lock 2', 'gate'],
      ['not returned to service'],
    ]);
    expect(devicesToProve(state([...ready, again]))).toEqual(['lock 2', 'gate']);
  });

  it('does not ask for what can not be: a proof that is impossible says why', () => {
    const why = sampleEvent(
      8,
      'finding stated',
      sampleFinding('', { proof: { kind: 'not possible', why: 'Potted' } }),
    );
    const codes = needs([...ready.slice(0, 7), why]).map(([code]) => code);
    expect(codes).not.toContain('proof missing');
  });

  it('finds a danger where a device did not stop the lift', () => {
    const did = sampleEvent(30, 'device proven', {
      device: 'lock 2',
      result: 'did not stop',
      how: 'by hand',
    });
    const then = { ...did, id: sampleId(31), payload: { ...did.payload, result: 'stopped' } };
    expect(needs([...ready, did])).toEqual([['danger unreleased', 'lock 2']]);
    expect(needs([...ready, did, then])).toEqual([['danger unreleased', 'lock 2']]);
  });
});
