import type { Matched } from '@/domain/search/explain';
import type { Wording } from '@/domain/search/engine';
import { app } from '../context';

// Characters that no text of the book can hold: the parser refuses them.
const OPEN = '\u0001';
const CLOSE = '\u0002';
const WORDS_AROUND = 18;
const MOST = 50;

/** A name as FTS5 reads it: a quoted phrase, nothing in it is an operator. */
const phrase = (name: string): string => `"${name.replace(/"/g, '""')}"`;

/** Every thing asked for must stand in the text, in any of its wordings; the last word may go on. */
function expression(wordings: readonly Wording[]): string {
  return wordings
    .map(({ anyOf, unfinished }) => {
      const [own = '', ...others] = anyOf;
      const typed = `${phrase(own)}${unfinished || !own.includes(' ') ? ' *' : ''}`;
      return `(${[typed, ...others.map(phrase)].join(' OR ')})`;
    })
    .join(' AND ');
}

/** A snippet with its marks as places. */
function matchedIn(snippet: string): Matched {
  const marks: Matched['marks'] = [];
  let text = '';
  for (const part of snippet.replace(/\s+/g, ' ').split(/([\u0001\u0002])/)) {
    const last = marks.at(-1);
    if (part === OPEN) marks.push([text.length, text.length]);
    else if (part === CLOSE && last) last[1] = text.length;
    else text += part;
  }
  return { field: 'text', text, step: null, marks };
}

/** Sheets of these books whose whole text holds all that is asked for, best first, with the words around it. */
export async function searchProse(
  books: readonly string[],
  wordings: readonly Wording[],
): Promise<Map<string, Matched>> {
  if (books.length === 0 || wordings.length === 0) return new Map();
  const { db } = await app();
  const rows = await db.read<{ number: string; snippet: string }>(
    `SELECT p.number, snippet(searchWords, 1, :open, :close, '…', :around) AS snippet
     FROM searchWords JOIN searchDocuments d ON d.procedureId = searchWords.procedureId
     JOIN procedures p ON p.id = d.procedureId
     WHERE searchWords MATCH :expression AND d.book IN (:books)
     ORDER BY bm25(searchWords), p.number LIMIT :most`,
    { expression: expression(wordings), books, open: OPEN, close: CLOSE, around: WORDS_AROUND, most: MOST },
  );
  return new Map(rows.map(({ number, snippet }) => [number, matchedIn(snippet)]));
}
