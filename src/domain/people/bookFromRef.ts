import type { BookRef } from '../api/schemas/common';
import type { Book } from './may';

/** The book that a reference names, as `may` asks for it. */
export const bookFromRef = ({ shopId }: Pick<BookRef, 'shopId'>): Book =>
  shopId === null ? { kind: 'common' } : { kind: 'shop', shopId };
