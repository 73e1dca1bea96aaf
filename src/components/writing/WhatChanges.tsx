import type { Comparison, WordRun } from '@/domain/revision/types';
import { Words } from './Words';

const isChanged = (runs: readonly WordRun[]) => runs.some((run) => run.kind !== 'same');

function Values({ values }: { values: Comparison['values'] }) {
  return (
    <table className="w-full border-collapse border-frame border-ink bg-white text-left">
      <caption className="sr-only">Values that change</caption>
      <thead>
        <tr className="text-small text-ink-2">
          <th scope="col" className="px-3 py-1.5 font-normal">
            Value
          </th>
          <th scope="col" className="px-3 py-1.5 font-normal">
            Was
          </th>
          <th scope="col" className="px-3 py-1.5 font-normal">
            Becomes
          </th>
        </tr>
      </thead>
      <tbody>
        {values.map((value) => (
          <tr key={value.path} className="border-t border-hair align-top">
            <th scope="row" className="px-3 py-2 font-normal">
              {value.label}
              {value.detail && <span className="block text-small text-ink-2">{value.detail}</span>}
            </th>
            <td className="px-3 py-2">
              {value.from === null ? 'nothing' : <del className="removed">{value.from}</del>}
            </td>
            <td className="px-3 py-2 font-semibold">
              {value.to ?? 'taken away'}
              {value.percent !== null && (
                <span className="ml-2 font-normal text-ink-2">
                  {value.percent > 0 ? '+' : '−'}
                  {Math.abs(value.percent)} %
                </span>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const STEP_WORDS = { added: 'New', removed: 'Taken away', edited: 'Edited', same: 'The same words' } as const;

/** What the draft changes against its base, in place: values first, then the words of each step. */
export function WhatChanges({
  changes,
  old,
  id,
  base,
}: {
  changes: Comparison | undefined;
  /** It is of an earlier text, because a value of this one cannot be read. */
  old: boolean;
  id: string;
  base: string | null;
}) {
  const steps = changes?.steps.filter((step) => step.kind !== 'same' || step.moved) ?? [];
  return (
    <div className="flex flex-col gap-5">
      <div>
        <h2 className="text-lead">{base ? `What changes from revision ${base}` : 'What the new sheet holds'}</h2>
        <p className="mt-1 text-ink-2">
          <a href={`/proposals/${id}`}>Open it as the editor will see it</a>
        </p>
      </div>
      {changes && old && (
        <p className="heavy-edge px-4 py-2.5">As it was before what is to mend. The check says what that is.</p>
      )}
      {!changes && <p>This shows once every value can be read; the check says what is to mend.</p>}
      {changes?.identical && <p>Nothing differs yet. Change a step or a value, then look here again.</p>}
      {changes && changes.values.length > 0 && <Values values={changes.values} />}
      {changes && isChanged(changes.intro) && (
        <section>
          <h3 className="text-[1rem]">Introduction</h3>
          <p className="mt-1 max-w-prose whitespace-pre-line font-serif text-prose">
            <Words runs={changes.intro} />
          </p>
        </section>
      )}
      {steps.map((step) => (
        <section key={step.id} className="border-l-[5px] border-petrol pl-4">
          <h3 className="text-[1rem]">
            <Words runs={step.title} />
          </h3>
          <p className="text-small text-ink-2">
            {[
              STEP_WORDS[step.kind],
              step.moved && step.kind !== 'removed' && `moved from ${step.fromNumber} to ${step.toNumber}`,
              step.kind === 'added' && `step ${step.toNumber}`,
              step.kind === 'removed' && `was step ${step.fromNumber}`,
            ]
              .filter(Boolean)
              .join(', ')}
          </p>
          {isChanged(step.body) && (
            <p className="mt-1 max-w-prose whitespace-pre-line font-serif text-prose">
              <Words runs={step.body} />
            </p>
          )}
        </section>
      ))}
    </div>
  );
}
