import type { ReactNode } from 'react';
import type { Frontmatter } from '@/domain/procedure/schema';
import type { RenderedStep } from '@/domain/procedure/types';
import { Margin } from './Margin';
import { Mark } from './Mark';
import { SignalPanel, worstFirst } from './SignalPanel';

/** A place where the work waits for a second, senior person. */
export const Hold = ({ text }: { text: string }) => (
  <p className="heavy-edge mt-3 max-w-prose break-inside-avoid px-3 py-2.5 font-medium leading-snug">
    <b className="font-semibold">Hold point.</b> {text}
  </p>
);

/**
 * One step: cautions across the sheet, then mark, words and margin. On a narrow screen the margin folds in under the
 * words. `act` is a button for this step, under its mark.
 */
export function Step({
  step,
  frontmatter,
  anchors = true,
  act,
}: {
  step: RenderedStep;
  frontmatter: Frontmatter;
  /** Ids and self-links `#step-<id>`; off where two texts stand on one page. */
  anchors?: boolean;
  act?: ReactNode;
}) {
  const cautions = step.cautions.flatMap((key) => frontmatter.cautions.filter((caution) => caution.key === key));
  const margin = <Margin references={step.references} frontmatter={frontmatter} />;
  const id = anchors ? `step-${step.id}` : undefined;
  return (
    <section id={id} aria-label={`Step ${step.number}: ${step.title}`} className="step group/step">
      {cautions.length > 0 && (
        <div className="step-cautions divide-y divide-ink border-b border-ink">
          {worstFirst(cautions).map((caution) => (
            <SignalPanel key={caution.key} caution={caution} shape="band" />
          ))}
        </div>
      )}
      <div className="step-grid">
        <div className="step-mark">
          {anchors ? (
            <a href={`#${id}`} data-copy-link aria-label={`Link to step ${step.number}`} className="block text-ink">
              <Mark number={step.number} />
            </a>
          ) : (
            <Mark number={step.number} />
          )}
        </div>
        <h3 className="step-title">{step.title}</h3>
        <div className="step-words prose-step" dangerouslySetInnerHTML={{ __html: step.html }} />
        <div className="step-margin">{margin}</div>
        <div className="step-after">
          {step.holds.map((text) => (
            <Hold key={text} text={text} />
          ))}
        </div>
        {act && <div className="step-act">{act}</div>}
      </div>
    </section>
  );
}
