import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import type { WithdrawalAct } from '@/domain/bulletins/withdrawal';
import { WITHDRAWAL_WORDS, WithdrawalForm } from './WithdrawalForm';

const DIALOG = 'withdrawal';

/** Opens the dialog of the sheet; without a script it goes to a page with the same form. */
export const WithdrawalLink = ({
  act,
  number,
  className,
}: {
  act: WithdrawalAct;
  number: string;
  className?: string;
}) => (
  <ButtonLink
    href={`/procedures/${number}/${WITHDRAWAL_WORDS[act].path}`}
    data-opens={DIALOG}
    {...(className === undefined ? {} : { className })}
  >
    {WITHDRAWAL_WORDS[act].button}
  </ButtonLink>
);

/** The question on the sheet itself, in the browser's own dialog; `sheetScript.ts` opens and closes it. */
export const WithdrawalDialog = ({ act, number }: { act: WithdrawalAct; number: string }) => (
  <dialog
    id={DIALOG}
    aria-labelledby={`${DIALOG}-title`}
    className="frame m-auto max-h-[90vh] w-[min(38rem,calc(100vw-2rem))] overflow-auto p-0 text-ink backdrop:bg-pit/60"
  >
    <div className="framed-sections">
      <h2 id={`${DIALOG}-title`} className="px-5 py-4 text-lead sm:px-6">
        {WITHDRAWAL_WORDS[act].title}
      </h2>
      <WithdrawalForm act={act} number={number} cancel={<Button data-closes={DIALOG}>Not now</Button>} />
    </div>
  </dialog>
);
