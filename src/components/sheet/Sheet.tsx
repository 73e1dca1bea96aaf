import type { ReactNode } from 'react';
import type { RenderedProcedure, RenderedStep } from '@/domain/procedure/types';
import { Contents } from './Contents';
import type { EngineName } from './engineNames';
import { Head } from './Head';
import { Prep } from './Prep';
import { Sources } from './Sources';
import { Step } from './Step';
import { RunningHead, type TitleBlockFacts } from './TitleBlock';

/**
 * A whole sheet, as read, previewed and printed. `notice` stands above everything, `actions` under the head, `bulletins` ahead of all that is
 * laid out and done,
 * `stepAct` is each step's own button.
 */
export function Sheet({
  procedure,
  facts,
  engines,
  notice,
  actions,
  bulletins,
  stepAct,
}: {
  procedure: RenderedProcedure;
  facts: TitleBlockFacts;
  engines: readonly EngineName[];
  notice?: ReactNode;
  actions?: ReactNode;
  bulletins?: ReactNode;
  stepAct?: (step: RenderedStep) => ReactNode;
}) {
  const { frontmatter, steps, introHtml } = procedure;
  return (
    <article className="printed-sheet">
      <RunningHead facts={facts} title={frontmatter.title} />
      <div className="printed-body">
        <div className="leaf framed-sections">
          {notice}
          <Head
            frontmatter={frontmatter}
            facts={facts}
            engines={engines}
            holds={steps.reduce((sum, step) => sum + step.holds.length, 0)}
          />
          {actions}
          {bulletins}
          <Prep frontmatter={frontmatter} />
          {steps.length > 0 && <Contents steps={steps} />}
          {introHtml && (
            <div className="prose-step px-4 py-5 sm:px-9" dangerouslySetInnerHTML={{ __html: introHtml }} />
          )}
          <div className="steps">
            {steps.map((step) => (
              <Step key={step.id} step={step} frontmatter={frontmatter} act={stepAct?.(step)} />
            ))}
          </div>
          <Sources sources={frontmatter.sources} />
        </div>
      </div>
    </article>
  );
}
