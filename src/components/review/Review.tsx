import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useCallback, useMemo, useState } from 'react';
import { Notice } from '@/components/ui/Notice';
import type { Proposal } from '@/domain/api/schemas/proposals';
import type { StepPair } from '@/domain/revision/twoTexts';
import type { ClampChange } from '@/domain/revision/types';
import type { ValueRow } from '@/domain/revision/valueRows';
import { Failing, OverrideNote } from './Failing';
import { ActPanel, ReasonFields } from './ActPanel';
import type { Written } from './keptReason';
import { OverrideForm } from './OverrideForm';
import { Panes } from './Panes';
import { placesOf, standsAt, unplaced } from './places';
import { PublishWords } from './PublishWords';
import { RemarkNote } from './Remarks';
import { ReturnHere } from './ReturnHere';
import { ReviewHead } from './ReviewHead';
import { Trail } from './Trail';
import { useReasonPanel } from './useReasonPanel';
import { useReviewActs, type Trouble } from './useReviewActs';
import { useTalk, type TalkProps } from './useTalk';
import { ValueTable } from './ValueTable';
import { doneWords, panelWords, sideNames, type Done } from './words';

export interface ReviewProps {
  proposal: Proposal;
  /** Id of whoever looks. */
  me: string;
  /** The letter that it has, or would get now; null where it stands on an older revision. */
  letter: string | null;
  /** Null while the draft cannot be read; `fault` says where it stops. */
  texts: { pairs: StepPair[]; values: ValueRow[]; clamp: ClampChange[] } | null;
  fault: string | null;
  /** The panel that the address asks for, with what was typed before. */
  asked: Written | null;
  /** How the act that made this page went, where no script ran. */
  trouble: Trouble | null;
  /** The reason of an override that was refused, where no script ran. */
  typedOverride: { torque: string; text: string } | null;
  done: Done | null;
  talk: TalkProps;
}

/** A proposal with all that can be done with it. Rendered by the server first; the script adds lines and acts in place. */
export function Review(props: ReviewProps) {
  // One for each page that is made: the server must never show one person what it answered another.
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <Desk {...props} />
    </QueryClientProvider>
  );
}

function Desk({
  proposal: first,
  me,
  letter,
  texts,
  fault,
  asked,
  typedOverride,
  talk: cameTalk,
  ...came
}: ReviewProps) {
  const { proposal, act, pending, movedOn, ...acts } = useReviewActs(first);
  const done = acts.done ?? came.done;
  const trouble = acts.trouble ?? (acts.done ? null : came.trouble);
  const { id, may, remarks } = proposal;
  const { panel, ...reason } = useReasonPanel(id, asked);

  const { pairs = [], values = [], clamp = [] } = texts ?? {};
  const steps = useMemo(() => new Set(pairs.map((pair) => pair.id)), [pairs]);
  const shown = { steps, paths: values.map(({ path }) => path) };
  const talk = useTalk({ id, version: first.version }, cameTalk, shown, { pairs, values });
  const names = sideNames(proposal);
  const at = panel?.at ?? '';
  // A panel whose place is not on the page stands in the head.
  const placed = at.startsWith('step:') && steps.has(at.slice(5));
  const heldOpen = [...remarks.map(({ anchor }) => anchor), ...talk.anchors, at].flatMap((a) =>
    a?.startsWith('step:') ? a.slice(5) : [],
  );
  const held = heldOpen.join('\n');
  const keepOpen = useCallback((step: string) => held.split('\n').includes(step), [held]);

  const form = panel && may[panel.written.act] && (
    <ActPanel
      key={panel.written.act + at}
      {...panelWords(panel.written.act, letter)}
      act={panel.written.act}
      version={first.version}
      href={`/proposals/${id}`}
      pending={pending === panel.written.act}
      onCancel={reason.close}
      onSend={() => {
        const { act: wanted, text, anchor } = panel.written;
        act(
          wanted === 'publish' ? { act: wanted } : { act: wanted, reason: text, anchor: anchor || null },
          reason.finish,
        );
      }}
    >
      {panel.written.act === 'publish' ? (
        <PublishWords proposal={proposal} letter={letter ?? ''} me={me} />
      ) : (
        <ReasonFields
          written={panel.written}
          author={proposal.author.name}
          places={placesOf(pairs, values)}
          error={trouble?.act === panel.written.act ? trouble.field : null}
          onWrite={reason.write}
        />
      )}
    </ActPanel>
  );
  const onLoad = (key: string) => {
    const torque = proposal.failing.find((one) => one.key === key);
    if (!torque) return null;
    if (torque.override) return <OverrideNote override={torque.override} />;
    if (!may.override) return null;
    return (
      <OverrideForm
        proposalId={id}
        version={first.version}
        torque={key}
        typed={typedOverride?.torque === key ? typedOverride.text : ''}
        error={trouble?.act === 'override' && trouble.torque === key ? trouble.field : null}
        pending={pending === 'override'}
        onSend={(reason, onDone) => act({ act: 'override', torque: key, reason }, onDone)}
      />
    );
  };
  const notes = (place: string) => [
    ...remarks
      .filter(({ anchor }) => standsAt(anchor, shown) === place)
      .map((remark) => <RemarkNote key={remark.id} remark={remark} />),
    ...talk.below(place),
  ];

  return (
    <div className="leaf framed-sections review">
      <ReviewHead
        proposal={proposal}
        me={me}
        letter={letter}
        version={first.version}
        fault={fault}
        pending={pending}
        said={done && doneWords(done, proposal, me)}
        trouble={trouble}
        movedOn={movedOn}
        onAgree={() => act({ act: 'agree' })}
        onAsk={reason.open}
        threads={talk.threads}
        panel={placed ? null : form}
      >
        <Failing proposal={proposal} rows={texts !== null} />
        {panel?.written.text.trim() && !may[panel.written.act] && (
          <Notice title="What you wrote, not sent">
            <p className="whitespace-pre-line">{panel.written.text}</p>
          </Notice>
        )}
        {unplaced(remarks, shown).map(({ remark, about }) => (
          <RemarkNote key={remark.id} remark={remark} about={about} />
        ))}
        {talk.head}
      </ReviewHead>
      <Trail trail={proposal.trail} letter={proposal.publishedLetter} />
      {texts && (
        <>
          <ValueTable
            rows={values}
            clamp={clamp}
            fresh={proposal.base === null}
            names={{ old: names.old.column, now: names.now.column }}
            below={notes}
            acts={talk.atValue}
            onLoad={onLoad}
          />
          <Panes
            pairs={pairs}
            old={proposal.base === null ? null : { name: names.old.pane, letter: proposal.base }}
            now={{ name: names.now.pane, letter }}
            keepOpen={keepOpen}
            below={(pair) => (
              <>
                {notes(`step:${pair.id}`)}
                {placed && at === `step:${pair.id}` && form}
                {talk.atStep(pair)}
                {may.return && steps.has(pair.id) && at !== `step:${pair.id}` && (
                  <ReturnHere step={pair.id} onAsk={(anchor) => reason.open('return', anchor)} />
                )}
              </>
            )}
          />
        </>
      )}
    </div>
  );
}
