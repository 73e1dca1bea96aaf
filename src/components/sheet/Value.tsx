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

/** What hands act on comes first and largest: "10" of "10 ±1 N·m", "0.03 to 0.06" of "0.03 to 0.06 mm". */
const LEADING = /^(−?[\d.\u202f]+(?: to −?[\d.\u202f]+)?)([^,]*)(?:, (.*))?$/;

function Big({ text }: { text: string }) {
  const [, number, rest, turns] = LEADING.exec(text) ?? [];
  if (!number) return <>{text}</>;
  return (
    <>
      <span className={number.includes(' to ') ? 'text-title' : undefined}>{number}</span>
      <span className="text-lead font-medium">{rest}</span>
      {turns && <span className="block text-lead font-semibold">{turns}</span>}
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
