import type { Actor } from '@/domain/people/may';
import type { VersionKind } from '@/domain/writing/versions';
import { personColumn } from '../../book/columns';
import { app } from '../../context';
import type { Loaded } from '../proposals';
import { unpack } from './packed';

export interface VersionRow {
  id: string;
  n: number;
  kind: VersionKind;
  ofN: number | null;
  at: string;
  sittingAt: string;
  page: string | null;
  parentId: string | null;
  reason: string;
  hash: string;
  /** JSON of a list of words. */
  what: string;
  /** JSON of a person. */
  person: string;
  /** Letter of the revision that it stood on. */
  base: string | null;
}

const COLUMNS = `v.id, v.n, v.kind, v.ofN, v.at, v.sittingAt, v.page, v.parentId, v.reason, v.hash, v.what,
  ${personColumn('a')} AS person, b.letter AS base`;
const FROM = `FROM draftVersions v JOIN people a ON a.id = v.personId LEFT JOIN revisions b ON b.id = v.parentId
  WHERE v.revisionId = :id`;

/** Versions of a draft without their texts, latest first. */
export async function versionRows(id: string, where = '', more: Record<string, unknown> = {}): Promise<VersionRow[]> {
  const { db } = await app();
  return db.read<VersionRow>(`SELECT ${COLUMNS} ${FROM} ${where}`, { id, ...more });
}

/** What stands under each of these numbers. */
export async function versionTexts(id: string, numbers: readonly number[]): Promise<Map<number, string>> {
  const { db } = await app();
  const rows = await db.read<{ n: number; packed: Buffer }>(
    'SELECT n, packed FROM draftVersions WHERE revisionId = :id AND n IN (:numbers)',
    { id, numbers: [...new Set([1, ...numbers])] },
  );
  const opening = rows.find(({ n }) => n === 1);
  const first = opening ? unpack(opening.packed) : '';
  return new Map(rows.map(({ n, packed }) => [n, n === 1 ? first : unpack(packed, first)]));
}

/**
 * Whether somebody who may read a proposal may see a version of it. What was sent in was there for every reader; what was
 * typed in between is the author's, as any draft is.
 */
export const seesVersion = (actor: Actor, { authorId }: Pick<Loaded, 'authorId'>, kind: VersionKind): boolean =>
  actor.personId === authorId || kind === 'submit';
