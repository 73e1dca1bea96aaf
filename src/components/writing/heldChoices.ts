import { useState } from 'react';
import type { Choices } from '@/domain/revision/mergeTypes';

const SIDES = ['base', 'mine', 'theirs', 'typed'];

function read(key: string): Choices {
  try {
    const value: unknown = JSON.parse(localStorage.getItem(key) ?? '{}');
    const known = Object.entries(value as Choices).filter(([, choice]) => SIDES.includes(choice?.take));
    return Object.fromEntries(known);
  } catch {
    return {};
  }
}

/**
 * What the author chose so far while bringing a draft up to a revision, held on this device: a reload in the middle
 * loses none of it. It changes nothing of the draft before it is taken.
 */
export function useHeldChoices(id: string, letter: string) {
  const key = `matchmark:merge:${id}:${letter}`;
  const [choices, setChoices] = useState<Choices>(() => (typeof window === 'undefined' ? {} : read(key)));
  const hold = (next: Choices) => {
    setChoices(next);
    try {
      localStorage.setItem(key, JSON.stringify(next));
    } catch {
      // A device that keeps nothing still lets the choices be taken in one sitting.
    }
  };
  const forget = () => {
    try {
      localStorage.removeItem(key);
    } catch {
      // There is nothing to forget.
    }
  };
  return { choices, hold, forget };
}
