import type { Sheet as SheetData } from '@/domain/api/schemas/book';
import { dayOf } from '@/components/ui/day';
import { Actions, FlagStep, ProposeStep } from './Actions';
import type { EngineName } from './engineNames';
import { namesOf } from './engineNames';
import { factsOf } from './facts';
import { Sheet } from './Sheet';

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
  units,
}: {
  sheet: SheetData;
  /** Every engine the network knows. */
  engines: readonly EngineName[];
  mayPropose: boolean;
  units: 'metric' | 'inch';
}) {
  const current = sheet.revision.letter === sheet.current.letter;
  const propose = mayPropose && current;
  return (
    <Sheet
      procedure={sheet}
      facts={factsOf(sheet)}
      engines={namesOf(sheet.frontmatter.engines, engines)}
      notice={current ? undefined : <Superseded sheet={sheet} />}
      actions={<Actions number={sheet.number} propose={propose} units={units} openProposals={sheet.openProposals} />}
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
  );
}
