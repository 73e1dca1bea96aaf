import type { Procedure } from '@/domain/procedure/types';
import { takesBack } from '@/domain/revision/takesBack';
import type { TakenBackFrom } from '@/domain/revision/types';
import { acceptedProcedure } from '../book/compare';
import { app } from '../context';

/** A published text that a draft descends from. */
export interface Ancestor {
  letter: string;
  procedure: Procedure;
}

/**
 * How many revisions are looked back over. A draft that lay about while more than these were published is read by
 * people who know none of them by heart either.
 */
const LOOK_BACK = 4;

/** The revision that a text stands on, and those that it was made from in turn, latest first. Empty for a new procedure. */
export async function ancestryOf(baseId: string | null): Promise<Ancestor[]> {
  if (baseId === null) return [];
  const { db } = await app();
  const rows = await db.read<{ letter: string; source: string }>(
    `WITH RECURSIVE chain (letter, source, parentId, depth) AS (
       SELECT letter, source, parentId, 0 FROM revisions WHERE id = :baseId
       UNION ALL
       SELECT r.letter, r.source, r.parentId, c.depth + 1 FROM revisions r JOIN chain c ON r.id = c.parentId
       WHERE c.depth < :lookBack)
     SELECT letter, source FROM chain ORDER BY depth`,
    { baseId, lookBack: LOOK_BACK },
  );
  return Promise.all(rows.map(async ({ letter, source }) => ({ letter, procedure: await acceptedProcedure(source) })));
}

/** What a text sets back of each of the revisions that it descends from, latest first. */
export function takenBack(ancestry: readonly Ancestor[], proposed: Procedure): TakenBackFrom[] {
  const [base] = ancestry;
  return ancestry.flatMap(({ letter, procedure: revised }, i) => {
    const before = ancestry[i + 1]?.procedure;
    if (!base || !before) return [];
    const what = takesBack({ before, revised }, base.procedure, proposed).map(({ words }) => words);
    return what.length > 0 ? [{ revision: letter, what }] : [];
  });
}
