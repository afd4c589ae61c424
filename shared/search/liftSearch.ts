import MiniSearch, { type Options, type SearchOptions } from 'minisearch';
import { asLabel, normalise, termsOf } from './normalise';

/** What of a lift is searched. */
export interface SearchedLift {
  readonly id: string;
  readonly name: string;
  readonly site: string;
  readonly address: string;
  readonly label: string;
  readonly maker: string;
  readonly controller: string;
}

const FIELDS = ['name', 'site', 'address', 'label', 'maker', 'controller'] as const;
/** Fewer letters of a label than this match too many lifts to be meant as one. */
const LABEL_BEGINNING = 3;
/** Shorter words are taken as typed: one wrong letter makes another word of them. */
const FUZZY_FROM = 4;
/** Share of a word's letters that may be wrong. */
const FUZZY_SHARE = 0.25;

/** The same on the device and in tests. Numbers are never guessed: lift 2 is not lift 3. */
export const liftSearchOptions: Options<SearchedLift> & { readonly searchOptions: SearchOptions } =
  {
    fields: [...FIELDS],
    tokenize: (text) => [...termsOf(text)],
    processTerm: normalise,
    searchOptions: {
      boost: { name: 3, site: 2, label: 2 },
      combineWith: 'AND',
      prefix: true,
      fuzzy: (term) => (term.length >= FUZZY_FROM && !/\d/.test(term) ? FUZZY_SHARE : false),
    },
  };

export interface LiftSearch {
  /**
   * Ids of the lifts that fit, best first. Lifts whose label begins with what was typed come first;
   * nothing typed: every lift, in the order given.
   */
  find(typed: string): readonly string[];
}

/** Indexes lifts for searching without network. */
export function liftSearch(lifts: readonly SearchedLift[]): LiftSearch {
  const index = new MiniSearch<SearchedLift>(liftSearchOptions);
  index.addAll(lifts);
  return {
    find(typed) {
      if (termsOf(typed).length === 0) return lifts.map(({ id }) => id);
      const code = asLabel(typed);
      const byLabel =
        code.length < LABEL_BEGINNING
          ? []
          : lifts.filter(({ label }) => label.startsWith(code)).map(({ id }) => id);
      const byWords = index.search(typed).map(({ id }) => id as string);
      return [...new Set([...byLabel, ...byWords])];
    },
  };
}
