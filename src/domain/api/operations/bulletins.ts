import { z } from 'zod';
import { operation } from '../operation';
import { Sheet } from '../schemas/book';
import { Bulletin, GiveWithdrawalReason } from '../schemas/bulletins';
import { Id, ListQuery, pageOf, ProcedureNumber } from '../schemas/common';

const OfProcedure = z.object({ number: ProcedureNumber });

export const withdrawProcedure = operation({
  id: 'withdrawProcedure',
  method: 'post',
  path: '/procedures/{number}/withdraw',
  area: 'Book',
  summary: 'Withdraw a published procedure: nobody works from it until it is brought back',
  description:
    'For an editor of its book. The same call by the same person answers the same and does nothing; one that comes after another withdrawal is a 409.',
  params: OfProcedure,
  body: GiveWithdrawalReason,
  reply: Sheet,
  refuses: [409],
});

export const bringBackProcedure = operation({
  id: 'bringBackProcedure',
  method: 'post',
  path: '/procedures/{number}/bring-back',
  area: 'Book',
  summary: 'Bring a withdrawn procedure back into use',
  description: 'For an editor of its book. Repeated like withdrawing.',
  params: OfProcedure,
  body: GiveWithdrawalReason,
  reply: Sheet,
  refuses: [409],
});

export const listBulletins = operation({
  id: 'listBulletins',
  method: 'get',
  path: '/bulletins',
  area: 'Book',
  summary:
    'Withdrawals and critical changes in the books that I may read; those that I have to sign first, then the latest',
  query: ListQuery,
  reply: pageOf(Bulletin),
});

export const readAndSign = operation({
  id: 'readAndSign',
  method: 'post',
  path: '/read-and-sign/{revision}',
  area: 'Book',
  summary: 'Say that I have read a critical change, a withdrawal or a bringing back',
  description:
    'Takes the id of the revision that brought the change, or the id of any bulletin. Signed once: a second call answers the first signature.',
  params: z.object({ revision: Id.describe('Id of a revision with a critical change, or of a bulletin') }),
  reply: Bulletin,
});
