import { expect, it } from 'vitest';
import { packBook, unpackBook } from '@/domain/search/columns';
import { generatedDocuments, GENERATED_ENGINES } from '../../factories/generatedBook';
import { shippedBook } from '../../factories/shippedBook';

it('a book comes back from the wire as it was sent', () => {
  const books = [
    shippedBook(),
    { documents: generatedDocuments(50), vocabulary: [], engines: GENERATED_ENGINES },
    { documents: [], vocabulary: [], engines: [] },
  ];
  for (const book of books) expect(unpackBook(JSON.parse(JSON.stringify(packBook(book))))).toEqual(book);
});
