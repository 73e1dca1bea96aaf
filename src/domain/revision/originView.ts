import { bindingsIn } from '../procedure/bindings';
import type { Frontmatter } from '../procedure/schema';
import { KEYED_LISTS } from '../procedure/schema';
import type { Procedure, Step } from '../procedure/types';
import { replaceComponents } from './components';
import { type Entry, fieldsOf, type ListName, nameOf } from './fields';
import { compareLetters } from './letters';
import type { Origins } from './origins';

/** One thing that a text says, with the revision since which it reads so. */
export interface Origin {
  /** `torques.cover-bolt.nm`; of a step's own words `step:<id>`. */
  place: string;
  /** What it belongs to: "Cover bolt"; empty for the head of the sheet. */
  subject: string;
  /** Which field of it: "tolerance"; empty for the value that the entry is about. */
  words: string;
  /** "12 N·m"; null for a sentence, which is not repeated here. */
  text: string | null;
  letter: string;
}

/** What stands together: a step with the values it uses, or what no step uses. Latest origin first. */
export interface OriginGroup {
  step: { id: string; number: number } | null;
  title: string;
  origins: Origin[];
}

/** Lists whose values are told, in the order in which they matter at the bench. */
const TOLD = [
  'cautions',
  'torques',
  'limits',
  'timers',
  'supplies',
  'parts',
  'tools',
] as const satisfies readonly ListName[];

const USES: Record<string, readonly (typeof TOLD)[number][]> = {
  Torque: ['torques'],
  Limit: ['limits'],
  Timer: ['timers', 'supplies'],
  Part: ['parts'],
};

/** A longer text is a sentence: its field is named and its words are left to the sheet. */
const LONGEST = 48;
const SENTENCES = new Set(['harm', 'avoid', 'note', 'summary', 'engines']);

/** Which entries a step puts before somebody: `torques.cover-bolt`. */
function usedBy(step: Step): Set<string> {
  const used = new Set(step.cautions.map((key) => `cautions.${key}`));
  const look = (body: string): void => {
    replaceComponents(body, ({ name, given, inside }) => {
      for (const list of USES[name] ?? []) used.add(`${list}.${given['of'] ?? ''}`);
      if (name === 'Worksheet') for (const { key } of bindingsIn(given['of'])) used.add(`limits.${key}`);
      if (inside) look(inside);
      return null;
    });
  };
  look(step.body);
  return used;
}

const latestFirst = (origins: Origin[]): Origin[] =>
  origins
    .map((origin, i) => ({ origin, i }))
    .sort((a, b) => compareLetters(b.origin.letter, a.origin.letter) || a.i - b.i)
    .map(({ origin }) => origin);

function originsOf(
  list: ListName | 'head',
  prefix: string,
  entry: object,
  subject: string,
  origins: Origins,
): Origin[] {
  return fieldsOf(list, entry).flatMap(({ path, words, text }) => {
    const place = `${prefix}${path}`;
    const letter = origins[place];
    if (letter === undefined) return [];
    return [
      {
        place,
        subject,
        words,
        text: SENTENCES.has(path) || text.length > LONGEST || text === subject ? null : text,
        letter,
      },
    ];
  });
}

function stepOrigin({ id }: Step, origins: Origins): Origin {
  const own = ['title', 'body', 'cautions'].flatMap((part) => origins[`step:${id}:${part}`] ?? []);
  const [letter = ''] = own.sort((a, b) => compareLetters(b, a));
  return { place: `step:${id}`, subject: 'The words of this step', words: '', text: null, letter };
}

const headOf = (frontmatter: Frontmatter) =>
  Object.fromEntries(
    Object.entries(frontmatter).filter(([name]) => !(KEYED_LISTS as readonly string[]).includes(name)),
  );

/** The origins of a text in the order of the sheet, each value under every step that uses it. */
export function originGroups({ frontmatter, intro, steps }: Procedure, origins: Origins): OriginGroup[] {
  const values = new Map(
    TOLD.flatMap((list) =>
      frontmatter[list].map((entry: Entry) => {
        const key = `${list}.${entry.key}`;
        return [key, originsOf(list, `${key}.`, entry, nameOf(list, entry as never), origins)] as const;
      }),
    ),
  );
  const left = new Set(values.keys());
  const groups = steps.map((step, i): OriginGroup => {
    const used = usedBy(step);
    for (const key of used) left.delete(key);
    const inStep = [...values].filter(([key]) => used.has(key)).flatMap(([, found]) => found);
    return {
      step: { id: step.id, number: i + 1 },
      title: step.title,
      origins: latestFirst([stepOrigin(step, origins), ...inStep]),
    };
  });
  const rest = [...values].filter(([key]) => left.has(key)).flatMap(([, found]) => found);
  const { intro: since } = origins;
  const introduction: Origin[] =
    intro && since ? [{ place: 'intro', subject: '', words: 'Introduction', text: null, letter: since }] : [];
  return [
    ...groups,
    { step: null, title: 'On the sheet, in no step', origins: latestFirst(rest) },
    {
      step: null,
      title: 'The head of the sheet',
      origins: latestFirst([...originsOf('head', '', headOf(frontmatter), '', origins), ...introduction]),
    },
  ].filter((group) => group.origins.length > 0);
}

/** The origins of one group by revision, and in it by what they belong to, in the order given. */
export interface SinceRevision {
  letter: string;
  subjects: { subject: string; origins: Origin[] }[];
}

/** Fields that say how an entry is kept rather than what hands do; told where they changed after the entry came. */
const KEPT = new Set(['name', 'unit', 'kind', 'resolution', 'source', 'positions']);
const fieldOf = ({ place }: Origin) => place.slice(place.lastIndexOf('.') + 1);
/** What a limit measures is told by its unit. */
const isKept = (origin: Origin) => KEPT.has(fieldOf(origin)) || /^limits\..*\.quantity$/.test(origin.place);

/** What is worth telling: the value that an entry is about first, and of the rest what somebody works by or what changed later. */
function worthTelling(origins: readonly Origin[]): Origin[] {
  const first = new Map<string, string>();
  for (const { subject, letter } of origins) {
    const known = first.get(subject);
    if (known === undefined || compareLetters(letter, known) < 0) first.set(subject, letter);
  }
  const told = origins.filter(
    (origin) => origin.subject === '' || !isKept(origin) || origin.letter !== first.get(origin.subject),
  );
  // A tool of which only the name is known is told by its name.
  const silent = origins.filter(
    (origin) => fieldOf(origin) === 'name' && !told.some(({ subject }) => subject === origin.subject),
  );
  return [...told, ...silent.map((origin) => ({ ...origin, words: '', text: null }))];
}

export function byRevision(origins: readonly Origin[]): SinceRevision[] {
  const since: SinceRevision[] = [];
  for (const origin of worthTelling(origins)) {
    const at = since.find(({ letter }) => letter === origin.letter);
    const revision = at ?? { letter: origin.letter, subjects: [] };
    if (!at) since.push(revision);
    const subject = revision.subjects.find((one) => one.subject === origin.subject);
    if (!subject) revision.subjects.push({ subject: origin.subject, origins: [origin] });
    // The value that it is about stands ahead of its conditions.
    else if (origin.words === '') subject.origins.unshift(origin);
    else subject.origins.push(origin);
  }
  return since.sort((a, b) => compareLetters(b.letter, a.letter));
}
