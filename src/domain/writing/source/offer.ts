import { entryName, type Entry, type ListName } from '../draft';

/** One thing that can stand where the caret is. */
export interface Offer {
  /** What is matched with what was typed, and shown. */
  label: string;
  /** What it means, in words. */
  detail: string;
  /** What goes in instead of what was typed so far; the label unless given. */
  insert?: string;
  /** Where the caret goes, counted from the start of `insert`; its end unless given. */
  caret?: number;
}

/** What can stand at the caret, in place of what was typed from `from` on. */
export interface Offers {
  from: number;
  offers: Offer[];
}

/** What the list knows and cannot be found by typing. The rest is in the text and in our own registries. */
export interface Known {
  engines: readonly { key: string; name: string }[];
  drawings: readonly { file: string; caption: string }[];
}

const range = ({ min = '', max = '', nominal = '', unit = '' }: Entry) =>
  [min && max ? `${min} to ${max}` : min ? `${min} or more` : max ? `${max} or less` : nominal, unit]
    .filter(Boolean)
    .join(' ');

const MORE: Partial<Record<ListName, (entry: Entry) => string | undefined>> = {
  torques: ({ nm }) => nm && `${nm} N·m`,
  limits: (entry) => entry['expect'] || range(entry),
  timers: ({ minutes }) => minutes && `${minutes} min`,
  parts: ({ quantity }) => quantity,
  cautions: ({ signal }) => signal,
  sources: ({ kind }) => kind,
};

/** The keys of a list with what they stand for: "Cover bolt, 10 N·m". */
export const keyOffers = (list: ListName, entries: readonly Entry[]): Offer[] =>
  entries.flatMap((entry) => {
    const label = entry['key'] ?? '';
    const detail = [entryName(list, entry), MORE[list]?.(entry)].filter(Boolean).join(', ');
    return label ? [{ label, detail }] : [];
  });
