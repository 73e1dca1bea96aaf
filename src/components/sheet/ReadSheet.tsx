import type { Sheet as SheetData } from '@/domain/api/schemas/book';
import type { Bulletin } from '@/domain/api/schemas/bulletins';
import { dayOf } from '@/components/ui/day';
import { Actions, FlagStep, ProposeStep } from './Actions';
import { BulletinBar } from './BulletinBar';
import { bulletinTitle } from './bulletinWords';
import type { EngineName } from './engineNames';
import { namesOf } from './engineNames';
import { factsOf } from './facts';
import { ReadThis } from './ReadThis';
import { Sheet } from './Sheet';
import { WithdrawalDialog, WithdrawalLink } from './WithdrawalDialog';
import { Withdrawn } from './Withdrawn';

/** A revision that is no longer the one to work from. Stands on paper too. */
const Superseded = ({ sheet }: { sheet: SheetData }) => (
  <div className="border-l-[14px] border-ink bg-white px-5 py-4 sm:px-8" role="note">
    <p className="font-serif text-lead font-bold">Do not work from this sheet</p>
    <p className="mt-1 text-[1.0625rem]">
      Revision {sheet.revision.letter} is superseded. Revision {sheet.current.letter}, published on{' '}
      {dayOf(sheet.current.publishedAt)}, is the one to work from.{' '}
      <a href={`/procedures/${sheet.number}`} className="font-semibold">
        Go to revision {sheet.current.letter}
      </a>{' '}
      or{' '}
      <a href={`/procedures/${sheet.number}/compare?from=${sheet.revision.letter}&to=${sheet.current.letter}`}>
        see what changed
      </a>
      .
    </p>
  </div>
);

/** A published sheet as a page shows it: a pure function of the sheet and of what its reader may do. */
export function ReadSheet({
  sheet,
  engines,
  mayPropose,
  mayWithdraw = false,
  bulletins = [],
  units,
}: {
  sheet: SheetData;
  /** Every engine the network knows. */
  engines: readonly EngineName[];
  mayPropose: boolean;
  /** The person may withdraw it and bring it back. */
  mayWithdraw?: boolean;
  /** What the person has still to sign of this procedure. */
  bulletins?: readonly Bulletin[];
  units: 'metric' | 'inch';
}) {
  const { number, withdrawn } = sheet;
  const here = `/procedures/${number}`;
  const current = sheet.revision.letter === sheet.current.letter;
  const propose = mayPropose && current;
  const act = withdrawn ? 'bringBack' : 'withdraw';
  // The words of a withdrawal stand above the sheet already; there it is signed too.
  const [toldAbove] = withdrawn ? bulletins.filter(({ kind }) => kind === 'withdrawn') : [];
  const acts = (
    <>
      {toldAbove && <ReadThis bulletin={toldAbove.id} back={here} about={bulletinTitle(toldAbove)} />}
      {mayWithdraw && <WithdrawalLink act="bringBack" number={number} />}
    </>
  );
  return (
    <>
      <Sheet
        procedure={sheet}
        facts={factsOf(sheet)}
        engines={namesOf(sheet.frontmatter.engines, engines)}
        notice={
          withdrawn ? (
            <Withdrawn withdrawn={withdrawn} acts={toldAbove || mayWithdraw ? acts : undefined} />
          ) : current ? undefined : (
            <Superseded sheet={sheet} />
          )
        }
        actions={
          <Actions
            number={number}
            propose={propose}
            withdraw={mayWithdraw && current && !withdrawn}
            units={units}
            openProposals={sheet.openProposals}
          />
        }
        bulletins={<BulletinBar bulletins={bulletins.filter((one) => one !== toldAbove)} back={here} />}
        stepAct={
          current
            ? (step) => (
                <>
                  {propose && <ProposeStep step={step.id} number={step.number} />}
                  <FlagStep sheet={sheet.number} step={step.id} number={step.number} />
                </>
              )
            : undefined
        }
      />
      {mayWithdraw && current && !withdrawn && (
        <p className="mt-5 text-right sm:hidden print:hidden">
          <WithdrawalLink act="withdraw" number={number} />
        </p>
      )}
      {current && (
        <p className="mt-4 text-small text-ink-2 max-sm:px-1 print:hidden">
          For a documentation system elsewhere:{' '}
          <a href={`${here}/task.dita`} download>
            this sheet as a DITA 1.2 task
          </a>
        </p>
      )}
      {mayWithdraw && <WithdrawalDialog act={act} number={number} />}
    </>
  );
}
