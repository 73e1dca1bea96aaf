import type { ReactNode } from 'react';
import type { BothUnits } from '@/domain/measure/format';
import { VERDICT_WORDS, type Outcome, type Result, type Verdict } from '@/domain/worksheets/outcome';
import { classes } from '@/components/ui/classes';
import type { Units } from './asked';

/** Out of limits is told by words, weight, hatching and a heavy edge; the signal colours belong to cautions alone. */
const EDGE: Record<Verdict, string> = {
  fail: 'border-l-[14px] border-ink pl-7 work-hatch',
  look: 'border-l-[8px] border-ink pl-4',
  pass: 'border-l-[8px] border-petrol pl-4',
  none: '',
};

const In = ({ both, units }: { both: BothUnits; units: Units }) => <>{both[units]}</>;

export const VerdictMark = ({ verdict }: { verdict: Verdict }) => (
  <span className={classes(verdict === 'fail' && 'font-semibold', verdict === 'look' && 'font-medium')}>
    {VERDICT_WORDS[verdict]}
  </span>
);

function Main({ result, units }: { result: Result; units: Units }) {
  // One number with its unit stands largest; a list of them, or words, reads better in one size.
  const [, number = '', rest = ''] = /^(−?[\d.\u202f]+)(\D*)$/s.exec(result.text[units]) ?? [];
  return (
    <div>
      <dt className="leading-snug">{result.label}</dt>
      <dd className="text-value font-semibold">
        {number || <span className="text-title">{result.text[units]}</span>}
        <span className="text-lead font-medium">{rest}</span>
      </dd>
    </div>
  );
}

/** The verdict, why, and the numbers that people came for. `live` while somebody types. */
export function Answer({ outcome, units }: { outcome: Outcome; units: Units }) {
  const main = outcome.results.filter((result) => result.main);
  return (
    <div className={classes(outcome.verdict !== 'none' && 'py-1', EDGE[outcome.verdict])}>
      {outcome.verdict !== 'none' && <p className="text-lead font-semibold">{VERDICT_WORDS[outcome.verdict]}</p>}
      {main.length > 0 && (
        <dl className="mt-1 flex flex-wrap gap-x-8 gap-y-3">
          {main.map((result) => (
            <Main key={result.key} result={result} units={units} />
          ))}
        </dl>
      )}
      <div className="mt-2 flex max-w-prose flex-col gap-1.5">
        {outcome.reasons.map((reason, i) => (
          <p key={i} className={classes('leading-snug', i === 0 && 'font-medium')}>
            <In both={reason} units={units} />
          </p>
        ))}
      </div>
    </div>
  );
}

/** `F_p` as F with a low p. */
const withSubscripts = (text: string) =>
  text.split(/_(\p{L}+|\d+)/u).map((part, i) => (i % 2 ? <sub key={i}>{part}</sub> : part));

const Formula = ({ result, units }: { result: Result; units: Units }): ReactNode =>
  result.formula ? (
    <p className="font-serif text-[0.9375rem] italic leading-relaxed">{withSubscripts(result.formula[units])}</p>
  ) : null;

/** Every number, with the formula that it comes from and where that comes from. */
export function Working({ outcome, units }: { outcome: Outcome; units: Units }) {
  const judged = outcome.results.some(({ verdict }) => verdict !== undefined);
  const sources = [...new Set(outcome.results.flatMap(({ source }) => (source ? [source] : [])))];
  return (
    <>
      <table className="w-full border-collapse text-left">
        <caption className="sr-only">All results</caption>
        <thead>
          <tr className="border-b-frame border-ink text-small text-ink-2">
            <th scope="col" className="py-1 pr-3 font-medium">
              Result
            </th>
            <th scope="col" className="px-3 py-1 text-right font-medium">
              Value
            </th>
            {judged && (
              <th scope="col" className="py-1 pl-3 font-medium">
                Verdict
              </th>
            )}
          </tr>
        </thead>
        <tbody>
          {outcome.results.map((result) => (
            <tr key={result.key} className="border-b border-hair align-top last:border-0">
              <th scope="row" className="py-2 pr-3 font-normal leading-snug">
                {result.label}
                <Formula result={result} units={units} />
              </th>
              <td className="whitespace-nowrap px-3 py-2 text-right font-semibold">
                <In both={result.text} units={units} />
              </td>
              {judged && (
                <td className="whitespace-nowrap py-2 pl-3">
                  {result.verdict && <VerdictMark verdict={result.verdict} />}
                </td>
              )}
            </tr>
          ))}
        </tbody>
      </table>
      {sources.length > 0 && (
        <div className="mt-3 text-small text-ink-2">
          {sources.map((source) => (
            <p key={source}>{source}</p>
          ))}
        </div>
      )}
    </>
  );
}
