import { createHash } from 'node:crypto';
import { LRUCache } from 'lru-cache';
import type { Actor } from '@/domain/people/may';
import { packBook } from '@/domain/search/columns';
import type { SearchDocument } from '@/domain/search/documents';
import {
  createSearch,
  type Search,
  type SearchAnswer,
  type SearchEngine,
  type SearchOptions,
} from '@/domain/search/engine';
import type { Facets, Filters } from '@/domain/search/filters';
import { type Suggestion, suggestions } from '@/domain/search/suggest';
import { app } from '../context';
import { Compressed } from './compressed';
import { readableBooks } from './readable';
import { searchProse } from './searchProse';
import { readTrade } from './trade';

/** What stands beside an empty field: what there is to choose from, and queries that find something. */
export interface Overview {
  engines: Pick<SearchEngine, 'key' | 'name'>[];
  facets: Facets;
  suggestions: Suggestion[];
}

/** What a set of books looks like to search, at one state of those books. */
interface Held {
  etag: string;
  search: Search;
  overview: Overview;
  index: Compressed;
}

interface Version {
  count: number;
  latest: string | null;
}

// People of one shop see the same books, so one entry serves them all; the oldest sets make room.
const held = new LRUCache<string, { version: string; made: Promise<Held> }>({ max: 24 });

/** `searchDocuments.book` names a shop by its id. */
function booksOf(actor: Actor): string[] {
  const { common, shopIds } = readableBooks(actor);
  return [...(common ? ['common'] : []), ...[...shopIds].sort()];
}

const byNumber = (a: SearchDocument, b: SearchDocument): number =>
  a.number.length - b.number.length || (a.number < b.number ? -1 : 1);

async function make(books: string[]): Promise<Held> {
  const { db } = await app();
  const [rows, trade] = await Promise.all([
    db.read<{ json: string }>('SELECT json FROM searchDocuments WHERE book IN (:books)', { books }),
    readTrade(),
  ]);
  const documents = rows.map(({ json }) => JSON.parse(json) as SearchDocument).sort(byNumber);
  const book = { documents, ...trade };
  const body = Buffer.from(JSON.stringify(packBook(book)));
  const etag = `"${createHash('sha256').update(body).digest('hex').slice(0, 32)}"`;
  const search = createSearch(book);
  const overview = {
    engines: trade.engines.map(({ key, name }) => ({ key, name })),
    facets: search.query('', undefined, { limit: 0 }).facets,
    suggestions: suggestions(book, search),
  };
  return { etag, search, overview, index: new Compressed(body) };
}

/** The search over what a person may see; made again when one of those books has changed. */
async function heldFor(actor: Actor): Promise<Held> {
  const { db, config } = await app();
  const books = booksOf(actor);
  const [state] = await db.read<Version>(
    'SELECT count(*) AS count, max(updatedAt) AS latest FROM searchDocuments WHERE book IN (:books)',
    { books },
  );
  const version = `${state?.count ?? 0} ${state?.latest ?? ''}`;
  const key = [config.dataDir, ...books].join('\n');
  const known = held.get(key);
  if (known?.version === version) return known.made;
  const made = make(books);
  held.set(key, { version, made });
  made.catch(() => held.delete(key));
  return made;
}

/** What the person's pages search on, as bytes of JSON (`PackedBook`) that can be had compressed. */
export async function searchIndex(actor: Actor): Promise<{ etag: string; index: Compressed }> {
  return heldFor(actor);
}

export async function searchOverview(actor: Actor): Promise<Overview> {
  return (await heldFor(actor)).overview;
}

/**
 * Sheets of the books a person may read, best first, in the very order their pages rank them; then sheets that hold
 * the words only in their prose, which the pages do not know.
 */
export async function searchBook(
  actor: Actor,
  q: string,
  filters: Filters,
  options: Omit<SearchOptions, 'inProse'> = {},
): Promise<SearchAnswer> {
  const { search } = await heldFor(actor);
  const inProse = await searchProse(booksOf(actor), search.wordings(q));
  return search.query(q, filters, { ...options, inProse });
}
