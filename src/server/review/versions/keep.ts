import { textChanges, type Words } from '@/domain/writing/textChanges';
import { sittingOf, thinnedOut, type Version, type VersionKind } from '@/domain/writing/versions';
import { hashOf } from '../../book/parsed';
import { now } from '../../clock';
import { app } from '../../context';
import type { Loaded } from '../proposals';
import { pack } from './packed';
import { versionTexts } from './rows';

/** A draft as it is from now on. */
export interface Made extends Words {
  revisionId: string;
  kind: VersionKind;
  personId: string;
  /** The revision that it stands on. */
  parentId: string | null;
  /** Which page wrote it. */
  page?: string | undefined;
  /** Of a `restore`, the number that was gone back to. */
  ofN?: number;
}

type Kept = Version & { reason: string };

async function insert(made: Made, first: string, place: Pick<Kept, 'n' | 'at' | 'sittingAt'>): Promise<Kept> {
  const { db } = await app();
  const { revisionId, kind, personId, parentId, reason, source, page = null, ofN = null } = made;
  await db.models.DraftVersion.create({
    ...place,
    revisionId,
    kind,
    ofN,
    personId,
    page,
    parentId,
    reason,
    hash: hashOf(source),
    packed: place.n === 1 ? pack(source) : pack(source, first),
  });
  return { ...place, kind, page, reason };
}

/** Says anew what each version changed whose predecessor is another one than before. */
async function tell(id: string, before: readonly Kept[], after: readonly Kept[]): Promise<void> {
  // Words that were set aside were never the draft's, so nothing followed from them.
  const line = (versions: readonly Kept[]) => versions.filter(({ kind }) => kind !== 'aside');
  const last = (versions: readonly Kept[], n: number) => line(versions).findLast((other) => other.n < n);
  const changed = after.flatMap((version) => {
    const from = last(after, version.n);
    const known = before.some(({ n }) => n === version.n);
    return from && (!known || last(before, version.n)?.n !== from.n) ? [{ from, to: version }] : [];
  });
  if (changed.length === 0) return;
  const texts = await versionTexts(
    id,
    changed.flatMap(({ from, to }) => [from.n, to.n]),
  );
  const words = ({ n, reason }: Kept): Words => ({ source: texts.get(n) ?? '', reason });
  const { db } = await app();
  for (const { from, to } of changed)
    await db.models.DraftVersion.update(
      { what: textChanges(words(from), words(to)) },
      { where: { revisionId: id, n: to.n } },
    );
}

/**
 * Keeps a draft as it is now as its newest version, and lets go of what the rule no longer keeps. Call it inside the
 * `write` that changes the draft.
 *
 * @param before the draft as it was, which becomes the first version of one that has none yet; null for a new draft
 */
export async function keepVersion(before: Loaded | null, made: Made): Promise<void> {
  const { db } = await app();
  const { revisionId } = made;
  const rows = await db.read<Kept>(
    'SELECT n, kind, at, sittingAt, page, reason FROM draftVersions WHERE revisionId = :revisionId ORDER BY n',
    { revisionId },
  );
  if (rows.length === 0 && before) {
    const { authorId: personId, source, reason, parentId, updatedAt: at } = before;
    const start: Made = { revisionId, kind: 'start', personId, source, reason, parentId };
    rows.push(await insert(start, '', { n: 1, at, sittingAt: at }));
  }
  const first = rows.length > 0 ? ((await versionTexts(revisionId, [1])).get(1) ?? '') : '';
  const at = now();
  const newest = rows.at(-1);
  const sittingAt = made.kind === 'write' ? sittingOf(newest, at, made.page ?? null) : at;
  const all = [...rows, await insert(made, first, { n: (newest?.n ?? 0) + 1, at, sittingAt })];
  const gone = thinnedOut(all);
  if (gone.length > 0) await db.models.DraftVersion.destroy({ where: { revisionId, n: gone } });
  await tell(
    revisionId,
    rows,
    all.filter(({ n }) => !gone.includes(n)),
  );
}
