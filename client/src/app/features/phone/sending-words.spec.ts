import type { SendFailure } from '../../core/device/outbox-policy';
import { sendingWords } from './sending-words';
import { unsentFile } from './unsent-file';

describe('why something is not sent', () => {
  it('has words of its own for every reason', () => {
    const reasons: readonly SendFailure[] = [
      { kind: 'unreachable' },
      { kind: 'signed out' },
      { kind: 'too large' },
      { kind: 'broken', message: 'x' },
      { kind: 'answered', status: 429 },
      { kind: 'answered', status: 503 },
      { kind: 'answered', status: 403 },
    ];
    const words = reasons.map((why) => sendingWords({ kind: 'waiting', why }, true));
    expect(new Set(words).size).toBe(reasons.length);
  });

  it('tells apart whether there is signal', () => {
    expect(sendingWords({ kind: 'idle' }, false)).not.toBe(sendingWords({ kind: 'idle' }, true));
  });
});

describe('the file of what is not sent', () => {
  it('says whose it is and when it was saved, and holds the events as they are', () => {
    expect(unsentFile('Mara Lindqvist', [], Date.parse('2026-11-12T09:00:00Z'))).toEqual({
      format: 'lampline-unsent',
      version: 1,
      savedAt: '2026-11-12T09:00:00.000Z',
      person: 'Mara Lindqvist',
      events: [],
    });
  });
});
