import { may, type Actor } from '@/domain/people/may';
import { notFound } from '../refusal';
import { bookOf, type BookRow } from './columns';

/** Lets a row pass that exists and stands in a book this person reads; refuses 404 for both other cases alike. */
export function readable<Row extends Pick<BookRow, 'bookKind' | 'shopId'>>(actor: Actor, row: Row | undefined): Row {
  if (!row || !may(actor, 'readBook', { book: bookOf(row) }).ok) throw notFound();
  return row;
}
