import { useState, type FormEvent } from 'react';
import { PhotoPicker } from '@/components/photos/PhotoPicker';
import { usePhotoPicks } from '@/components/photos/usePhotoPicks';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import type { PersonRef } from '@/domain/api/schemas/common';
import type { Thread } from '@/domain/api/schemas/threads';
import { MessageBox } from './MessageBox';
import { MessageText } from './MessageText';
import { Suggested } from './Suggested';
import type { SentPhoto, ThreadTrouble } from './useThreads';
import { aboutOf, standingOf } from './words';

export interface NoteProps {
  thread: Thread;
  people: readonly PersonRef[];
  /** Stands apart from what it is about, so it says what that is. */
  apart?: boolean;
  pending: boolean;
  trouble: ThreadTrouble | null;
  /** Version of the proposal, for a form without a script. */
  version: number;
  onReply: (text: string, photos: SentPhoto[]) => Promise<unknown>;
  onTurn: (act: 'resolve' | 'reopen' | 'accept') => void;
}

/** What every form of a thread sends where no script runs. */
const Hidden = ({ act, thread, version }: { act: string; thread: Thread; version: number }) => (
  <>
    <input type="hidden" name="act" value={`thread-${act}`} />
    <input type="hidden" name="thread" value={thread.id} />
    <input type="hidden" name="version" value={act === 'accept' ? version : thread.version} />
  </>
);

function Reply({ thread, people, pending, trouble, version, onReply }: NoteProps) {
  const typed = trouble?.typed?.text ?? '';
  const [open, setOpen] = useState(typed !== '' || trouble?.field === 'text');
  const [text, setText] = useState(typed);
  const picks = usePhotoPicks();
  const asked = thread.kind === 'question' && thread.state === 'open';
  const word = asked ? 'Answer' : 'Reply';
  const send = (event: FormEvent) => {
    event.preventDefault();
    const photos = picks.ready();
    if (!photos) return;
    void onReply(text, photos).then((done) => {
      if (!done) return;
      setText('');
      picks.clear();
      setOpen(false);
    });
  };
  return (
    <details className="thread-reply" open={open} onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>{word}</summary>
      <form method="post" onSubmit={send} className="flex flex-col gap-2.5" {...picks.catching}>
        <Hidden act="reply" thread={thread} version={version} />
        <MessageBox
          label={`Your ${word.toLowerCase()}`}
          value={text}
          people={people}
          error={trouble?.field === 'text' ? trouble.detail : undefined}
          onChange={setText}
        />
        <PhotoPicker picks={picks} />
        <div>
          <Button type="submit" kind="main" pending={pending} pendingText="Sending">
            {word}
          </Button>
        </div>
      </form>
    </details>
  );
}

const TURNS = { accept: 'Accept', resolve: 'Resolve', reopen: 'Reopen' } as const;

function Inside(props: NoteProps) {
  const { thread, pending, trouble, version, onTurn } = props;
  const { may, whyNot, kind, state } = thread;
  const turns = (['accept', 'resolve', 'reopen'] as const).filter((act) => may[act]);
  const waits = kind === 'suggestion' && state === 'open' && /once the text is returned/.test(whyNot['accept'] ?? '');
  return (
    <>
      {thread.suggestion && <Suggested suggestion={thread.suggestion} />}
      <ol className="thread-messages">
        {thread.messages.map((message) => (
          <li key={message.id}>
            <MessageText message={message} />
          </li>
        ))}
      </ol>
      {trouble && trouble.field !== 'text' && (
        <Notice live="alert" title="Not done" className="mt-2">
          <p>{trouble.detail}</p>
        </Notice>
      )}
      {waits && <p className="mt-1.5 text-small text-ink-2">{whyNot['accept']}</p>}
      {(may.reply || turns.length > 0) && (
        <div className="thread-acts">
          {turns.map((act) => (
            <form
              key={act}
              method="post"
              onSubmit={(event) => {
                event.preventDefault();
                if (!pending) onTurn(act);
              }}
            >
              <Hidden act={act} thread={thread} version={version} />
              <Button type="submit" kind={act === 'accept' ? 'main' : 'plain'} pending={pending}>
                {TURNS[act]}
              </Button>
            </form>
          ))}
          {may.reply && <Reply {...props} />}
        </div>
      )}
    </>
  );
}

/** A thread where it belongs; a resolved one is folded to its line. */
export function ThreadNote(props: NoteProps) {
  const { thread, apart = false } = props;
  const about = apart ? aboutOf(thread) : null;
  const head = about ? `${standingOf(thread)}, ${about}` : standingOf(thread);
  const shared = { id: `thread-${thread.id}`, 'data-kind': thread.kind, tabIndex: -1 };
  if (thread.state === 'open')
    return (
      <section {...shared} className="thread" aria-label={head}>
        <p className="thread-head">{head}</p>
        <Inside {...props} />
      </section>
    );
  return (
    <details {...shared} className="thread thread-closed">
      <summary className="thread-head">
        {head}
        <span className="fold-word" />
      </summary>
      <Inside {...props} />
    </details>
  );
}
