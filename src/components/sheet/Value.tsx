import type { BothUnits } from '@/domain/measure/format';

/** The value in running text, in the reader's units. */
export const Value = ({ text }: { text: BothUnits }) =>
  text.metric === text.inch ? (
    <>{text.metric}</>
  ) : (
    <>
      <span data-units="metric">{text.metric}</span>
      <span data-units="inch">{text.inch}</span>
    </>
  );

/** The value in the units the reader did not choose, for a line underneath. */
export const OtherUnits = ({ text }: { text: BothUnits }) => (
  <span className="text-ink-2">
    <Value text={{ metric: text.inch, inch: text.metric }} />
  </span>
);

const NUMBER = '−?[\\d.\\u202f]+';
/** "10 ±1 N·m", "0.03 to 0.06 mm", "40 N·m, then 90°": number, the rest of it, what follows. */
const LEADING = new RegExp(`^(${NUMBER}(?: to ${NUMBER})?)([^,]*)(?:, (.*))?$`);
/** "132.00 (131.80 or more) mm": nominal, range, unit. */
const AROUND = new RegExp(`^(${NUMBER}) \\((.+)\\)(.*)$`);

/** What hands act on comes first and largest; its unit and the rest follow smaller. */
function Big({ text }: { text: string }) {
  const [, nominal, range, unit] = AROUND.exec(text) ?? [];
  const [, number = nominal, rest = unit, more = range] = nominal ? [] : (LEADING.exec(text) ?? []);
  if (!number) return <span className="block text-[1.5rem] leading-tight">{text}</span>;
  return (
    <>
      <span className={number.includes(' to ') ? 'text-title' : undefined}>{number}</span>
      <span className="text-lead font-medium">{rest}</span>
      {more && <span className="block text-lead font-semibold">{more}</span>}
    </>
  );
}

/** The value as the largest thing in the margin. */
export const BigValue = ({ text }: { text: BothUnits }) => (
  <p className="text-value font-semibold">
    {text.metric === text.inch ? (
      <Big text={text.metric} />
    ) : (
      <>
        <span data-units="metric">
          <Big text={text.metric} />
        </span>
        <span data-units="inch">
          <Big text={text.inch} />
        </span>
      </>
    )}
  </p>
);
