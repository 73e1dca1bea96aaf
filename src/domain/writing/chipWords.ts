import type { Attributes } from '../procedure/components';
import { limitKeysIn } from '../procedure/bindings';
import { isStage, STAGES } from '../procedure/components';
import { durationText, limitText, torqueText } from '../procedure/values';
import { READINGS, worksheetTitle } from '../procedure/worksheets';
import { boxesOf, entryName, type Draft, type Entry, type ListName } from './draft';
import { readNumber } from './numbers';
import { limitOf, torqueOf } from './procedureOf';

/** What a component says while it is written about: "Cover bolt, first pass" and "6 N·m". */
export interface ChipWords {
  name: string;
  /** The value as it stands in the draft, half typed or not; empty for what has none. */
  value: string;
  /** What is wrong with what it points at, as words that stand for it; null where nothing is. */
  missing: string | null;
  /** Where its value is written: a list, and the place and field in it; null where it has none. */
  target: { list: ListName; index: number; field: string } | null;
}

export const PASS_WORDS = ['first pass', 'second pass', 'third pass', 'fourth pass', 'fifth pass', 'sixth pass'];
export const STAGE_WORDS = { 'skin-over': 'skins over', cure: 'cures' } as const;

const NO_VALUE = 'no value yet';

type Lists = Pick<Draft, ListName>;
interface Found {
  entry: Entry;
  index: number;
}

const find = (draft: Lists, list: ListName, key: string | undefined): Found | null => {
  const index = draft[list].findIndex((entry) => entry['key'] === key);
  const entry = draft[list][index];
  return entry ? { entry, index } : null;
};

const lost = (what: string): ChipWords => ({ name: what, value: '', missing: what, target: null });
const noSuch = (one: string, key: string | undefined): ChipWords => lost(`There is no ${one} “${key ?? ''}”`);

/** Minutes as they were typed, read where they can be. */
const minutesText = (typed: string | undefined): string => {
  const minutes = readNumber(typed ?? '');
  return typeof minutes === 'number' && minutes > 0 ? durationText(minutes) : typed ? `${typed} min` : NO_VALUE;
};

const sayers: Record<string, (given: Attributes, draft: Lists) => ChipWords> = {
  Torque: ({ of, pass }, draft) => {
    const found = find(draft, 'torques', of);
    if (!found) return noSuch('torque', of);
    const { entry, index } = found;
    const name = entryName('torques', entry);
    const read = torqueOf(entry);
    if (pass === undefined) {
      const typed = entry['nm'] ? `${entry['nm']} N·m` : NO_VALUE;
      return {
        name,
        value: read ? torqueText(read).metric : typed,
        missing: null,
        target: { list: 'torques', index, field: 'nm' },
      };
    }
    const nm = boxesOf(entry['passes'])[Number(pass) - 1];
    if (nm === undefined || !/^[1-9]$/.test(pass)) return lost(`${name} has no pass ${pass}`);
    const value = read ? torqueText(read, { pass: Number(pass) }).metric : nm.trim() ? `${nm.trim()} N·m` : NO_VALUE;
    return {
      name: `${name}, ${PASS_WORDS[Number(pass) - 1] ?? `pass ${pass}`}`,
      value,
      missing: null,
      target: { list: 'torques', index, field: 'passes' },
    };
  },
  Limit: ({ of }, draft) => {
    const found = find(draft, 'limits', of);
    if (!found) return noSuch('limit', of);
    const { entry, index } = found;
    const read = limitOf(entry);
    const [field, typed] =
      entry['quantity'] === 'finding'
        ? (['expect', entry['expect']] as const)
        : ([
            entry['max'] || !entry['min'] ? 'max' : 'min',
            [entry['min'], entry['nominal'], entry['max']].filter(Boolean).join(' to '),
          ] as const);
    const raw = typed ? [typed, entry['quantity'] !== 'finding' && entry['unit']].filter(Boolean).join(' ') : NO_VALUE;
    return {
      name: entryName('limits', entry),
      value: (read && limitText(read).metric) || raw,
      missing: null,
      target: { list: 'limits', index, field },
    };
  },
  Part: ({ of }, draft) => {
    const found = find(draft, 'parts', of);
    if (!found) return noSuch('part', of);
    return {
      name: entryName('parts', found.entry),
      value: '',
      missing: null,
      target: { list: 'parts', index: found.index, field: 'name' },
    };
  },
  Timer: ({ of, stage }, draft) => {
    if (stage === undefined) {
      const found = find(draft, 'timers', of);
      if (!found) return noSuch('timer', of);
      return {
        name: entryName('timers', found.entry),
        value: minutesText(found.entry['minutes']),
        missing: null,
        target: { list: 'timers', index: found.index, field: 'minutes' },
      };
    }
    const found = find(draft, 'supplies', of);
    if (!found) return noSuch('supply', of);
    const name = entryName('supplies', found.entry);
    if (!isStage(stage)) return lost(`${name} has no time “${stage}”`);
    const field = STAGES[stage];
    return {
      name: `${name}, ${STAGE_WORDS[stage]}`,
      value: minutesText(found.entry[field]),
      missing: null,
      target: { list: 'supplies', index: found.index, field },
    };
  },
  Figure: ({ of }, draft) => {
    const found = find(draft, 'figures', of);
    if (!found) return noSuch('drawing', of);
    return {
      name: entryName('figures', found.entry),
      value: '',
      missing: null,
      target: { list: 'figures', index: found.index, field: 'caption' },
    };
  },
  Worksheet: ({ kind, of }, draft) => {
    const title = worksheetTitle(kind);
    if (title === undefined) return noSuch('worksheet', kind);
    const keys = [...new Set(limitKeysIn(of))];
    const limits = keys.map((key) => ({ key, found: find(draft, 'limits', key) }));
    const gone = limits.find(({ found }) => !found);
    if (gone) return noSuch('limit', gone.key);
    const [first] = limits;
    const names = limits.map(({ found }) => (found ? entryName('limits', found.entry) : ''));
    return {
      name: [kind === READINGS ? 'readings' : title, names.join('; ')].filter(Boolean).join(' for '),
      value: '',
      missing: null,
      target: first?.found ? { list: 'limits', index: first.found.index, field: 'name' } : null,
    };
  },
};

/** What the component `name` with these attributes is called, and its value as the draft has it now. */
export const chipWords = (name: string, given: Attributes, draft: Lists): ChipWords =>
  sayers[name]?.(given, draft) ?? lost(`There is no component “${name}”`);

/** A value as long as this is not divided over two lines. */
const WHOLE = 24;

/** The same on one line: "Cover bolt, first pass 6 N·m". Fixed blanks hold a value together. */
export const chipLine = ({ name, value, missing }: ChipWords): string =>
  missing ?? [name, value.length <= WHOLE ? value.replace(/ /g, '\u00a0') : value].filter(Boolean).join(' ');
