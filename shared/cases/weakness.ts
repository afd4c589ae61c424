/** What a supervisor should look at before accepting; sentences: `weakness.<code>`. */
export interface EvidenceWeakness {
  readonly code: string;
  readonly weight: 'grave' | 'note';
  readonly details: Readonly<Record<string, string | number>>;
}

/** Notes a weakness when a condition holds. */
export type Say = (
  weight: EvidenceWeakness['weight'],
  code: string,
  when: boolean,
  details?: EvidenceWeakness['details'],
) => void;
