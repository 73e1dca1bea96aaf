import { UNITS_BY_QUANTITY, QUANTITIES } from '@/domain/measure/quantities';
import { CONDITIONS, PART_ACTIONS, SIGNAL_WORDS, SOURCE_KINDS, TIMER_KINDS } from '@/domain/procedure/schema';
import type { Option } from '@/components/ui/Select';
import { entryName, type Draft, type Entry, type ListName } from '@/domain/writing/draft';

/** How a field of a list is typed. */
export interface Column {
  field: string;
  label: string;
  /** In the row of the table: its share of the width. Without it the field stands underneath, with its label. */
  width?: string;
  /** Numbers and short codes; the rest is words. */
  short?: boolean;
  long?: boolean;
  /** Words in the row that may need more than one line. */
  wraps?: boolean;
  hint?: string;
  /** Words of the blank choice, where the field may stay empty. */
  blank?: string;
  /** Where it does not belong, it is left out unless something stands in it. */
  belongs?: (entry: Entry) => boolean;
  options?: (entry: Entry, draft: Draft) => Option[];
}

const named = (values: readonly string[], words: Record<string, string> = {}): Option[] =>
  values.map((value) => ({ value, label: words[value] ?? value }));

const fixed = (values: readonly string[], words?: Record<string, string>) => {
  const options = named(values, words);
  return () => options;
};

const sources = (_: Entry, draft: Draft): Option[] =>
  draft.sources.map((entry) => ({ value: entry['key'] ?? '', label: entryName('sources', entry) }));

const units = (entry: Entry): Option[] =>
  named(UNITS_BY_QUANTITY[entry['quantity'] as keyof typeof UNITS_BY_QUANTITY] ?? []);

const measured = (entry: Entry) => entry['quantity'] !== 'finding';
const isFinding = (entry: Entry) => entry['quantity'] === 'finding';

const SOURCE: Column = {
  field: 'source',
  label: 'Where the value comes from',
  options: sources,
  blank: 'No source stated',
};
const NOTE: Column = { field: 'note', label: 'Note', long: true };
const NAME: Column = { field: 'name', label: 'Name', width: '1.6fr', wraps: true };

const QUANTITY_WORDS = { share: 'share (%)', count: 'count', finding: 'finding, no number', ratio: 'ratio (:1)' };
const KIND_WORDS = {
  maker: "maker's information",
  standard: 'standard',
  shop: 'proved in our shops',
  practice: 'common practice',
  demonstration: 'demonstration value',
};

/** The fields of each list in the order in which they are typed. `figures` has an editor of its own. */
export const COLUMNS: Record<Exclude<ListName, 'figures'>, readonly Column[]> = {
  torques: [
    { field: 'name', label: 'Fastener', width: '1.7fr', wraps: true },
    { field: 'thread', label: 'Thread', width: '0.8fr', short: true, hint: 'M6, 1/4-20 UNC or G 1/4' },
    { field: 'pitch', label: 'Pitch', hint: 'In mm', width: '0.7fr', short: true },
    { field: 'class', label: 'Class', width: '0.7fr', short: true, hint: '8.8, or SAE 5' },
    { field: 'nm', label: 'N·m', width: '0.75fr', short: true },
    { field: 'tolerance', label: '± N·m', width: '0.65fr', short: true },
    { field: 'condition', label: 'Condition', width: '1.15fr', options: fixed(CONDITIONS) },
    { field: 'length', label: 'Length under the head, mm', short: true },
    { field: 'count', label: 'How many', short: true },
    SOURCE,
    NOTE,
  ],
  limits: [
    { field: 'name', label: 'What is measured', width: '2.2fr', wraps: true },
    { field: 'quantity', label: 'Quantity', width: '1.2fr', options: fixed(QUANTITIES, QUANTITY_WORDS) },
    { field: 'unit', belongs: measured, label: 'Unit', width: '0.9fr', options: units, blank: 'none' },
    { field: 'min', belongs: measured, label: 'Least', width: '0.7fr', short: true },
    { field: 'nominal', belongs: measured, label: 'Nominal', width: '0.75fr', short: true },
    { field: 'max', belongs: measured, label: 'Most', width: '0.7fr', short: true },
    { field: 'resolution', belongs: measured, label: 'The tool reads to, same unit', short: true },
    { field: 'expect', belongs: isFinding, label: 'What must be found' },
    SOURCE,
    { field: 'condition', label: 'Measured in which state', hint: 'For example: cold, cap torqued', long: true },
    NOTE,
  ],
  timers: [
    { field: 'name', label: 'What is waited for', width: '2fr', wraps: true },
    { field: 'kind', label: 'Kind', width: '1fr', options: fixed(TIMER_KINDS) },
    { field: 'minutes', label: 'Minutes', width: '0.7fr', short: true },
    NOTE,
  ],
  parts: [
    NAME,
    { field: 'number', label: 'Part number', width: '1fr', short: true },
    { field: 'quantity', label: 'Quantity', width: '0.7fr', short: true },
    { field: 'action', label: 'What happens to it', width: '1fr', options: fixed(PART_ACTIONS) },
    NOTE,
  ],
  tools: [NAME, { field: 'range', label: 'Range, with its unit', width: '1.4fr' }, NOTE],
  supplies: [
    NAME,
    { field: 'skinOver', label: 'Skins over, min', width: '0.8fr', short: true },
    { field: 'cure', label: 'Cures, min', width: '0.8fr', short: true },
    NOTE,
  ],
  cautions: [
    { field: 'signal', label: 'Signal word', options: fixed(SIGNAL_WORDS) },
    { field: 'hazard', label: 'What can hurt', long: true },
    { field: 'harm', label: 'What it does', long: true },
    { field: 'avoid', label: 'What to do about it', long: true },
  ],
  sources: [
    { field: 'title', label: 'Source', width: '1.8fr', wraps: true },
    { field: 'kind', label: 'Kind', width: '1.1fr', options: fixed(SOURCE_KINDS, KIND_WORDS) },
    { field: 'detail', label: 'Detail', long: true, hint: 'Page, date, or which engines it was proved on' },
  ],
};

/** The field by which a new entry is called, and what its box is labelled. */
export const NAMING: Record<ListName, { field: string; label: string }> = {
  torques: { field: 'name', label: 'Which fastener?' },
  limits: { field: 'name', label: 'What is measured?' },
  timers: { field: 'name', label: 'What is waited for?' },
  parts: { field: 'name', label: 'What is the part called?' },
  tools: { field: 'name', label: 'What is the tool called?' },
  supplies: { field: 'name', label: 'What is the supply called?' },
  cautions: { field: 'hazard', label: 'What can hurt?' },
  figures: { field: 'caption', label: 'What does it show?' },
  sources: { field: 'title', label: 'What is the source called?' },
};

/** What a new entry starts with besides its name. */
export const STARTS_WITH: Partial<Record<ListName, Entry>> = {
  torques: { condition: 'dry', count: '1' },
  limits: { quantity: 'length', unit: 'mm' },
  timers: { kind: 'wait' },
  parts: { quantity: '1', action: 'replace' },
  cautions: { signal: 'CAUTION' },
  sources: { kind: 'maker' },
};

/** The columns that an entry shows. */
export const columnsFor = (list: Exclude<ListName, 'figures'>, entry: Entry): Column[] =>
  COLUMNS[list].filter((column) => !column.belongs || column.belongs(entry) || Boolean(entry[column.field]?.trim()));
