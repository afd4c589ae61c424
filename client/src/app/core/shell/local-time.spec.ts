import { localTime } from './local-time';

const now = Date.parse('2026-11-12T20:00:00Z');

describe('a time on the screen', () => {
  it('is hours and minutes in the zone of the organisation', () => {
    expect(localTime('2026-11-12T14:32:00Z', now, 'Europe/Athens', 'en')).toBe('16:32');
  });

  it('has the day before it when it is not today there', () => {
    expect(localTime('2026-11-11T14:32:00Z', now, 'Europe/Dublin', 'en')).toBe(
      '11 Nov 2026, 14:32',
    );
    // Already tomorrow in this zone.
    expect(localTime('2026-11-12T14:32:00Z', now, 'Pacific/Auckland', 'en')).toBe('03:32');
    expect(localTime('2026-11-12T10:30:00Z', now, 'Pacific/Auckland', 'en')).toBe(
      '12 Nov 2026, 23:30',
    );
  });
});
