import { useState, type ReactNode } from 'react';
import { usePhotoPicks } from '@/components/photos/usePhotoPicks';
import { StartLinks } from '@/components/threads/StartLinks';
import { StartPanel } from '@/components/threads/StartPanel';
import { blankStart, type StartWritten } from '@/components/threads/startWritten';
import { ThreadNote } from '@/components/threads/ThreadNote';
import { useThreads, type ThreadTrouble } from '@/components/threads/useThreads';
import type { Thread, ThreadList } from '@/domain/api/schemas/threads';
import { isListName } from '@/domain/procedure/fields';
import { suggestible } from '@/domain/review/suggestions';
import type { ThreadKind } from '@/domain/review/threads';
import type { StepPair } from '@/domain/revision/twoTexts';
import type { ValueRow } from '@/domain/revision/valueRows';
import { placesOf, standsAt, type Shown } from './places';

/** What the page brings of threads: those that stand, and what a form without a script asked for or was refused. */
export interface TalkProps {
  list: ThreadList;
  start: StartWritten | null;
  trouble: ThreadTrouble | null;
}

/** The fields of a row that can be suggested: none, one that the path names, or those of a whole entry. */
function fieldsAt({ path, list, key, now }: ValueRow): { value: string; label: string }[] | null {
  if (now === null || key === null || !isListName(list)) return null;
  const fields = suggestible(list).map(([value, label]) => ({ value, label }));
  const field = path.slice(`${list}.${key}`.length + 1);
  if (field === '') return fields.filter(({ value }) => value !== 'name' && value !== 'note' && value !== 'source');
  return fields.some(({ value }) => value === field) ? [] : null;
}

/**
 * The threads of a proposal and the panel that starts one, as pieces that the page sets where they belong: `below` a
 * step or a value, `links` beside it, and at the `head` what stands nowhere else.
 */
export function useTalk(
  proposal: { id: string; version: number },
  came: TalkProps,
  shown: Shown,
  { pairs, values }: { pairs: readonly StepPair[]; values: readonly ValueRow[] },
) {
  const talk = useThreads(proposal.id, came.list);
  const [written, setWritten] = useState<StartWritten | null>(came.start);
  const [firstTrouble, setFirstTrouble] = useState(came.trouble);
  const trouble = talk.trouble ?? firstTrouble;
  const picks = usePhotoPicks();
  const { list } = talk;
  const names = new Map(placesOf(pairs, values).map(({ value, label }) => [value, label]));
  const placeName = (at: string) =>
    at === '' ? 'the whole proposal' : (names.get(at) ?? at).replace(/^Step /, 'step ').replace(/^Value: /, '');

  const begin = (kind: ThreadKind, at: string) => {
    setFirstTrouble(null);
    talk.setTrouble(null);
    const fields = values.find(({ path }) => path === at);
    const field = (fields && fieldsAt(fields)?.[0]?.value) ?? '';
    // Words that were chosen in the step are those that are meant.
    const chosen = kind === 'suggestion' && at.startsWith('step:') ? (getSelection()?.toString().trim() ?? '') : '';
    setWritten((before) => ({
      ...(before ?? blankStart(kind, at)),
      kind,
      at,
      field,
      ...(chosen ? { quote: chosen } : {}),
    }));
  };
  const close = () => {
    const link = written && `start-${written.kind}-${written.at}`;
    setWritten(null);
    picks.drop();
    requestAnimationFrame(() => link && document.getElementById(link)?.focus());
  };
  const after = (thread: Thread | null, done?: () => void) => {
    if (!thread) return null;
    done?.();
    requestAnimationFrame(() => document.getElementById(`thread-${thread.id}`)?.focus());
    return thread;
  };

  const send = (wanted: StartWritten) => {
    const photos = picks.ready();
    if (!photos) return;
    void talk.start(wanted, proposal.version, photos).then((thread) =>
      after(thread, () => {
        setWritten(null);
        picks.clear();
      }),
    );
  };

  const row = written && values.find(({ path }) => path === written.at);
  const panel = written && list.may.start && (
    <StartPanel
      key={written.kind + written.at}
      written={written}
      place={placeName(written.at)}
      now={row?.to ?? null}
      fields={(row && fieldsAt(row)) ?? []}
      people={list.people}
      picks={picks}
      trouble={trouble?.thread === null ? trouble : null}
      pending={talk.pending === 'new'}
      version={proposal.version}
      href={`/proposals/${proposal.id}`}
      onWrite={setWritten}
      onCancel={close}
      onSend={() => send(written)}
    />
  );
  const panelAt = written && (written.at === '' || standsAt(written.at, shown) === null ? '' : written.at);

  const note = (thread: Thread, apart = false) => (
    <ThreadNote
      key={thread.id}
      thread={thread}
      apart={apart}
      people={list.people}
      version={proposal.version}
      pending={talk.pending === thread.id}
      trouble={trouble?.thread === thread.id ? trouble : null}
      onReply={async (text, photos) => after(await talk.reply(thread.id, text, photos))}
      onTurn={(act) => {
        if (act !== 'accept') void talk.turn(thread, act).then((done) => after(done));
        // The text that is compared below changes with it.
        else void talk.accept(thread, proposal.version).then((done) => done && location.reload());
      }}
    />
  );
  const of = (place: string | null) => list.items.filter(({ anchor }) => standsAt(anchor, shown) === place);
  const kinds = (may: boolean): ThreadKind[] => [
    'question',
    'remark',
    ...(may && list.may.suggest ? ['suggestion' as const] : []),
  ];
  const links = (at: string, may: boolean): ReactNode =>
    list.may.start && (
      <StartLinks at={at} place={placeName(at)} kinds={kinds(may)} onStart={(kind) => begin(kind, at)} />
    );

  return {
    threads: list.items,
    /** Steps that something stands at, or is being written at. */
    anchors: [...list.items.map(({ anchor }) => anchor), written?.at ?? null],
    below: (place: string): ReactNode[] => [
      ...of(place).map((thread) => note(thread)),
      ...(panelAt === place && panel ? [<div key="start">{panel}</div>] : []),
    ],
    atStep: (pair: StepPair) => links(`step:${pair.id}`, pair.now !== null),
    atValue: (value: ValueRow) => links(value.path, fieldsAt(value) !== null),
    head: (
      <>
        {of(null).map((thread) => note(thread, true))}
        {panelAt === '' && panel}
        {list.may.start && (
          <p className="flex flex-wrap items-baseline gap-x-3">
            <span className="text-small text-ink-2">On the whole</span>
            {links('', false)}
          </p>
        )}
      </>
    ),
  };
}
