import { QUANTITIES, UNITS_BY_QUANTITY } from '../../measure/quantities';
import { ENTRY_FIELDS, HEAD_FIELDS, isListName, type ListName } from '../../procedure/fields';
import {
  CONDITIONS,
  PART_ACTIONS,
  SIGNAL_WORDS,
  SKILLS,
  SOURCE_KINDS,
  SYSTEMS,
  TIMER_KINDS,
} from '../../procedure/schema';
import type { Entry } from '../draft';
import { looseHead, type LooseHead } from './looseHead';
import { keyOffers, type Known, type Offer, type Offers } from './offer';

/** Fields that hold one of a few words. A test holds this against the schema. */
export const ENUMERATED: Readonly<Record<string, readonly string[]>> = {
  system: Object.keys(SYSTEMS),
  skill: SKILLS,
  critical: ['true', 'false'],
  'parts.action': PART_ACTIONS,
  'torques.condition': CONDITIONS,
  'limits.quantity': QUANTITIES,
  'cautions.signal': SIGNAL_WORDS,
  'timers.kind': TIMER_KINDS,
  'sources.kind': SOURCE_KINDS,
};

const systemNames: Record<string, string> = SYSTEMS;
const unitsOf = (quantity = ''): readonly string[] =>
  Object.hasOwn(UNITS_BY_QUANTITY, quantity) ? UNITS_BY_QUANTITY[quantity as keyof typeof UNITS_BY_QUANTITY] : [];

function valueOffers(path: string, entry: Entry, head: LooseHead, { drawings }: Known): Offer[] {
  if (path === 'torques.source' || path === 'limits.source') return keyOffers('sources', head.lists.sources);
  if (path === 'figures.file') return drawings.map(({ file, caption }) => ({ label: file, detail: caption }));
  if (path === 'limits.unit')
    return unitsOf(entry['quantity']).map((label) => ({ label, detail: entry['quantity'] ?? '' }));
  const words = Object.hasOwn(ENUMERATED, path) ? ENUMERATED[path] : undefined;
  return (words ?? []).map((label) => ({
    label,
    detail: path === 'system' ? (systemNames[label] ?? '') : '',
  }));
}

const topOffers = (head: LooseHead): Offer[] =>
  Object.entries(HEAD_FIELDS)
    .filter(([name]) => !head.fields.includes(name))
    .map(([label, detail]) => {
      const start = label === 'engines' ? ':\n  - ' : isListName(label) ? ':\n  - key: ' : ': ';
      return { label, detail, insert: `${label}${start}` };
    });

const fieldOffers = (list: ListName, entry: Entry): Offer[] =>
  Object.entries(ENTRY_FIELDS[list])
    .filter(([name]) => !Object.hasOwn(entry, name))
    .map(([label, detail]) => ({ label, detail, insert: `${label}: ` }));

/**
 * What can stand at the caret in the front matter: names of fields that are not there yet, and the words, keys, engines and
 * drawings that a field may hold.
 *
 * @param at place of the caret in the text
 */
export function headOffers(text: string, at: number, known: Known): Offers | null {
  const before = text.slice(0, at).split('\n');
  const line = before.at(-1) ?? '';
  const whole = looseHead(text);
  const top = before.findLast((one) => /^[A-Za-z]+:/.test(one))?.split(':')[0] ?? '';
  const offers = (typed: string, list: Offer[]): Offers => ({ from: at - typed.length, offers: list });

  const name = /^[A-Za-z]*$/.exec(line);
  // The line of the caret itself may hold half a name, which is no field yet.
  if (name) return offers(name[0], topOffers(whole));
  const engine = /^\s*- *([\w-]*)$/.exec(line);
  if (engine && top === 'engines') {
    const free = known.engines.filter(({ key }) => !whole.engines.includes(key) || key === engine[1]);
    return offers(
      engine[1] ?? '',
      free.map((one) => ({ label: one.key, detail: one.name })),
    );
  }
  const value = /^(?:\s*- +|\s+)?([A-Za-z]+): *"?([^":]*)$/.exec(line);
  const nested = /^\s/.test(line) || line.startsWith('-');
  if (value) {
    const [, field = '', typed = ''] = value;
    const path = nested ? `${top}.${field}` : field;
    return offers(typed, valueOffers(path, entryAt(text, before.length, top, whole), whole, known));
  }
  const field = /^(?:\s*- +|\s+)([A-Za-z]*)$/.exec(line);
  if (field && isListName(top)) {
    const starts = /^\s*- /.test(line);
    return offers(field[1] ?? '', fieldOffers(top, starts ? {} : entryAt(text, before.length, top, whole)));
  }
  return null;
}

/** The whole entry that a line of the text, counted from 1, belongs to. */
function entryAt(text: string, line: number, list: string, whole: LooseHead): Entry {
  if (!isListName(list)) return {};
  const place = looseHead(text, line).lists[list].length - 1;
  return whole.lists[list][place] ?? {};
}
