import { useId, useRef, useSyncExternalStore } from 'react';
import { Button } from '@/components/ui/Button';
import { buttonLook } from '@/components/ui/buttonLook';
import { Field } from '@/components/ui/Field';
import { FILE_TYPES, LONGEST_ALT } from '@/domain/photos/photos';
import { progressOf, type Pick } from './picks';
import type { PhotoPicks } from './usePhotoPicks';

/** One chosen photo: the picture or how far it has come, its words, and the way back. */
function Picked({ pick, picks, onGone }: { pick: Pick; picks: PhotoPicks; onGone: () => void }) {
  const { key, state, photo, error, name } = pick;
  const number = picks.picks.indexOf(pick) + 1;
  const call = name || `photo ${number}`;
  return (
    <li className="picked" data-state={state}>
      <span className="picked-frame">{photo && <img src={photo.small} alt="" />}</span>
      <div className="picked-words">
        {state === 'failed' ? (
          <p role="alert" className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">
            <span className="font-semibold [overflow-wrap:anywhere]">{call}</span> was not taken. {error}
          </p>
        ) : state === 'there' && photo ? (
          <>
            <Field
              id={`what-${key}`}
              // A form without the script's help reads it by this name.
              name={`alt-${photo.id}`}
              label={`What photo ${number} shows`}
              maxLength={LONGEST_ALT}
              autoComplete="off"
              value={pick.alt}
              error={picks.said?.key === key ? picks.said.said : undefined}
              onChange={(event) => picks.describe(key, event.target.value)}
            />
            <input type="hidden" name="photo" value={photo.id} />
          </>
        ) : (
          <p className="text-ink-2">
            <span className="block [overflow-wrap:anywhere]">{call}</span>
            <progress max={1} value={pick.share} aria-label={`${call}: ${progressOf(pick)}`} />
            <span className="block text-small">{progressOf(pick)}</span>
          </p>
        )}
      </div>
      <div className="picked-acts">
        {state === 'failed' && pick.again && (
          <Button onClick={() => picks.again(key)}>
            Try again<span className="sr-only"> {call}</span>
          </Button>
        )}
        <Button
          kind="quiet"
          onClick={() => {
            picks.takeOff(key);
            onGone();
          }}
        >
          Take off<span className="sr-only"> {call}</span>
        </Button>
      </div>
    </li>
  );
}

const never = () => () => undefined;

/** Chooses photos and shows how each fares. A phone offers its camera by itself; on a desk they can be dropped or pasted. */
export function PhotoPicker({ picks }: { picks: PhotoPicks }) {
  const id = useId();
  const input = useRef<HTMLInputElement>(null);
  // As long as no script runs, the form's own fields hold what was uploaded before; twice in one form it would count twice.
  const runs = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  const full = picks.picks.length >= picks.most;
  return (
    <div className="photo-picker" data-needs-script>
      {runs && picks.picks.length > 0 && (
        <ol>
          {picks.picks.map((pick) => (
            <Picked key={pick.key} pick={pick} picks={picks} onGone={() => input.current?.focus()} />
          ))}
        </ol>
      )}
      <div className="flex flex-wrap items-center gap-x-3.5 gap-y-1.5">
        <label className={buttonLook('plain', 'photo-choose')} data-full={full || undefined}>
          Add photos
          <input
            ref={input}
            type="file"
            accept={FILE_TYPES}
            multiple
            disabled={full}
            aria-describedby={`${id}-hint`}
            onChange={(event) => {
              picks.add([...(event.target.files ?? [])]);
              // The same file may be chosen again after it was taken off.
              event.target.value = '';
            }}
          />
        </label>
        <p id={`${id}-hint`} className="text-small text-ink-2">
          {full ? `${picks.most} photos are the most.` : `Up to ${picks.most}, 15 MB each.`}
          {!full && <span className="photo-drop"> Or drop or paste them here.</span>}
        </p>
      </div>
      {picks.said && picks.said.key === null && (
        <p role="alert" className="border-l-[8px] border-ink pl-2.5 font-medium leading-snug">
          {picks.said.said}
        </p>
      )}
    </div>
  );
}
