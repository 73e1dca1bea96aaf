import type { Photo } from '@/domain/api/schemas/photos';
import type { Actor, Book } from '@/domain/people/may';
import { photosOf } from '../photos/load';
import type { FlagView, LoadedFlag } from './rows';

/** A flag with its photos, as one person sees them. */
export type ShownFlag = FlagView & { photos: Photo[] };

/** Flags with their photos, in one read. */
export async function shownFlags(actor: Actor, flags: readonly LoadedFlag[]): Promise<ShownFlag[]> {
  const books = new Map<string, Book>(flags.map(({ view, facts }) => [view.id, facts.book]));
  const photos = await photosOf(actor, 'flag', [...books.keys()], (id) => ({
    book: books.get(id) ?? { kind: 'common' },
  }));
  return flags.map(({ view }) => ({ ...view, photos: photos(view.id) }));
}

export async function shownFlag(actor: Actor, flag: LoadedFlag): Promise<ShownFlag> {
  const [shown] = await shownFlags(actor, [flag]);
  if (!shown) throw new Error('A flag was not shown.');
  return shown;
}
