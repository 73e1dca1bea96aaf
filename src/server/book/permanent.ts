import type { Actor } from '@/domain/people/may';
import { app } from '../context';
import { notFound } from '../refusal';
import type { BookRow } from './columns';
import { readable } from './locate';

/**
 * The letter of the published revision whose hash begins with a sheet check, as printed (`7f3a 91c0`) or longer, up to the
 * whole hash. A text that was brought back has the check of the earlier one; the latest is meant, for it says the same.
 * Refuses 404 a check of none, like a procedure that is unknown or not readable.
 */
export async function letterByCheck(actor: Actor, number: string, check: string): Promise<string> {
  const digits = check.replace(/[\s-]/g, '').toLowerCase();
  if (!/^[0-9a-f]{8,64}$/.test(digits)) throw notFound();
  const { db } = await app();
  const [found] = await db.read<Pick<BookRow, 'bookKind' | 'shopId'> & { letter: string }>(
    `SELECT p.bookKind, p.shopId, r.letter FROM procedures p JOIN revisions r ON r.procedureId = p.id AND r.letter IS NOT NULL
     WHERE p.number = :number AND r.hash >= :digits AND r.hash < :digits || 'g'
     ORDER BY length(r.letter) DESC, r.letter DESC LIMIT 1`,
    { number, digits },
  );
  return readable(actor, found).letter;
}
