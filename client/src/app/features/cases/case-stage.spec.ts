import { found, reading, repaired, specCase, type SpecEvent } from './case-for-specs';
import { stageNow } from './case-stage';
import { stageOf } from './advice-request';
import { undoneNext } from './case-undo';

const arrived: SpecEvent = {
  type: 'arrival checked',
  payload: { peopleSafe: true, noticesUp: true, meterProven: true, linksFound: 0 },
};
const service: SpecEvent = { type: 'returned to service', payload: { runs: 2, coversOn: true } };

describe('stageNow', () => {
  it.each<[string, readonly SpecEvent[]]>([
    ['arrive', []],
    ['find', [arrived]],
    ['repair', [arrived, found]],
    ['prove', [arrived, found, repaired]],
    ['close', [arrived, found, repaired, service]],
  ])('goes on at %s', (stage, events) => {
    expect(stageNow(specCase(...events))).toBe(stage);
  });
});

describe('stageOf', () => {
  it('leaves what was read before a repair behind', () => {
    expect(stageOf(specCase(arrived, found))).toBe('finding');
    expect(stageOf(specCase(arrived, found, repaired))).toBe('after repair');
  });
});

describe('undoneNext', () => {
  it('takes back what was entered beside the pad, and nothing larger', () => {
    const read = specCase(arrived, reading('T0', 'R', 109));
    expect(undoneNext(read)).toBe(read.undoable.at(-1));
    expect(undoneNext(specCase(arrived))).toBeUndefined();
    expect(undoneNext(specCase())).toBeUndefined();
  });
});
