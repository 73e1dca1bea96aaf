import { changeWords, type ChangeWords } from '@/domain/revision/changeWords';
import { now } from '../clock';
import { app } from '../context';
import { acceptedProcedure } from './compare';

/** Raise it whenever the same two texts would be told otherwise. */
const FORM = 1;

/** A revision and the one it was made from. */
export interface Made {
  id: string;
  hash: string;
  parentId: string;
  parentHash: string;
}

async function compared({ id, hash, parentId, parentHash }: Made): Promise<ChangeWords> {
  const { db } = await app();
  const rows = await db.read<{ id: string; source: string }>('SELECT id, source FROM revisions WHERE id IN (:ids)', {
    ids: [id, parentId],
  });
  const source = (of: string) => rows.find((row) => row.id === of)?.source ?? '';
  const [before, after] = [await acceptedProcedure(source(parentId)), await acceptedProcedure(source(id))];
  const words = changeWords(before, after);
  await db.write(() =>
    db.sequelize.query(
      `INSERT INTO textChanges (fromHash, toHash, form, json, createdAt, updatedAt)
         VALUES (:parentHash, :hash, :form, :json, :at, :at)
       ON CONFLICT (fromHash, toHash) DO UPDATE SET form = excluded.form, json = excluded.json, updatedAt = excluded.updatedAt`,
      { replacements: { parentHash, hash, form: FORM, json: JSON.stringify(words), at: now() } },
    ),
  );
  return words;
}

/**
 * What each revision changed, in words, by its id: kept under the two hashes, worked out where it is not. One after the
 * other, so that a long history does not hold up who else has a text read.
 */
export async function changesOf(made: readonly Made[]): Promise<Map<string, ChangeWords>> {
  if (made.length === 0) return new Map();
  const { db } = await app();
  const kept = await db.read<{ fromHash: string; toHash: string; json: string }>(
    'SELECT fromHash, toHash, json FROM textChanges WHERE form = :form AND toHash IN (:hashes)',
    { form: FORM, hashes: made.map(({ hash }) => hash) },
  );
  const known = new Map(kept.map(({ fromHash, toHash, json }) => [`${fromHash} ${toHash}`, json]));
  const changes = new Map<string, ChangeWords>();
  for (const one of made) {
    const json = known.get(`${one.parentHash} ${one.hash}`);
    changes.set(one.id, json === undefined ? await compared(one) : (JSON.parse(json) as ChangeWords));
  }
  return changes;
}
