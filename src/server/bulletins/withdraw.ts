import type { Sheet } from '@/domain/api/schemas/book';
import type { BulletinKind } from '@/domain/bulletins/bulletin';
import { decideWithdrawal, type LastAct, type WithdrawalAct } from '@/domain/bulletins/withdrawal';
import type { Actor } from '@/domain/people/may';
import { appendAudit } from '../audit/append';
import { bookOf, type BookRow } from '../book/columns';
import { markWithdrawn } from '../book/indexRevision';
import { readable } from '../book/locate';
import { readSheet } from '../book/sheet';
import { now } from '../clock';
import { app } from '../context';
import { refusalOf } from '../refusal';
import { writeBulletin } from './write';

interface Standing extends Pick<BookRow, 'bookKind' | 'shopId'> {
  id: string;
  revisionId: string | null;
  withdrawnAt: string | null;
  last: string | null;
}

async function standingOf(actor: Actor, number: string) {
  const { db } = await app();
  const [found] = await db.read<Standing>(
    `SELECT p.id, p.bookKind, p.shopId, p.currentRevisionId AS revisionId, p.withdrawnAt,
       (SELECT json_object('act', iif(b.kind = 'withdrawn', 'withdraw', 'bringBack'), 'personId', b.byId,
          'reason', json_extract(b.words, '$[0]'))
        FROM bulletins b WHERE b.procedureId = p.id AND b.kind <> 'critical change' ORDER BY b.rowid DESC LIMIT 1) AS last
     FROM procedures p WHERE p.number = :number`,
    { number },
  );
  const row = readable(actor, found);
  return { ...row, last: row.last === null ? null : (JSON.parse(row.last) as LastAct) };
}

const DONE = {
  withdraw: { kind: 'withdrawn', act: 'procedure.withdrawn' },
  bringBack: { kind: 'brought back', act: 'procedure.brought-back' },
} as const satisfies Record<WithdrawalAct, { kind: BulletinKind; act: string }>;

async function act(what: WithdrawalAct, actor: Actor, number: string, given: string): Promise<Sheet> {
  const { db } = await app();
  await db.write(async () => {
    const { id, revisionId, shopId, withdrawnAt, last, ...row } = await standingOf(actor, number);
    const facts = { number, book: bookOf({ ...row, shopId }), published: revisionId !== null, last };
    const decided = decideWithdrawal(what, actor, { ...facts, withdrawn: withdrawnAt !== null }, given);
    if (!decided.ok) throw refusalOf(decided, 'reason');
    // Without a published revision the rules have said no; this is for the compiler.
    if (decided.done || revisionId === null) return;
    const { reason } = decided;
    const { kind, act: name } = DONE[what];
    const at = now();
    await writeBulletin(kind, [reason], { procedureId: id, shopId, revisionId, byId: actor.personId }, at);
    await db.models.Procedure.update({ withdrawnAt: what === 'withdraw' ? at : null }, { where: { id } });
    await markWithdrawn(id, what === 'withdraw');
    const subject = { type: 'procedure', id } as const;
    await appendAudit({ actorId: actor.personId, act: name, subject, shopId, detail: { number, reason } });
  });
  return readSheet(actor, number);
}

/**
 * Takes a published procedure out of use, with a bulletin to everybody who reads its book; all of it is stored or nothing
 * is. Pressed twice it is done once; of two editors who do it at once, one gets 409. Refuses 404, 403, 409, 422.
 */
export const withdraw = (actor: Actor, number: string, reason: string) => act('withdraw', actor, number, reason);

/** Brings a withdrawn procedure back, in the same way. */
export const bringBack = (actor: Actor, number: string, reason: string) => act('bringBack', actor, number, reason);
