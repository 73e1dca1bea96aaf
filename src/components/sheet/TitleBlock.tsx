import type { ReactNode } from 'react';
import { classes } from '@/components/ui/classes';
import { spacedCheck } from './words';

/** What a sheet is identified by. Texts are ready to show; a revision on its way has no letter yet. */
export interface TitleBlockFacts {
  number: string;
  letter: string | null;
  /** Beside the letter: "current", "superseded", "withdrawn", "proposal". */
  standing: string;
  /** "14 Nov 2026", or "Not published". */
  published: string;
  writtenBy: string;
  reviewedBy: string;
  sheetCheck: string;
  /** "23 jobs, 3 shops"; left out until a job card was closed on this revision. */
  proven?: string;
  /** "Two earlier revisions" and where they are listed; and where it stands what each part of the sheet comes from. */
  history?: { href: string; text: string; origins?: string };
}

const Fact = ({ name, className, children }: { name: string; className?: string; children: ReactNode }) => (
  <div className={classes('border-b border-r border-rule px-3 py-2', className)}>
    <dt className="text-[0.8125rem] leading-tight text-ink-2">{name}</dt>
    <dd className="text-[1.0625rem] font-semibold leading-snug">{children}</dd>
  </div>
);

/** The corner of the drawing: which sheet this is, and who answers for it. */
export function TitleBlock({ facts }: { facts: TitleBlockFacts }) {
  return (
    <dl className="grid h-full auto-rows-[minmax(3.6rem,auto)] grid-cols-3 [&>*:nth-child(3n)]:border-r-0 [&>*:nth-last-child(-n+2)]:border-b-0">
      <Fact name="Number">{facts.number}</Fact>
      <Fact name="Revision">
        {facts.letter && (
          <span className="mr-1.5 font-serif text-[1.75rem] font-bold leading-none">{facts.letter}</span>
        )}
        <span data-standing className="inline-block text-small font-medium text-ink-2">
          {facts.standing}
        </span>
      </Fact>
      <Fact name="Published">{facts.published}</Fact>
      <Fact name="Written by">{facts.writtenBy}</Fact>
      <Fact name="Reviewed by">{facts.reviewedBy}</Fact>
      <Fact name="Proven">{facts.proven ?? 'Not yet'}</Fact>
      <Fact name="Sheet check" className="tracking-wide">
        {spacedCheck(facts.sheetCheck)}
      </Fact>
      <Fact name="History" className="col-span-2 border-r-0">
        {facts.history ? <a href={facts.history.href}>{facts.history.text}</a> : 'None yet'}
        {facts.history?.origins && (
          <>
            ,{' '}
            <a href={facts.history.origins} className="whitespace-nowrap">
              where it comes from
            </a>
          </>
        )}
      </Fact>
    </dl>
  );
}

/** The same facts as one strip, repeated at the head of every printed page. */
export const RunningHead = ({ facts, title }: { facts: TitleBlockFacts; title: string }) => (
  <div className="running-head" aria-hidden="true">
    <div className="running-strip">
      <p className="running-title">
        <span data-strip-name={facts.standing}>
          {facts.standing === 'withdrawn' ? 'Withdrawn. Do not work from this sheet.' : 'Matchmark'}
        </span>
        {title}
      </p>
      {(
        [
          ['Number', facts.number],
          [
            'Revision',
            <b key="letter" className="font-semibold" data-strip-revision>
              {facts.standing === 'current' ? facts.letter : [facts.letter, facts.standing].filter(Boolean).join(', ')}
            </b>,
          ],
          ['Published', facts.published],
          ['Written by', facts.writtenBy],
          ['Reviewed by', facts.reviewedBy],
          ['Sheet check', spacedCheck(facts.sheetCheck)],
        ] as const
      ).map(([name, value]) => (
        <p key={name}>
          <span>{name}</span>
          {value}
        </p>
      ))}
    </div>
  </div>
);
