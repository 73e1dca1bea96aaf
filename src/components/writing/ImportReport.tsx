import type { ReactNode } from 'react';
import { LeftOutTable } from '@/components/sheet/LeftOutTable';
import { counted } from '@/components/sheet/words';
import { Button } from '@/components/ui/Button';
import { ButtonLink } from '@/components/ui/ButtonLink';
import { Field } from '@/components/ui/Field';
import { Notice } from '@/components/ui/Notice';
import { Cell, Row, Table } from '@/components/ui/Table';
import type { ImportedSheet } from '@/domain/api/schemas/imports';
import { FILL_IN } from '@/domain/procedure/fillIn';
import { listed } from '@/domain/wording';

const LIST_WORDS = { torques: 'Torques', limits: 'Limits', timers: 'Timers' } as const;

const Section = ({ title, children }: { title: string; children: ReactNode }) => (
  <section className="px-5 py-6 sm:px-9">
    <h2 className="mb-3 text-lead">{title}</h2>
    {children}
  </section>
);

function Steps({ steps }: Pick<ImportedSheet, 'steps'>) {
  return (
    <ol className="list-decimal pl-7">
      {steps.map(({ id, title, cautions }) => (
        <li key={id} className="py-1 marker:text-ink-2">
          <span className={title.startsWith(FILL_IN) ? 'text-ink-2' : 'font-serif'}>{title}</span>
          {cautions > 0 && <span className="text-small text-ink-2">, {counted(cautions, 'caution')} before it</span>}
        </li>
      ))}
    </ol>
  );
}

function Cautions({ cautions }: Pick<ImportedSheet, 'cautions'>) {
  return (
    <Table
      caption="Cautions found"
      columns={[
        { key: 'signal', label: 'Signal word' },
        { key: 'hazard', label: 'What hurts' },
        { key: 'harm', label: 'What it does' },
        { key: 'avoid', label: 'How to avoid it' },
        { key: 'steps', label: 'Before step' },
      ]}
    >
      {cautions.map(({ signal, hazard, harm, avoid, steps }) => (
        <Row key={`${signal} ${hazard} ${avoid}`}>
          <Cell label="Signal word">
            <b className="font-semibold">{signal}</b>
          </Cell>
          <Cell label="What hurts">{hazard}</Cell>
          <Cell label="What it does">{harm}</Cell>
          <Cell label="How to avoid it">{avoid}</Cell>
          <Cell label="Before step">{listed(steps)}</Cell>
        </Row>
      ))}
    </Table>
  );
}

function Figures({ figures }: Pick<ImportedSheet, 'figures'>) {
  return (
    <Table
      caption="Numbers to make into values"
      columns={[
        { key: 'text', label: 'Number' },
        { key: 'step', label: 'Step' },
        { key: 'quote', label: 'Sentence' },
        { key: 'list', label: 'Belongs under' },
      ]}
    >
      {figures.map(({ text, step, quote, list }, i) => (
        <Row key={`${i} ${text}`}>
          <Cell label="Number">
            <b className="whitespace-nowrap font-semibold">{text}</b>
          </Cell>
          <Cell label="Step">{step}</Cell>
          <Cell label="Sentence">{quote}</Cell>
          <Cell label="Belongs under">{LIST_WORDS[list]}</Cell>
        </Row>
      ))}
    </Table>
  );
}

/** What a document holds and what a sheet cannot hold of it, before anything is stored. */
export function ImportReport({
  imported,
  name,
  title,
  book,
  error,
}: {
  imported: Pick<ImportedSheet, 'source' | 'leftOut'> & Partial<ImportedSheet>;
  /** Name of the file; empty where a text was pasted. */
  name: string;
  title: string;
  book: { book: string; name: string };
  error: string | null;
}) {
  const { source, leftOut, steps = [], cautions = [], figures = [] } = imported;
  return (
    <form method="post" className="leaf framed-sections max-w-[64rem] sm:mx-auto">
      <div className="px-5 py-6 sm:px-9">
        <p className="text-small text-ink-2">{name ? `Read from “${name}”` : 'Read from the text that you pasted'}</p>
        <h1 className="mt-1 text-title">What was found</h1>
        <p className="mt-2 max-w-prose text-ink-2">
          Nothing is stored yet. Look through it, then start the draft; you write on it at the desk.
        </p>
      </div>
      {steps.length > 0 && (
        <Section title={counted(steps.length, 'step')}>
          <Steps steps={steps} />
        </Section>
      )}
      {cautions.length > 0 && (
        <Section title={counted(cautions.length, 'caution')}>
          <Cautions cautions={cautions} />
        </Section>
      )}
      {figures.length > 0 && (
        <Section title={`${counted(figures.length, 'number')} to make into values`}>
          <p className="mb-3 max-w-prose">
            They stand in the words of the draft as they are. Nobody has checked them: enter each by hand, with its
            condition and its source, where hands act on it.
          </p>
          <Figures figures={figures} />
        </Section>
      )}
      <Section title={leftOut.length > 0 ? 'Not as it was in the document' : 'Everything was taken over'}>
        {leftOut.length > 0 ? (
          <>
            <p className="mb-3 max-w-prose">This list stays with the draft, for you and for whoever reviews it.</p>
            <LeftOutTable leftOut={leftOut} />
          </>
        ) : (
          <p>Every word of the document stands in the draft.</p>
        )}
      </Section>
      <div className="flex flex-col gap-5 px-5 py-6 sm:px-9">
        {error && (
          <Notice live="alert" title="Not started">
            <p>{error}</p>
          </Notice>
        )}
        <Field
          label="Which task?"
          hint="As somebody would ask for it: Replace the thermostat."
          name="title"
          defaultValue={title.startsWith(FILL_IN) ? '' : title}
          maxLength={90}
          autoComplete="off"
        />
        <p className="text-ink-2">{book.name}</p>
        <input type="hidden" name="book" value={book.book} />
        <input type="hidden" name="name" value={name} />
        <input type="hidden" name="source" value={source} />
        <input type="hidden" name="leftOut" value={JSON.stringify(leftOut)} />
        <div className="flex flex-wrap gap-3">
          <Button type="submit" name="act" value="start-read" kind="main">
            Start the draft
          </Button>
          <ButtonLink href="/procedures/new?from=import">Choose another document</ButtonLink>
        </div>
      </div>
    </form>
  );
}
