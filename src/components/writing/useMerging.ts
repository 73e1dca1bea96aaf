import { useState } from 'react';
import type { Procedure } from '@/domain/procedure/types';
import type { Choices } from '@/domain/revision/mergeTypes';
import { useHeldChoices } from './heldChoices';
import { type Merged, useMerge } from './useMerge';
import type { Standing } from './writingProps';

export interface Merging {
  /** undefined while it is being worked out, null where the text cannot be read. */
  merged: Merged | null | undefined;
  choices: Choices;
  choose: (choices: Choices) => void;
  /** The screen of choices stands in the desk's place. */
  shown: boolean;
  show: (shown: boolean) => void;
  pending: boolean;
  failed: string | null;
  /** Saves the merged text on the new base and loads the desk again. */
  take: () => void;
}

/** Bringing a draft up to a later revision. `current` is that of the draft itself where nothing was published since. */
export function useMerging(
  id: string,
  base: Standing | null,
  current: Standing | null,
  mine: Procedure | null,
  rebase: (letter: string, source: string) => Promise<string | null>,
): Merging {
  const letter = current?.letter ?? '';
  const { choices, hold, forget } = useHeldChoices(id, letter);
  const merged = useMerge(base, current ?? { letter, source: '' }, current ? mine : null, choices);
  const [shown, show] = useState(Object.keys(choices).length > 0);
  const [pending, setPending] = useState(false);
  const [failed, setFailed] = useState<string | null>(null);
  const take = () => {
    if (!merged || pending) return;
    setPending(true);
    setFailed(null);
    void rebase(letter, merged.source).then((why) => {
      if (why === null) return forget();
      setFailed(why);
      setPending(false);
    });
  };
  return { merged, choices, choose: hold, shown, show, pending, failed, take };
}
