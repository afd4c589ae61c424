import { describe, expect, it } from 'vitest';
import { cautionCodes } from '../../diagnosis';
import {
  cautionSentences,
  dangerSentence,
  faultSentence,
  reasonSentence,
  refusalSentence,
} from './engineWords';
import { sentenceOf } from './sentenceOf';

const reason = { tags: [], parts: [], numbers: {}, observations: [] };

describe('the words of the engine', () => {
  it('name the tags, parts and numbers of a reason', () => {
    const tags = { ...reason, code: 'dead before', tags: ['7', '8'], parts: ['lock 2'] };
    expect(reasonSentence(tags)).toContain('7, 8');
    expect(reasonSentence(tags)).toContain('lock 2');
    const halves = { ...reason, code: 'halves what is left', numbers: { left: 52, right: 48 } };
    expect(reasonSentence(halves)).toContain('52');
  });

  it('show a reason of a later engine by its code', () => {
    expect(reasonSentence({ ...reason, code: 'of tomorrow' })).toBe('reason.of tomorrow');
  });

  it('say of each caution what can happen, and then what to do', () => {
    for (const code of cautionCodes) {
      const { can, do: act } = cautionSentences(code);
      expect(can).not.toBe(act);
      expect([can, act].join()).not.toContain('caution.');
    }
  });

  it('name the part of a danger and of a fault', () => {
    expect(dangerSentence({ code: 'device does not open string', part: 'gate' })).toContain('gate');
    expect(faultSentence({ part: 'gate', mode: 'open' })).toBe(`gate: ${sentenceOf('mode.open')}`);
  });

  it('find a refusal under the case, the sending, or the request', () => {
    expect(refusalSentence('case-closed', { status: 'closed' })).toBe(
      sentenceOf('case.case-closed', { status: 'closed' }),
    );
    expect(refusalSentence('id-reuse')).toBe(sentenceOf('sync.id-reuse'));
    expect(refusalSentence('not_found')).toBe(sentenceOf('not_found'));
    expect(refusalSentence('of-tomorrow')).toBe('of-tomorrow');
  });
});
