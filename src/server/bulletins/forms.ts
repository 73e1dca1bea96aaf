import type { Bulletin } from '@/domain/api/schemas/bulletins';
import type { WithdrawalAct } from '@/domain/bulletins/withdrawal';
import type { Actor } from '@/domain/people/may';
import { returnPath } from '../accounts/returnPath';
import { textOf } from '../http/form';
import { malformed, Refusal } from '../refusal';
import { readAndSign } from './sign';
import { bringBack, withdraw } from './withdraw';

/** What the form of a withdrawal came to. Where it was refused, what was typed comes back. */
export type WithdrawalOutcome =
  { kind: 'done' } | { kind: 'refused'; status: number; typed: string; error?: string; refused?: string };

/** Acts on the form of a withdrawal or a bringing back. Refusals that can be mended come back as words; others are thrown. */
export async function actOnWithdrawalForm(
  what: WithdrawalAct,
  actor: Actor,
  number: string,
  form: FormData,
): Promise<WithdrawalOutcome> {
  const typed = textOf(form, 'reason');
  if (typed.length > 2000)
    return { kind: 'refused', status: 422, typed, error: 'The reason must be 2000 characters or fewer.' };
  try {
    await (what === 'withdraw' ? withdraw : bringBack)(actor, number, typed);
    return { kind: 'done' };
  } catch (error) {
    if (!(error instanceof Refusal) || ![409, 422].includes(error.status)) throw error;
    const { status, detail } = error;
    return { kind: 'refused', status, typed, ...(status === 422 ? { error: detail } : { refused: detail }) };
  }
}

/** Signs the bulletin that a form names; answers it, and where to go on. Refuses 400 a form without one, 404 an unseen one. */
export async function actOnReadForm(actor: Actor, form: FormData): Promise<{ signed: Bulletin; back: string }> {
  if (!form.has('bulletin')) throw malformed('The form came without its bulletin. Go back and send it again.');
  const back = form.has('back') ? textOf(form, 'back') : '/bulletins';
  return { signed: await readAndSign(actor, textOf(form, 'bulletin')), back: returnPath(back) };
}
