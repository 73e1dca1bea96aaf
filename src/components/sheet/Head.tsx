import type { Frontmatter } from '@/domain/procedure/schema';
import type { EngineName } from './engineNames';
import { TitleBlock, type TitleBlockFacts } from './TitleBlock';
import { benchTime, counted, SKILL_WORDS } from './words';

/** Title, what the job is, and the title block beside it. */
export function Head({
  frontmatter: f,
  facts,
  engines,
  holds,
}: {
  frontmatter: Frontmatter;
  facts: TitleBlockFacts;
  engines: readonly EngineName[];
  holds: number;
}) {
  return (
    <div className="sheet-head grid lg:grid-cols-[minmax(0,1fr)_27rem]">
      <div className="px-4 py-6 sm:px-9 sm:py-7">
        <h1 className="max-w-[26ch] text-[1.8125rem] leading-[1.18] tracking-[-0.015em] sm:text-display">{f.title}</h1>
        <p className="mt-3 max-w-prose font-serif text-prose">{f.summary}</p>
        <ul className="mt-4 flex flex-wrap gap-x-6 gap-y-1 font-medium text-ink-2 [&_b]:font-semibold [&_b]:text-ink">
          {engines.map((engine) => (
            <li key={engine.key}>
              <b>{engine.name}</b>
              {engine.years && `, ${engine.years.from} to ${engine.years.to}`}
            </li>
          ))}
          <li>
            <b>{benchTime(f.minutes)}</b> bench time
          </li>
          <li>
            Fit for <b>{SKILL_WORDS[f.skill]}</b>
          </li>
          {holds > 0 && (
            <li>
              <b>{holds}</b> {counted(holds, 'hold point').replace(/^\d+ /, '')}
            </li>
          )}
          {f.critical && (
            <li>
              <b>Critical:</b> every change needs two editors
            </li>
          )}
        </ul>
      </div>
      <div className="title-block border-ink max-lg:border-t-frame lg:border-l-frame">
        <TitleBlock facts={facts} />
      </div>
    </div>
  );
}
