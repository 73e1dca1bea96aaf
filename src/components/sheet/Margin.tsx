import type { ReactNode } from 'react';
import type { Frontmatter, Limit, Timer, Torque } from '@/domain/procedure/schema';
import type { Reference } from '@/domain/procedure/types';
import { durationText, limitText, threadText, torqueText } from '@/domain/procedure/values';
import { OrderDrawing } from './OrderDrawing';
import { ClampLine } from './ClampLine';
import { GaugeLine } from './GaugeLine';
import { roundsOf } from './orderPasses';
import { BigValue, OtherUnits, Value } from './Value';
import { counted, passWord } from './words';

const Block = ({ name, detail, children }: { name: string; detail?: string; children?: ReactNode }) => (
  <div className="break-inside-avoid">
    <h4 className="font-sans font-medium leading-snug">{name}</h4>
    {detail && <p className="text-small leading-snug text-ink-2">{detail}</p>}
    {children}
  </div>
);

const Line = ({ children }: { children: ReactNode }) => <p className="leading-snug">{children}</p>;

/** Where a value comes from, or that nobody has said. */
const Origin = ({ source, frontmatter }: { source?: string; frontmatter: Frontmatter }) => {
  const found = frontmatter.sources.find(({ key }) => key === source);
  return found ? (
    <p className="mt-0.5 text-small leading-snug text-ink-2">Source: {found.title}</p>
  ) : (
    <p className="mt-0.5 text-small font-semibold leading-snug">No source stated</p>
  );
};

function TorqueBlock({
  torque,
  passes,
  final,
  f,
}: {
  torque: Torque;
  passes: number[];
  final: boolean;
  f: Frontmatter;
}) {
  const all = torque.passes?.map((_, i) => i + 1) ?? [];
  // A step that stops at a pass shows that pass large; the final value is for the step that reaches it.
  const [shown] = final ? [] : passes;
  const big = torqueText(torque, shown === undefined ? {} : { pass: shown });
  return (
    <Block name={torque.name} detail={`${threadText(torque)}, ${counted(torque.count, 'place')}`}>
      <div className="mt-1.5">
        <BigValue text={big} />
        <Line>
          <OtherUnits text={big} />
        </Line>
        {shown !== undefined && (
          <Line>
            {passWord(shown)} of {all.length + 1}; final torque <Value text={torqueText(torque)} />
          </Line>
        )}
        {final &&
          all.map((pass) => (
            <Line key={pass}>
              {passWord(pass)} <Value text={torqueText(torque, { pass })} />
            </Line>
          ))}
        {torque.note && <Line>{torque.note}</Line>}
        {final && <ClampLine torque={torque} />}
        <Origin source={torque.source} frontmatter={f} />
      </div>
      <OrderDrawing torque={torque} rounds={roundsOf(torque, { passes, final })} />
    </Block>
  );
}

function LimitBlock({ limit, f }: { limit: Limit; f: Frontmatter }) {
  const text = limitText(limit);
  return (
    <Block name={limit.name} detail={limit.condition}>
      <div className="mt-1.5">
        <BigValue text={text} />
        {text.metric !== text.inch && (
          <Line>
            <OtherUnits text={text} />
          </Line>
        )}
        {limit.note && <Line>{limit.note}</Line>}
        <GaugeLine limit={limit} />
        <Origin source={limit.source} frontmatter={f} />
      </div>
    </Block>
  );
}

const TimerBlock = ({ name, minutes, note }: Pick<Timer, 'name' | 'minutes' | 'note'>) => {
  const text = durationText(minutes);
  return (
    <Block name={name}>
      <BigValue text={{ metric: text, inch: text }} />
      {note && <Line>{note}</Line>}
    </Block>
  );
};

function timerOf(reference: Extract<Reference, { kind: 'timer' }>, f: Frontmatter) {
  const timer = f.timers.find(({ key }) => key === reference.key);
  if (timer) return timer;
  const supply = f.supplies.find(({ key }) => key === reference.key);
  const minutes = reference.stage === 'cure' ? supply?.cure : supply?.skinOver;
  if (!supply || minutes === undefined) return null;
  return {
    name: `${supply.name}, ${reference.stage === 'cure' ? 'full cure' : 'skins over in'}`,
    minutes,
    note: undefined,
  };
}

/** One block for each thing the step points at, a torque's passes gathered under its final value. */
function blocks(references: readonly Reference[], f: Frontmatter): ReactNode[] {
  const done = new Set<string>();
  return references.flatMap((reference) => {
    // The words show these themselves: a drawing, and a table to write readings in.
    if (reference.kind === 'worksheet' || reference.kind === 'figure') return [];
    const id = `${reference.kind}:${reference.key}`;
    if (done.has(id) && reference.kind !== 'timer') return [];
    done.add(id);
    switch (reference.kind) {
      case 'torque': {
        const torque = f.torques.find(({ key }) => key === reference.key);
        const uses = references.flatMap((r) => (r.kind === 'torque' && r.key === reference.key ? [r.pass] : []));
        const passes = uses.filter((pass) => pass !== undefined);
        return torque
          ? [<TorqueBlock key={id} torque={torque} passes={passes} final={uses.includes(undefined)} f={f} />]
          : [];
      }
      case 'limit': {
        const limit = f.limits.find(({ key }) => key === reference.key);
        return limit ? [<LimitBlock key={id} limit={limit} f={f} />] : [];
      }
      case 'timer': {
        const timer = timerOf(reference, f);
        return timer
          ? [
              <TimerBlock
                key={id + (reference.stage ?? '')}
                name={timer.name}
                minutes={timer.minutes}
                note={timer.note}
              />,
            ]
          : [];
      }
      case 'part': {
        const part = f.parts.find(({ key }) => key === reference.key);
        return part
          ? [
              <Block
                key={id}
                name={part.name}
                detail={[part.number, counted(part.quantity, 'piece')].filter(Boolean).join(', ')}
              />,
            ]
          : [];
      }
    }
  });
}

/** What a step needs beside its words: values, times and parts. Empty where it needs nothing. */
export function Margin({ references, frontmatter }: { references: readonly Reference[]; frontmatter: Frontmatter }) {
  const shown = blocks(references, frontmatter);
  return shown.length ? <div className="flex flex-col gap-5">{shown}</div> : null;
}
