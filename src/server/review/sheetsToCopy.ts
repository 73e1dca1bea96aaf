import type { Actor } from '@/domain/people/may';
import { NO_FILTERS } from '@/domain/search/filters';
import { searchBook } from '../book/search';
import type { TypedNew } from './newProcedureForm';

const MOST = 8;

/** The sheets that the page offers to copy: those looked up, and the one that is chosen already. None for no words. */
export async function sheetsToCopy(actor: Actor, { q, sheet }: Pick<TypedNew, 'q' | 'sheet'>) {
  const look = async (words: string, limit: number) =>
    words.trim() ? (await searchBook(actor, words, NO_FILTERS, { limit })).hits : [];
  const found = await look(q, MOST);
  const chosen = found.some(({ number }) => number === sheet)
    ? []
    : (await look(sheet, 1)).filter(({ number }) => number === sheet);
  return [...chosen, ...found].map(({ number, title, letter, book, withdrawn }) => ({
    number,
    title,
    letter,
    book,
    withdrawn,
  }));
}
