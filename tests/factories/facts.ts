import type { ProposalFacts } from '@/domain/review/rules';

/** What the rules of review know of an ordinary change to a sheet of the common book that waits for its first agreement. */
export const factsOf = (change: Partial<ProposalFacts> = {}): ProposalFacts => ({
  book: { kind: 'common' },
  authorId: 'rowan',
  state: 'proposed',
  everProposed: true,
  hash: 'text-1',
  base: 'C',
  current: 'C',
  identical: false,
  reason: 'The covers weep.',
  criticalReasons: [],
  agreements: [],
  failing: [],
  overrides: [],
  editorIds: ['ines', 'tomas'],
  standInIds: [],
  ...change,
});
