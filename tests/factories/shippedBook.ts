import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'yaml';
import { Engine } from '@/domain/procedure/engine';
import { parseProcedure } from '@/domain/procedure/parse';
import { searchDocument } from '@/domain/search/documents';
import type { SearchBook } from '@/domain/search/engine';
import { VocabularyFile } from '@/domain/search/vocabulary';

const filesOf = (folder: string): { name: string; text: string }[] =>
  readdirSync(join('content', folder))
    .sort()
    .map((name) => ({ name, text: readFileSync(join('content', folder, name), 'utf8') }));

export const shippedVocabulary = () =>
  filesOf('vocabulary').flatMap(({ text }) => VocabularyFile.parse(parse(text)).groups);

/** The book as it ships, read from `content` without a database: what the ranking is judged on. */
export function shippedBook(): SearchBook {
  const documents = filesOf('procedures').map(({ name, text }) => {
    const parsed = parseProcedure(text);
    if (!parsed.ok) throw new Error(`${name}: ${JSON.stringify(parsed.errors)}`);
    return searchDocument(parsed.rendered, {
      number: name.slice(0, 6).toUpperCase(),
      letter: 'A',
      publishedAt: '2026-11-14T08:00:00.000Z',
      book: 'Common book',
    });
  });
  const engines = filesOf('engines').map(({ name, text }) => {
    const { name: said, aliases } = Engine.parse(parse(text));
    return { key: name.replace(/\.yaml$/, ''), name: said, aliases };
  });
  return { documents, vocabulary: shippedVocabulary(), engines };
}
