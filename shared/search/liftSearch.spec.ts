import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { liftSearch, type SearchedLift } from './liftSearch';
import { asLabel, normalise, termsOf } from './normalise';

const lift = (id: string, changed: Partial<SearchedLift>): SearchedLift => ({
  id,
  name: 'Lift 1',
  site: 'Weir House',
  address: '4 Weir Street, Eastmere',
  label: '7QK2M0A',
  maker: 'Brook & Sons',
  controller: 'relay, 1958',
  ...changed,
});
const lifts = [
  lift('a', {}),
  lift('b', { name: 'Lift 2', label: '7QK2M1B' }),
  lift('c', { name: 'Warenaufzug', site: 'Getreidemühle', label: 'ZX81W00', maker: 'Høyer' }),
];
const { find } = liftSearch(lifts);

describe('searching lifts', () => {
  it('gives every lift, in order, where nothing is typed', () => {
    expect(find('')).toEqual(['a', 'b', 'c']);
    expect(find('  - ')).toEqual(['a', 'b', 'c']);
  });

  it('finds by beginnings of words, in any order, over several fields', () => {
    expect(find('hou weir')).toEqual(['a', 'b']);
    expect(find('brook lift 2')).toEqual(['b']);
  });

  it('does not mind accents, capitals, or one wrong letter', () => {
    expect(find('GETREIDEMUHLE')).toEqual(['c']);
    expect(find('hoyer')).toEqual(['c']);
    expect(find('getriedemuhle')).toEqual(['c']);
  });

  it('never takes one number for another', () => {
    expect(find('lift 2')).toEqual(['b']);
    expect(find('lift 3')).toEqual([]);
  });

  it('puts a label first, with its digits mistaken for letters', () => {
    expect(find('7qk 2mo a')[0]).toBe('a');
    expect(find('7QK2MIB')).toEqual(['b']);
    expect(find('zx8')).toEqual(['c']);
  });

  it('finds nothing for what is nowhere', () => {
    expect(find('quarry')).toEqual([]);
  });

  it('takes any text without failing', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (typed) => {
        const known = new Set(lifts.map(({ id }) => id));
        const found = find(typed);
        return found.every((id) => known.has(id)) && new Set(found).size === found.length;
      }),
    );
  });
});

describe('normalising', () => {
  it('is the same when done twice', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: 'grapheme' }),
        (text) => normalise(normalise(text)) === normalise(text),
      ),
    );
  });

  it('splits words and numbers', () => {
    expect(termsOf('Straße 12/a, Łódź')).toEqual(['strasse', '12', 'a', 'lodz']);
  });

  it('reads labels as they are typed', () => {
    expect(asLabel(' 7q-k2 ILo ')).toBe('7QK2110');
  });
});
