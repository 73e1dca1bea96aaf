import type { Worksheet as Described } from '@/domain/worksheets/worksheet';
import { VERDICT_WORDS } from '@/domain/worksheets/outcome';
import type { ShopRules } from '@/domain/worksheets/readInputs';
import { Answer, Working } from './Answer';
import { Charts } from './charts/Charts';
import { Input, type BoxAt } from './Inputs';
import type { Case } from './useCase';

/** What keeps an answer from being worked out: boxes still empty, and what is said of none of the boxes. */
function Waiting({ worksheet, now }: { worksheet: Described; now: Case }) {
  const open = [...now.problems].filter(([path]) => (now.typed[path] ?? '').trim() === '');
  const wrong = now.problems.size - open.length;
  if (now.blank) return <p className="max-w-[34ch] text-ink-2">{worksheet.summary} Fill in what you have measured.</p>;
  return (
    <div className="flex flex-col gap-1.5 leading-snug">
      {wrong > 0 && (
        <p className="font-medium">{wrong === 1 ? 'One entry' : `${wrong} entries`} cannot be used; see beside it.</p>
      )}
      {open.slice(0, 6).map(([path, message]) => (
        <p key={path} className="text-ink-2">
          {message}
        </p>
      ))}
      {open.length > 6 && <p className="text-ink-2">And {open.length - 6} more.</p>}
    </div>
  );
}

/**
 * Where the answer stands below the boxes, its gist stays in sight over them. It lets every press through to the box
 * that it covers, and is silent: the answer itself is read out.
 */
function Peek({ now: { outcome, units } }: { now: Case }) {
  if (!outcome.ok) return null;
  const { verdict, results } = outcome.value;
  const first = results.find(({ main }) => main);
  if (verdict === 'none' && !first) return null;
  return (
    <p aria-hidden="true" className="work-peek">
      {verdict !== 'none' && <b className="font-semibold">{VERDICT_WORDS[verdict]}</b>}
      {first && (
        <span className="min-w-0 truncate">
          {first.label} {first.text[units]}
        </span>
      )}
    </p>
  );
}

/** A worksheet anywhere: its boxes, its answer while somebody types, the working and the drawings. */
export function Worksheet({
  worksheet,
  now,
  rules,
  hidden = [],
  setsRules = false,
}: {
  worksheet: Described;
  now: Case;
  rules: ShopRules;
  /** Fields that the sheet has filled already. */
  hidden?: readonly string[];
  /** Whether the reader may set rules of thumb for the shop. */
  setsRules?: boolean;
}) {
  const boxAt: BoxAt = (path) => {
    const text = now.typed[path] ?? '';
    return {
      path,
      text,
      units: now.units,
      problem: text.trim() === '' ? undefined : now.problems.get(path),
      understood: now.understood[path],
      rule: rules[path],
      ruleHref: setsRules ? `/shop/rules#${worksheet.name}.${path}` : undefined,
      onType: now.type,
    };
  };
  const { outcome } = now;
  return (
    <>
      <div className="work">
        <div className="work-boxes">
          {worksheet.groups.map(({ title, fields }) => {
            const shown = fields.filter((name) => !hidden.includes(name));
            return shown.length === 0 ? null : (
              <section key={title} className="work-group">
                <h2 className="font-serif text-lead font-bold">{title}</h2>
                <div className="mt-3 grid gap-x-5 gap-y-4 sm:grid-cols-2">
                  {shown.map((name) => {
                    const field = worksheet.fields[name];
                    return field ? (
                      <Input
                        key={name}
                        name={name}
                        field={field}
                        count={now.counts[name] ?? 0}
                        boxAt={boxAt}
                        onCount={now.count}
                      />
                    ) : null;
                  })}
                </div>
              </section>
            );
          })}
          <Peek now={now} />
        </div>
        <div className="work-answer">
          <h2 className="font-serif text-lead font-bold">Answer</h2>
          <div role="status" aria-live="polite" className="mt-3">
            {outcome.ok ? (
              <Answer outcome={outcome.value} units={now.units} />
            ) : (
              <Waiting worksheet={worksheet} now={now} />
            )}
          </div>
        </div>
      </div>
      {outcome.ok && outcome.value.results.length > 0 && (
        <section className="work-more">
          <h2 className="font-serif text-lead font-bold">How it is worked out</h2>
          <div className="mt-2 max-w-[52rem]">
            <Working outcome={outcome.value} units={now.units} />
          </div>
        </section>
      )}
      {outcome.ok && outcome.value.charts.length > 0 && (
        <section className="work-more work-charts">
          <Charts charts={outcome.value.charts} units={now.units} />
        </section>
      )}
    </>
  );
}
