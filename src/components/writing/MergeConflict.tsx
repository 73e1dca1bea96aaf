import type { Choice, Conflict, Side } from '@/domain/revision/mergeTypes';
import { compareWords } from '@/domain/revision/words';
import { MergeEntry } from './MergeEntry';
import { canType, MergeTyped } from './MergeTyped';
import { askWords, sideNames } from './mergeWords';
import { Words } from './Words';

const SIDES = ['base', 'theirs', 'mine'] as const satisfies Side[];

/** One value against that of the base: what differs is marked where it stands. */
function Said({ conflict, side }: { conflict: Conflict; side: Side }) {
  const { says, kind } = conflict;
  const text = says[side];
  if (text === null) return <p className="text-ink-2">Not there</p>;
  if (kind === 'entry') return <MergeEntry conflict={conflict} side={side} />;
  const prose = kind === 'text' || kind === 'step';
  const look = prose ? 'whitespace-pre-line font-serif text-prose' : 'whitespace-pre-line';
  const runs =
    side === 'base' || says.base === null
      ? [{ kind: 'same' as const, text }]
      : compareWords(says.base, text).filter((run) => run.kind !== 'removed');
  return (
    <p className={`${look} break-words`}>
      <Words runs={runs} />
    </p>
  );
}

function Pick({ name, label, checked, onPick }: { name: string; label: string; checked: boolean; onPick: () => void }) {
  return (
    <label className="flex min-h-touch cursor-pointer items-center gap-2.5 font-semibold">
      <input type="radio" name={name} checked={checked} onChange={onPick} className="h-5 w-5 shrink-0 accent-petrol" />
      {label}
    </label>
  );
}

/** One thing that both changed: base, published and mine side by side, and the author's choice. */
export function MergeConflict({
  conflict,
  base,
  letter,
  choice,
  onChoose,
}: {
  conflict: Conflict;
  base: string;
  letter: string;
  choice: Choice | undefined;
  onChoose: (choice: Choice) => void;
}) {
  const names = sideNames(base, letter);
  const { path, label } = conflict;
  const start = choice && choice.take !== 'typed' ? conflict[choice.take] : (conflict.mine ?? conflict.theirs);
  return (
    <fieldset id={`conflict-${path}`} tabIndex={-1} className="scroll-mt-28 border-t-[3px] border-ink pt-3">
      <legend className="float-left mb-1 w-full text-lead font-bold">{label}</legend>
      <p className="clear-both mb-3 max-w-prose text-ink-2">{askWords(conflict, letter)}</p>
      <div className="grid border-frame border-ink bg-white md:grid-cols-3">
        {SIDES.map((side) => (
          <div
            key={side}
            className={`min-w-0 border-t border-rule px-4 py-2 first:border-t-0 md:border-l md:border-t-0 md:first:border-l-0 ${choice?.take === side ? 'border-l-[8px] border-l-ink md:border-l-[8px] md:border-l-ink md:first:border-l-[8px]' : ''}`}
          >
            <Pick
              name={`merge.${path}`}
              label={names[side]}
              checked={choice?.take === side}
              onPick={() => onChoose({ take: side })}
            />
            <Said conflict={conflict} side={side} />
          </div>
        ))}
      </div>
      {canType(conflict) && (
        <div className="mt-1">
          <Pick
            name={`merge.${path}`}
            label={conflict.kind === 'text' ? 'Write it myself' : 'Give values of my own'}
            checked={choice?.take === 'typed'}
            onPick={() => choice?.take !== 'typed' && onChoose({ take: 'typed', value: start })}
          />
          {choice?.take === 'typed' && (
            <MergeTyped
              conflict={conflict}
              value={choice.value}
              onChange={(value) => onChoose({ take: 'typed', value })}
            />
          )}
        </div>
      )}
    </fieldset>
  );
}
