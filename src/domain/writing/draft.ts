import { KEYED_LISTS } from '../procedure/schema';
import type { Step } from '../procedure/types';

/**
 * A procedure as it is being typed. Every value is the text in its box, so that nothing is lost or rounded
 * while it is half written; `procedureOf` reads the numbers out of it.
 */
export type ListName = (typeof KEYED_LISTS)[number];

/** One entry of a list: text by field name. `key` is always there. */
export type Entry = Record<string, string>;

export type Lists = Record<ListName, Entry[]>;

export interface Draft extends Lists {
  /** Why the change is better; goes to the editor, not into the text. */
  reason: string;
  title: string;
  summary: string;
  system: string;
  engines: string[];
  minutes: string;
  skill: string;
  critical: boolean;
  intro: string;
  steps: Step[];
}

/**
 * How the text of a field becomes a value. `text` stays as it is; `numbers` holds several, each with a
 * semicolon behind it ("5;7,5;"), so that an empty box still counts as one; `places` has one "x y" on each
 * line; `order` has numbers with blanks between.
 */
export type FieldKind = 'text' | 'number' | 'numbers' | 'places' | 'order';

const NUMBERS: Partial<Record<ListName, Record<string, FieldKind>>> = {
  parts: { quantity: 'number' },
  supplies: { skinOver: 'number', cure: 'number' },
  torques: {
    pitch: 'number',
    length: 'number',
    nm: 'number',
    tolerance: 'number',
    angleTolerance: 'number',
    count: 'number',
    passes: 'numbers',
    angles: 'numbers',
    positions: 'places',
    order: 'order',
  },
  limits: { min: 'number', max: 'number', nominal: 'number', resolution: 'number' },
  timers: { minutes: 'number' },
};

export const fieldKind = (list: ListName, field: string): FieldKind => NUMBERS[list]?.[field] ?? 'text';

/** The boxes of a `numbers` field. */
export const boxesOf = (text: string | undefined): string[] => (text ? text.split(';').slice(0, -1) : []);
export const joinBoxes = (boxes: readonly string[]): string =>
  boxes.map((box) => `${box.replace(/;/g, ' ')};`).join('');

/** What an entry is called in menus and sentences; its key while it has no name yet. */
export function entryName(list: ListName, entry: Entry): string {
  const field = { cautions: 'hazard', figures: 'caption', sources: 'title' }[list as string] ?? 'name';
  return entry[field]?.trim() || (entry['key'] ?? '');
}
