import type { DraftVersion, DraftVersionInFull } from '@/domain/api/schemas/versions';
import type { ListQuery, Page } from '@/domain/api/schemas/common';
import type { Actor } from '@/domain/people/may';
import { compareProcedures } from '@/domain/revision/compare';
import { personRef } from '../../book/columns';
import { parsedText } from '../../book/parsed';
import { notFound } from '../../refusal';
import { readableProposal } from '../guard';
import type { Loaded } from '../proposals';
import { seesVersion, versionRows, versionTexts, type VersionRow } from './rows';

const versionOf = (
  { n, kind, ofN, at, reason, what, person, base, hash, parentId }: VersionRow,
  draft: Loaded,
): DraftVersion => ({
  n,
  kind,
  of: ofN,
  at,
  person: personRef(person),
  base,
  reason,
  what: JSON.parse(what) as string[],
  // Another text may stand in the draft under the very words, so all that makes a version is compared.
  current: kind !== 'aside' && hash === draft.hash && reason === draft.reason && parentId === draft.parentId,
});

/** Versions of a draft, latest first; the cursor is the last number of the page before. Refuses 404 like `readProposal`. */
export async function listVersions(
  actor: Actor,
  id: string,
  { cursor, limit }: ListQuery,
): Promise<Page<DraftVersion>> {
  const draft = await readableProposal(actor, id);
  const before = cursor !== undefined && /^\d{1,9}$/.test(cursor) ? Number(cursor) : Number.MAX_SAFE_INTEGER;
  const rows = await versionRows(
    id,
    `AND v.n < :before ${seesVersion(actor, draft, 'write') ? '' : "AND v.kind = 'submit'"} ORDER BY v.n DESC LIMIT :limit`,
    { before, limit: limit + 1 },
  );
  const items = rows.slice(0, limit).map((row) => versionOf(row, draft));
  return { items, next: rows.length > limit ? String(items.at(-1)?.n ?? '') : null };
}

export interface LoadedVersion {
  draft: Loaded;
  row: VersionRow;
  source: string;
}

/** One version with its text and the draft that it is of. Refuses 404 one that is not there, or not theirs to see. */
export async function loadVersion(actor: Actor, id: string, n: number): Promise<LoadedVersion> {
  const draft = await readableProposal(actor, id);
  const [row] = await versionRows(id, 'AND v.n = :n', { n });
  if (!row || !seesVersion(actor, draft, row.kind)) throw notFound();
  return { draft, row, source: (await versionTexts(id, [n])).get(n) ?? '' };
}

/** What going back would change in the draft as it stands; null where one of the two texts cannot be read. */
async function comparedWithNow({ draft, source }: LoadedVersion) {
  const [now, then] = await Promise.all([parsedText(draft.source), parsedText(source)]);
  if (!now.ok || !then.ok) return null;
  const comparison = compareProcedures(now.procedure, then.procedure);
  return { comparison, now: now.procedure.frontmatter, then: then.procedure.frontmatter };
}

/** One version in full, for the API. */
export async function readVersion(actor: Actor, id: string, n: number): Promise<DraftVersionInFull> {
  const loaded = await loadVersion(actor, id, n);
  const compared = await comparedWithNow(loaded);
  return { ...versionOf(loaded.row, loaded.draft), source: loaded.source, comparison: compared?.comparison ?? null };
}

/** One version beside the draft as it stands, for its page. */
export async function readVersionPage(actor: Actor, id: string, n: number) {
  const loaded = await loadVersion(actor, id, n);
  const { draft, row, source } = loaded;
  return {
    version: versionOf(row, draft),
    source,
    draft: { source: draft.source, reason: draft.reason },
    compared: await comparedWithNow(loaded),
  };
}
