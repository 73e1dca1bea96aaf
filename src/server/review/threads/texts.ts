import type { Procedure } from '@/domain/procedure/types';
import { placeOf } from '@/domain/review/anchors';
import { acceptedProcedure } from '../../book/compare';
import { parsedText } from '../../book/parsed';
import { app } from '../../context';
import type { Loaded } from '../proposals';

/** Both texts that a thread can be tied to; null where there is none, or where a draft cannot be read. */
export interface Texts {
  proposed: Procedure | null;
  base: Procedure | null;
}

export async function textsOf({ source, parentId }: Pick<Loaded, 'source' | 'parentId'>): Promise<Texts> {
  const { db } = await app();
  const [parent] =
    parentId === null
      ? []
      : await db.read<{ source: string }>('SELECT source FROM revisions WHERE id = :parentId', { parentId });
  const parsed = await parsedText(source);
  return {
    proposed: parsed.ok ? parsed.procedure : null,
    base: parent ? await acceptedProcedure(parent.source) : null,
  };
}

/** What an anchor is called in the proposed text, or in the one that it stands on; null where neither has it. */
export const placeIn = ({ proposed, base }: Texts, anchor: string | null): string | null =>
  (proposed && placeOf(proposed, anchor)) ?? (base && placeOf(base, anchor));
