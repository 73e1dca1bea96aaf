import { capital } from '@/domain/wording';
import type { Frontmatter, Part, Supply } from '@/domain/procedure/schema';
import { durationText } from '@/domain/procedure/values';
import { Checkbox } from '@/components/ui/Checkbox';
import type { ReactNode } from 'react';
import { SignalPanel, worstFirst } from './SignalPanel';

/** Short facts with commas between them, begun like a sentence; a note is a sentence of its own. */
function detailOf(facts: (string | undefined)[], note: string | undefined): string {
  const told = [facts.filter(Boolean).join(', '), note].filter(Boolean).join('. ');
  return capital(told);
}

const partDetail = (part: Part) => detailOf([part.number, part.action], part.note);
const supplyDetail = (supply: Supply) =>
  detailOf(
    [
      supply.skinOver === undefined ? undefined : `skins over in ${durationText(supply.skinOver)}`,
      supply.cure === undefined ? undefined : `full cure ${durationText(supply.cure)}`,
    ],
    supply.note,
  );

/** One thing to lay out, to tick off with pen or finger. The tick is not kept. */
const Item = ({ name, detail, quantity }: { name: string; detail?: string; quantity?: number }) => (
  <li className="break-inside-avoid border-t border-hair first:border-0">
    <Checkbox
      autoComplete="off"
      top
      className="py-2.5"
      label={
        <>
          {name}
          {detail && <span className="block text-small leading-snug text-ink-2">{detail}</span>}
        </>
      }
      after={quantity === undefined ? undefined : <b className="text-[1.0625rem] font-semibold text-ink">{quantity}</b>}
    />
  </li>
);

const List = ({ title, empty, children }: { title: string; empty?: string | false; children: ReactNode }) => (
  <section className="border-rule px-4 py-5 max-md:border-b sm:px-6 md:border-r">
    <h2 className="mb-1.5 text-[1.0625rem]">{title}</h2>
    {empty ? <p className="text-ink-2">{empty}</p> : <ul>{children}</ul>}
  </section>
);

/** What to lay out and what to beware of, before the first step. */
export function Prep({ frontmatter: f }: { frontmatter: Frontmatter }) {
  const demonstration = f.sources.some((source) => source.kind === 'demonstration');
  return (
    <div className="prep grid md:grid-cols-2 lg:grid-cols-[1.15fr_1fr_1fr]">
      <List title="Parts" empty={!f.parts.length && 'No parts are used up.'}>
        {f.parts.map((part) => (
          <Item key={part.key} name={part.name} detail={partDetail(part)} quantity={part.quantity} />
        ))}
      </List>
      <List
        title="Tools and supplies"
        empty={!f.tools.length && !f.supplies.length && 'Nothing beyond the usual bench.'}
      >
        {f.tools.map((tool) => (
          <Item key={tool.key} name={tool.range ? `${tool.name}, ${tool.range}` : tool.name} detail={tool.note} />
        ))}
        {f.supplies.map((supply) => (
          <Item key={supply.key} name={supply.name} detail={supplyDetail(supply)} />
        ))}
      </List>
      <section
        aria-label="Cautions"
        className="divide-y-[1.5px] divide-ink max-lg:border-t-frame max-lg:border-ink md:max-lg:col-span-2"
      >
        {worstFirst(f.cautions).map((caution) => (
          <SignalPanel key={caution.key} caution={caution} />
        ))}
        <p className="px-3 py-3 leading-snug text-ink-2">
          The maker&rsquo;s current service information, local rules and licensed practice come first.
          {demonstration && ' Values marked as demonstration are not for work on a real engine.'}
        </p>
      </section>
    </div>
  );
}
