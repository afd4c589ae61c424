import { eventTypes } from '@shared/cases';
import { eventWords } from './event-words';
import { noteEvent } from './in-memory-phone';

const event = (type: string, payload: Record<string, unknown>) => ({
  ...noteEvent('id', 'case'),
  sequence: 1,
  type,
  payload,
});

describe('an event in words', () => {
  it('says what was written', () => {
    expect(eventWords(event('note written', { text: 'Keeper moved 4 mm' })).says).toBe(
      'Keeper moved 4 mm',
    );
    expect(eventWords(event('case closed', { outcome: 'repaired' })).says).toBe('repaired');
  });

  it('has a name for every type', () => {
    for (const type of eventTypes) expect(eventWords(event(type, {})).what).toMatch(/^[A-Z]/);
  });

  it('names an event of a later build by its type', () => {
    expect(eventWords(event('hum heard', {}))).toEqual({ what: 'hum heard', says: '' });
  });
});
