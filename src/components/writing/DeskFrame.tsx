import { OriginNote } from '@/components/sheet/OriginNote';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import type { Proposal } from '@/domain/api/schemas/proposals';
import type { Comparison } from '@/domain/revision/types';
import { sourceOf } from '@/domain/writing/readDraft';
import { Checks } from './Checks';
import { useDesk } from './desk';
import { DeskHead } from './DeskHead';
import { ThreadsAhead } from './DeskThreads';
import { Elsewhere } from './Elsewhere';
import type { Keeping } from './keeper';
import { MergeScreen } from './MergeScreen';
import { Middle } from './Middle';
import { Rail, RailChoice } from './Rail';
import { MIDDLE } from './RailLink';
import { Evidence } from './Evidence';
import { ReasonField } from './ReasonField';
import { Returned } from './Returned';
import { StaleBase } from './StaleBase';
import { TextMode } from './TextMode';
import type { Checked } from './useCheck';
import { useStartOf } from './useStartOf';
import type { Merging } from './useMerging';
import type { DeskUndo } from './useUndoing';
import type { Refusal } from './useProposing';
import type { Standing } from './writingProps';

interface Props {
  proposal: Proposal;
  current: Standing | null;
  state: Keeping;
  checked: Checked;
  changes: Comparison | undefined;
  refusal: Refusal | null;
  pending: boolean;
  undo: { said: string; act: (() => void) | null } | null;
  onUndone: () => void;
  undoing: DeskUndo;
  /** Saves what is not saved yet, then goes to the earlier versions. */
  onVersions: () => void;
  onPropose: () => void;
  merging: Merging;
  /** The text on the screen. */
  mine: string;
  /** The text while it is edited as text; null in the form. */
  text: string | null;
  onText: (text: string) => void;
  onForm: () => void;
  onTheirs: () => void;
  onMine: () => void;
}

function UndoLine({ undo, onUndone }: Pick<Props, 'undo' | 'onUndone'>) {
  return (
    <div role="status">
      {undo && (
        <p className="mb-5 flex flex-wrap items-center gap-x-4 border-y border-rule bg-wash px-4 py-1">
          <span className="min-w-0 flex-1 py-2">{undo.said}</span>
          {undo.act && (
            <Button
              kind="quiet"
              onClick={() => {
                undo.act?.();
                onUndone();
              }}
            >
              Undo
            </Button>
          )}
          <Button kind="quiet" aria-label="Close this line" onClick={onUndone}>
            Close
          </Button>
        </p>
      )}
    </div>
  );
}

function Refused({ refusal }: { refusal: Refusal | null }) {
  const { goTo } = useDesk();
  if (!refusal) return null;
  return (
    <Notice live="alert" title="Not proposed" className="mb-5">
      <p>{refusal.detail}</p>
      {refusal.errors.map(({ path, message }) => (
        <p key={`${path} ${message}`}>
          {path ? (
            <button type="button" className="text-left underline underline-offset-[3px]" onClick={() => goTo(path)}>
              {message}
            </button>
          ) : (
            message
          )}
        </p>
      ))}
    </Notice>
  );
}

/** Where everything of the desk stands: head, notices, rail, the chosen thing, the margin of checks. */
export function DeskFrame(props: Props) {
  const { proposal, current, state, checked, changes, text, mine, merging } = props;
  const { draft, place, choose, tried, baseLetter } = useDesk();
  const lastStep = draft.steps[0];
  useStartOf(MIDDLE, text === null);
  const title = text === null ? draft.title.trim() || 'Untitled' : proposal.title;
  const seeing = place === 'changes';
  const choosing = current !== null && merging.shown && (merging.merged?.conflicts.length ?? 0) > 0;
  return (
    <div className="leaf writing">
      <DeskHead
        title={baseLetter ? `${title}, changing ${baseLetter}` : `${title}, a new procedure`}
        state={state}
        opened={Date.parse(proposal.updatedAt)}
        changes={seeing}
        onChanges={() => {
          merging.show(false);
          choose(seeing ? (lastStep ? { step: lastStep.id } : 'sheet') : 'changes');
        }}
        onPropose={props.onPropose}
        pending={props.pending}
        undoing={props.undoing}
        versions={
          <a
            href={`/proposals/${proposal.id}/versions`}
            className="inline-flex min-h-touch items-center text-small"
            onClick={(event) => {
              if (event.metaKey || event.ctrlKey || event.shiftKey) return;
              event.preventDefault();
              props.onVersions();
            }}
          >
            Earlier versions
          </a>
        }
      />
      <div className="framed-sections writing-notices">
        {state.kind === 'stale' && (
          <Elsewhere theirs={state.theirs} mine={mine} onTheirs={props.onTheirs} onMine={props.onMine} />
        )}
        {current && !choosing && (
          <StaleBase number={proposal.number} base={baseLetter} current={current} mine={mine} merging={merging} />
        )}
        {proposal.origin && (
          <OriginNote origin={proposal.origin} className="border-x-0 border-t-0 border-l-[8px] px-5 sm:px-7" />
        )}
        <Returned />
        <ThreadsAhead />
      </div>
      {choosing && props.refusal && (
        <div className="px-5 pt-5 sm:px-7">
          <Refused refusal={props.refusal} />
        </div>
      )}
      {choosing && merging.merged && (
        <MergeScreen merged={merging.merged} merging={merging} base={baseLetter ?? ''} letter={current.letter} />
      )}
      {/* Nothing may be typed into a text that is just being replaced by the merged one. */}
      <div hidden={choosing} inert={merging.pending}>
        {text === null && (
          <div className="writing-choice">
            <RailChoice />
          </div>
        )}
        <div className={text === null ? 'writing-columns' : 'writing-columns writing-as-text'}>
          {text === null && (
            <div className="writing-rail">
              <Rail />
            </div>
          )}
          <section id={MIDDLE} tabIndex={-1} aria-label="What is being written" className="writing-middle">
            <Refused refusal={props.refusal} />
            <UndoLine undo={props.undo} onUndone={props.onUndone} />
            {text === null || seeing ? (
              <Middle changes={changes} id={proposal.id} />
            ) : (
              <TextMode text={text} onText={props.onText} checked={checked} />
            )}
            <div className="mt-7 border-t border-rule pt-5">
              <ReasonField
                error={tried && !draft.reason.trim() ? 'Write why it is better: the editor decides by it.' : undefined}
              />
              <Evidence proposalId={proposal.id} photos={proposal.photos} />
            </div>
            <p className="mt-4 text-small text-ink-2">
              {text === null ? (
                <button
                  type="button"
                  className="inline-flex min-h-touch items-center underline underline-offset-[3px]"
                  onClick={() => props.onText(sourceOf(draft))}
                >
                  Edit the whole sheet as text
                </button>
              ) : (
                <button
                  type="button"
                  disabled={checked.problems.length > 0}
                  className="inline-flex min-h-touch items-center underline underline-offset-[3px] disabled:no-underline"
                  onClick={props.onForm}
                >
                  {checked.problems.length > 0
                    ? 'Mend what is listed, and the text can be edited in the form again'
                    : 'Edit it in the form'}
                </button>
              )}
            </p>
          </section>
          <div className="writing-checks">
            <Checks checked={checked} changes={changes} />
          </div>
        </div>
      </div>
    </div>
  );
}
