import { Button } from '@/components/ui/Button';
import { UnitsSwitch } from './UnitsSwitch';
import { WithdrawalLink } from './WithdrawalDialog';
import { counted } from './words';

/** Id of the form that starts a proposal; a step's own button submits it with `step`. */
export const PROPOSE_FORM = 'propose';

/** What can be done with a sheet. A bar under the head; on a phone it stays at the bottom of the screen. */
export function Actions({
  number,
  propose,
  withdraw = false,
  units,
  openProposals = 0,
}: {
  number: string;
  /** The person may propose a change. */
  propose: boolean;
  /** The person may withdraw the sheet. On a phone that stands below the sheet. */
  withdraw?: boolean;
  units: 'metric' | 'inch';
  openProposals?: number;
}) {
  return (
    <div className="actions-bar print:hidden">
      {propose && (
        <form id={PROPOSE_FORM} method="post" action={`/procedures/${number}/propose`} className="max-sm:flex-1">
          <Button type="submit" kind="main" className="max-sm:w-full max-sm:px-2">
            Propose a change
          </Button>
        </form>
      )}
      <Button data-print data-needs-script="" className="max-sm:px-3 max-[379px]:hidden">
        <span>
          Print<span className="max-sm:sr-only"> the sheet</span>
        </span>
      </Button>
      {withdraw && <WithdrawalLink act="withdraw" number={number} className="max-sm:hidden" />}
      {openProposals > 0 && (
        <p className="text-ink-2 max-sm:hidden">{counted(openProposals, 'proposed change')} waiting for review</p>
      )}
      <div className="sm:ml-auto">
        <UnitsSwitch units={units} back={`/procedures/${number}`} />
      </div>
    </div>
  );
}

/** Starts a proposal at one step. Belongs to the form in `Actions`. */
export const ProposeStep = ({ step, number }: { step: string; number: number }) => (
  <Button
    type="submit"
    form={PROPOSE_FORM}
    name="step"
    value={step}
    kind="quiet"
    className="propose-step text-small font-medium print:hidden"
    aria-label={`Change step ${number}`}
  >
    Change
  </Button>
);

/** Raises a flag at one step: for everybody who reads the sheet. */
export const FlagStep = ({ sheet, step, number }: { sheet: string; step: string; number: number }) => (
  <a
    href={`/procedures/${sheet}/flag?step=${encodeURIComponent(step)}`}
    className="propose-step inline-flex min-h-touch items-center text-small font-medium print:hidden"
    aria-label={`Flag step ${number}`}
  >
    Flag
  </a>
);
