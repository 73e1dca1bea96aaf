import { LRUCache } from 'lru-cache';
import type { OriginsOfSheet } from '@/domain/api/schemas/history';
import type { Actor } from '@/domain/people/may';
import type { Procedure } from '@/domain/procedure/types';
import { originGroups, type OriginGroup } from '@/domain/revision/originView';
import { originsAfter, type Origins } from '@/domain/revision/origins';
import { now } from '../clock';
import { app } from '../context';
import { REVISION_COLUMNS, revisionSummary, type BookRow, type RevisionRow } from './columns';
import { acceptedProcedure } from './compare';
import { readable } from './locate';

/** Raise it whenever the same texts would give other origins; what was kept in an older form is worked out again. */
const FORM = 1;

interface Current extends ChainRow {
  procedureId: string;
  hash: string;
  title: string;
}

interface ChainRow {
  id: string;
  letter: string;
}

async function sourceOf(id: string): Promise<string> {
  const { db } = await app();
  const [row] = await db.read<{ source: string }>('SELECT source FROM revisions WHERE id = :id', { id });
  return row?.source ?? '';
}

async function keep(revisionId: string, origins: Origins): Promise<void> {
  const { db } = await app();
  await db.write(() =>
    db.sequelize.query(
      `INSERT INTO textOrigins (revisionId, form, json, createdAt, updatedAt) VALUES (:revisionId, :form, :json, :at, :at)
       ON CONFLICT (revisionId) DO UPDATE SET form = excluded.form, json = excluded.json, updatedAt = excluded.updatedAt`,
      { replacements: { revisionId, form: FORM, json: JSON.stringify(origins), at: now() } },
    ),
  );
}

/**
 * The origins of the current revision of a procedure, from the latest revision whose origins are kept. What is worked out
 * on the way is kept for each revision, so that the next one costs one step.
 */
async function chainOrigins(procedureId: string): Promise<Origins> {
  const { db } = await app();
  const chain = await db.read<ChainRow>(
    `SELECT id, letter FROM revisions WHERE procedureId = :procedureId AND letter IS NOT NULL ORDER BY length(letter), letter`,
    { procedureId },
  );
  const [kept] = await db.read<{ revisionId: string; json: string }>(
    `SELECT o.revisionId, o.json FROM textOrigins o JOIN revisions r ON r.id = o.revisionId
     WHERE r.procedureId = :procedureId AND o.form = :form ORDER BY length(r.letter) DESC, r.letter DESC LIMIT 1`,
    { procedureId, form: FORM },
  );
  let from = chain.findIndex(({ id }) => id === kept?.revisionId);
  let origins = kept ? (JSON.parse(kept.json) as Origins) : null;
  let text: Procedure | null = null;
  for (const row of chain.slice(from + 1)) {
    const base = chain[from];
    if (base && !text) text = await acceptedProcedure(await sourceOf(base.id));
    const now = await acceptedProcedure(await sourceOf(row.id));
    origins = originsAfter(text && origins ? { text, origins } : null, now, row.letter);
    await keep(row.id, origins);
    text = now;
    from += 1;
  }
  return origins ?? {};
}

const groupsOf = new LRUCache<string, Promise<{ groups: OriginGroup[] }>>({ max: 100 });

/** Worked out once, however many ask meanwhile; a long chain takes seconds the first time. */
function groups(id: string, hash: string, procedureId: string): Promise<{ groups: OriginGroup[] }> {
  const key = `${id} ${hash}`;
  const known = groupsOf.get(key);
  if (known) return known;
  const made = (async () => ({
    groups: originGroups(await acceptedProcedure(await sourceOf(id)), await chainOrigins(procedureId)),
  }))();
  groupsOf.set(key, made);
  made.catch(() => groupsOf.delete(key));
  return made;
}

/**
 * Since which revision each step and value of the current sheet reads as it does, and what is known of those revisions.
 * Refuses 404 what is unknown or not readable.
 */
export async function readOrigins(actor: Actor, number: string): Promise<OriginsOfSheet> {
  const { db } = await app();
  const [found] = await db.read<Pick<BookRow, 'bookKind' | 'shopId'> & Current>(
    `SELECT p.bookKind, p.shopId, p.id AS procedureId, r.id, r.letter, r.hash, json_extract(r.head, '$.title') AS title
     FROM procedures p JOIN revisions r ON r.id = p.currentRevisionId WHERE p.number = :number`,
    { number },
  );
  const { procedureId, title, letter, id, hash } = readable(actor, found);
  const known = await groups(id, hash, procedureId);
  const letters = [...new Set(known.groups.flatMap(({ origins }) => origins.map((origin) => origin.letter)))];
  const revisions = await db.read<RevisionRow>(
    `SELECT ${REVISION_COLUMNS} FROM revisions r JOIN procedures p ON p.id = r.procedureId
     WHERE p.number = :number AND r.letter IN (:letters) ORDER BY length(r.letter) DESC, r.letter DESC`,
    { number, letters },
  );
  return { number, title, letter, revisions: revisions.map(revisionSummary), groups: known.groups };
}
