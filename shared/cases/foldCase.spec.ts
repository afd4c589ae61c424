import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { FoldedEvent } from './caseState';
import { applyEvent, foldCase } from './foldCase';
import {
  foldedOneByOne,
  sampleArrival,
  sampleEvent,
  sampleId,
  sampleOpening,
  sampleReading,
  sampleRepair,
} from './sampleEvents';

const opened = sampleEvent(1, 'case opened', sampleOpening(), { actor: sampleId(77) });
const later = (n: number): FoldedEvent => ({
  ...sampleEvent(n, 'note written', { text: 'x' }),
  type: 'thermal picture taken',
  payload: { degrees: 61 },
});

/** Any sequence of entries after the opening, withdrawals of any of them among them. */
const anyLog = fc
  .array(
    fc.oneof(
      fc.tuple(fc.constant('read' as const), fc.double({ min: -200, max: 200, noNaN: true })),
      fc.tuple(fc.constant('withdraw' as const), fc.nat({ max: 30 })),
      fc.tuple(fc.constant('prove' as const), fc.constantFrom('stopped', 'did not stop')),
      fc.tuple(fc.constant('repair' as const), fc.constant(0)),
      fc.tuple(fc.constant('later' as const), fc.constant(0)),
      fc.tuple(fc.constant('broken' as const), fc.constant(0)),
      fc.tuple(fc.constant('arrive' as const), fc.nat({ max: 3 })),
    ),
    { maxLength: 30 },
  )
  .map((entries) => [
    opened,
    ...entries.map(([kind, value], k): FoldedEvent => {
      const n = k + 2;
      switch (kind) {
        case 'read':
          return sampleEvent(n, 'reading taken', sampleReading('5', '9', value as number));
        case 'withdraw':
          return sampleEvent(n, 'event withdrawn', { of: sampleId(value as number) });
        case 'prove':
          return sampleEvent(n, 'device proven', {
            device: 'lock 2',
            result: value as 'stopped' | 'did not stop',
            how: 'by hand',
          });
        case 'repair':
          return sampleEvent(n, 'repair done', { what: 'Set', devices: ['lock 2'], parts: [] });
        case 'later':
          return later(n);
        case 'broken':
          return { ...sampleEvent(n, 'note written', { text: 'x' }), payload: { text: 7 } };
        case 'arrive':
          return sampleEvent(n, 'arrival checked', sampleArrival({ linksFound: value as number }));
      }
    }),
  ]);

describe('the fold of a case', () => {
  it('opens with its first event, and with nothing else', () => {
    expect(foldCase([])).toBeUndefined();
    expect(applyEvent(undefined, sampleEvent(1, 'note written', { text: 'x' }))).toBeUndefined();
    expect(foldCase([opened])).toMatchObject({
      status: 'open',
      openedBy: sampleId(77),
      version: 1,
    });
  });

  it('comes out the same from the same events', () => {
    fc.assert(
      fc.property(anyLog, (log) => {
        expect(foldCase(structuredClone(log))).toEqual(foldCase(log));
      }),
    );
  });

  it('comes out the same one by one and all at once', () => {
    fc.assert(
      fc.property(anyLog, (log) => {
        expect(foldedOneByOne(log)).toEqual(foldCase(log));
      }),
    );
  });

  it('comes out the same when it is stopped anywhere and gone on with', () => {
    fc.assert(
      fc.property(anyLog, fc.nat(), (log, at) => {
        const cut = 1 + (at % log.length);
        const resumed = log.slice(cut).reduce(applyEvent, foldCase(log.slice(0, cut)));
        expect(resumed).toEqual(foldCase(log));
      }),
    );
  });

  it('keeps every event, and changes none', () => {
    fc.assert(
      fc.property(anyLog, (log) => {
        const before = JSON.stringify(log);
        const state = foldCase(log)!;
        expect(state.log).toEqual(log);
        expect(state.version).toBe(log.length);
        expect(JSON.stringify(log)).toBe(before);
      }),
    );
  });

  it('keeps and shows types of a later build, and payloads that do not fit', () => {
    const future = { ...sampleEvent(3, 'note written', { text: 'x' }), schema: 2 };
    const broken = { ...sampleEvent(4, 'note written', { text: 'x' }), payload: {} };
    const state = foldCase([opened, later(2), future, broken])!;
    expect(state.unknown.map(({ id }) => id)).toEqual([sampleId(2), sampleId(3), sampleId(4)]);
    expect(state.notes).toEqual([]);
  });

  it('never loses a danger to a withdrawal', () => {
    fc.assert(
      fc.property(anyLog, (log) => {
        const raised = log.filter(({ payload }) => payload['result'] === 'did not stop').length;
        expect(foldCase(log)!.dangers).toHaveLength(raised);
      }),
    );
  });
});

describe('withdrawing', () => {
  const read = sampleEvent(2, 'reading taken', sampleReading('5', '9', 110));
  const undo = sampleEvent(3, 'event withdrawn', { of: read.id });

  it('takes an entry out of the fold and leaves it in the log', () => {
    const state = foldCase([opened, read, undo])!;
    expect(state.seen).toEqual([]);
    expect(state.undoable).toEqual([]);
    expect(state.log).toHaveLength(3);
  });

  it('lets the same be entered again', () => {
    const again = { ...read, id: sampleId(4), sequence: 4 };
    const state = foldCase([opened, read, undo, again])!;
    expect(state.seen.map(({ observation }) => observation.id)).toEqual([again.id]);
    expect(state.undoable).toEqual([again.id]);
  });

  it('brings back what the withdrawn entry had replaced', () => {
    const second = sampleEvent(3, 'arrival checked', sampleArrival({ linksFound: 2 }));
    const log = [opened, sampleEvent(2, 'arrival checked', sampleArrival()), second];
    expect(foldCase(log)!.arrival!.linksFound).toBe(2);
    const undone = sampleEvent(4, 'event withdrawn', { of: second.id });
    expect(foldCase([...log, undone])!.arrival!.linksFound).toBe(0);
  });

  it('leaves the opening and the closing alone', () => {
    const log = sampleRepair();
    const all = [
      ...log,
      sampleEvent(16, 'event withdrawn', { of: sampleId(1) }),
      sampleEvent(17, 'event withdrawn', { of: sampleId(15) }),
    ];
    expect(foldCase(all)!.status).toBe('closed');
  });
});
