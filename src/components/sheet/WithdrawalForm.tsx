import type { ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { Notice } from '@/components/ui/Notice';
import { TextArea } from '@/components/ui/TextArea';
import type { WithdrawalAct } from '@/domain/bulletins/withdrawal';

/** Its page is `/procedures/{number}/{path}`; a dialog on the sheet has the same form. */
export const WITHDRAWAL_WORDS = {
  withdraw: {
    path: 'withdraw',
    button: 'Withdraw',
    title: 'Withdraw this sheet',
    what: 'Nobody works from it until it is brought back: the sheet says so in its largest words, open ones within a minute, and everybody who reads this book has a bulletin to sign. Proposals on it wait.',
    label: 'Why nobody may work from it',
    hint: 'Say what is wrong, and what to do instead.',
  },
  bringBack: {
    path: 'bring-back',
    button: 'Bring back',
    title: 'Bring this sheet back',
    what: 'The revision that was published stands again as it was. Everybody who reads this book has a bulletin to sign.',
    label: 'Why it may be worked from again',
    hint: 'Say what was found, and who looked.',
  },
} as const satisfies Record<WithdrawalAct, Record<string, string>>;

/** Asks for the reason of a withdrawal or of a bringing back. A plain form. */
export function WithdrawalForm({
  act,
  number,
  typed = '',
  error,
  refused,
  cancel,
}: {
  act: WithdrawalAct;
  number: string;
  typed?: string;
  /** What is wrong with the reason. */
  error?: string | undefined;
  /** Why it was not done. */
  refused?: string | undefined;
  /** Goes back without doing it; where it is left out, a link to the sheet does. */
  cancel?: ReactNode;
}) {
  const { path, button, what, label, hint } = WITHDRAWAL_WORDS[act];
  return (
    <form method="post" action={`/procedures/${number}/${path}`} className="flex flex-col gap-4 px-5 py-5 sm:px-6">
      {refused && (
        <Notice live="alert" title="Nothing was changed">
          {refused}
        </Notice>
      )}
      <p className="max-w-prose">{what}</p>
      <TextArea
        name="reason"
        label={label}
        hint={hint}
        error={error}
        defaultValue={typed}
        maxLength={2000}
        required
        fieldClass="max-w-[46rem]"
      />
      <div className="flex flex-wrap gap-2.5">
        <Button type="submit" kind="main">
          {button}
        </Button>
        {cancel ?? <ButtonLink href={`/procedures/${number}`}>Not now</ButtonLink>}
      </div>
    </form>
  );
}
