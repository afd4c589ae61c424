import { found, repaired, specCase } from '../case-for-specs';
import { logbookText } from './logbook-text';

describe('logbookText', () => {
  it('says what was found, done, proven and left, in the organisation’s time', () => {
    const state = specCase(
      found,
      repaired,
      { type: 'device proven', payload: { device: 'gate', result: 'stopped', how: 'by hand' } },
      { type: 'returned to service', payload: { runs: 4, coversOn: true } },
    );
    const text = logbookText(state, 'Tannery Court, lift 2', 'Europe/Berlin');
    expect(text).toContain('15 Jan 2026, 10:00');
    expect(text).toContain('gate: open. Cause: Finger worn to nothing');
    expect(text).toContain('1 × contact finger (F-12)');
    expect(text).toContain('Proven to stop the lift: gate');
    expect(text).toContain('Temporary links out: 0');
    expect(text).toContain('Runs: 4');
  });

  it('says of an isolated lift who was told and what is left', () => {
    const state = specCase({
      type: 'isolated',
      payload: { provenDead: true, noticeFitted: false, told: 'supervisor', left: ['gate apart'] },
    });
    const text = logbookText(state, 'Tannery Court, lift 2', 'UTC');
    expect(text).toContain('notice not fitted');
    expect(text).toContain('supervisor');
    expect(text).toContain('Left: gate apart');
    expect(text).not.toContain('Returned to service');
  });
});
