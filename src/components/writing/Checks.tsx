import type { SourceProblem } from '@/domain/procedure/types';
import type { Comparison } from '@/domain/revision/types';
import { useDesk } from './desk';
import { StepPreview } from './StepPreview';
import type { Checked } from './useCheck';
import { needsOf } from './useNeeds';

const Title = ({ children }: { children: string }) => <h2 className="mb-1.5 text-[1rem]">{children}</h2>;

/** Told while it is written, so that the reason, or another figure, is ready before an editor asks for it. */
function PastProof({ clamp }: Pick<Comparison, 'clamp'>) {
  const over = clamp.filter(({ verdict }) => verdict === 'over');
  if (over.length === 0) return null;
  return (
    <div className="heavy-edge mb-2.5 px-3.5 py-2.5">
      <p className="font-semibold">An editor who overrides the clamp check with a written reason</p>
      <ul className="mt-1 flex flex-col gap-1">
        {over.map(({ key, name, to }) => (
          <li key={key}>
            {name}: {to}
          </li>
        ))}
      </ul>
      <p className="mt-1">Until then it cannot be published. Say in your reason what the figure goes by.</p>
    </div>
  );
}

function WillNeed({ changes, base }: { changes: Comparison | undefined; base: string | null }) {
  if (!changes) return <p className="text-ink-2">Shown once every value can be read.</p>;
  if (changes.identical) return <p>Nothing differs from revision {base} yet.</p>;
  const { editors, reasons } = needsOf(changes);
  if (editors === 1) return <p>One editor. No torque, limit, caution, hold point or part is changed or taken away.</p>;
  return (
    <>
      <p>Two editors, because</p>
      <ul className="ml-4 list-[square] marker:text-petrol">
        {reasons.slice(0, 6).map((reason) => (
          <li key={reason}>{reason}</li>
        ))}
        {reasons.length > 6 && <li>and {reasons.length - 6} more</li>}
      </ul>
    </>
  );
}

/** Sentences with the way to the field that each speaks of. */
function Problems({ problems }: { problems: readonly SourceProblem[] }) {
  const { goTo, asText } = useDesk();
  return (
    <ul className="flex flex-col gap-2">
      {problems.slice(0, 12).map((p) => (
        <li key={`${p.path} ${p.line} ${p.message}`}>
          {p.path && !asText ? (
            <button
              type="button"
              className="text-left leading-snug text-ink underline decoration-rule underline-offset-[3px] hover:decoration-ink"
              onClick={() => goTo(p.path ?? '')}
            >
              {p.message}
            </button>
          ) : (
            p.message
          )}
        </li>
      ))}
      {problems.length > 12 && <li>and {problems.length - 12} more</li>}
    </ul>
  );
}

function Check({ checked }: { checked: Checked }) {
  const { draft, asText } = useDesk();
  const { problems, notices, toFillIn, checking, failed } = checked;
  if (problems.length > 0)
    return (
      <div className="heavy-edge px-3.5 py-2.5">
        <p className="mb-1.5 font-semibold">{problems.length} to mend before it can be proposed</p>
        <Problems problems={problems} />
      </div>
    );
  if (failed) return <p>{failed}</p>;
  return (
    <>
      {toFillIn.length > 0 && (
        <div className="heavy-edge mb-2.5 px-3.5 py-2.5">
          <p className="mb-1.5 font-semibold">{toFillIn.length} to fill in before it can be proposed</p>
          <Problems problems={toFillIn} />
        </div>
      )}
      <p>
        {asText ? 'Every value can be read.' : `${draft.steps.length} steps, every value can be read.`}{' '}
        {notices.length === 0 &&
          toFillIn.length === 0 &&
          !checking &&
          'Cautions stand before their steps. Nothing missing.'}
      </p>
      {notices.length > 0 && (
        <div className="mt-2">
          <p className="mb-1.5 font-semibold">Worth a look, and no obstacle to proposing it</p>
          <Problems problems={notices} />
        </div>
      )}
    </>
  );
}

/** The margin of the desk: what the change will need, what is wrong with it, how the step will read. */
export function Checks({ checked, changes }: { checked: Checked; changes: Comparison | undefined }) {
  const { baseLetter } = useDesk();
  return (
    // It scrolls by itself where it is taller than the screen, so the keyboard must reach it.
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
    <div className="flex flex-col gap-6 leading-snug" tabIndex={0} role="region" aria-label="Checks">
      <section>
        <Title>This will need</Title>
        {changes && <PastProof clamp={changes.clamp} />}
        <WillNeed changes={changes} base={baseLetter} />
      </section>
      <section aria-busy={checked.checking}>
        <Title>Check</Title>
        <Check checked={checked} />
      </section>
      <StepPreview checked={checked} />
    </div>
  );
}
