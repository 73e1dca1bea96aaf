import { convert } from '../measure/convert';
import type { SearchBook, Search } from './engine';

/** A query that finds something in this very book, and what it shows about looking things up. */
export interface Suggestion {
  query: string;
  says: string;
}

const FASTENERS = /^(bolt|screw|stud|nut|plug)s?$/i;
/** A word of a name that says which one it is. */
const tellingWord = (name: string): string | undefined =>
  name.split(/[\s,]+/).find((word) => /^\p{L}{4,}$/u.test(word) && !FASTENERS.test(word));
const firstOf = <T, R>(items: readonly T[], make: (item: T) => R | undefined): R | undefined => {
  for (const item of items) {
    const made = make(item);
    if (made !== undefined) return made;
  }
  return undefined;
};

/** A small torque as an inch wrench shows it: "89 lbf in cover". */
function byTorque({ documents }: SearchBook): string | undefined {
  return firstOf(documents, ({ torques }) =>
    firstOf(torques, ({ nm, name, count }) => {
      const inches = convert(nm, 'N·m', 'lbf·in');
      const word = tellingWord(name);
      return nm >= 5 && nm <= 15 && count > 8 && word && inches.ok
        ? `${Math.round(inches.value)} lbf in ${word.toLowerCase()}`
        : undefined;
    }),
  );
}

/** A clearance as a feeler gauge in inches shows it: "8 thou intake". */
function byClearance({ documents }: SearchBook): string | undefined {
  return firstOf(documents, ({ limits }) =>
    firstOf(limits, ({ unit, nominal, name }) => {
      const thou = unit === 'mm' && nominal !== null ? convert(nominal, 'mm', 'thou') : null;
      const word = tellingWord(name);
      return thou?.ok && thou.value >= 4 && thou.value <= 40 && word
        ? `${Math.round(thou.value)} thou ${word.toLowerCase()}`
        : undefined;
    }),
  );
}

/** Another name for what a title says: "rocker cover" for a sheet that says valve cover. */
function byOtherName({ documents, vocabulary }: SearchBook): string | undefined {
  return firstOf(vocabulary, ({ terms: [preferred, other] }) =>
    preferred && other?.includes(' ') && documents.some(({ title }) => title.toLowerCase().includes(preferred))
      ? other
      : undefined,
  );
}

/** Up to six queries, each of another kind, that find something in this book; none for an empty book. */
export function suggestions(book: SearchBook, search: Search): Suggestion[] {
  const [first] = book.documents;
  const engine = book.engines.find(({ key }) => book.documents.some(({ engines }) => engines.includes(key)));
  const part = firstOf(book.documents, ({ parts }) => parts.find(({ number }) => number !== null)?.number ?? undefined);
  const candidates: [string | undefined, string][] = [
    [byTorque(book), 'A torque in any unit, and what it holds'],
    [byOtherName(book), 'What your shop calls it'],
    [byClearance(book), 'A clearance off an inch gauge'],
    [part, 'A part number'],
    [engine && `${engine.aliases[0] ?? engine.name} pump`, 'An engine and a part'],
    [first?.number.replace(/^P-0*/, 'p'), 'The number on a printed sheet'],
  ];
  return candidates
    .flatMap(([query, says]) =>
      query !== undefined && !search.query(query).near && search.query(query).total > 0 ? [{ query, says }] : [],
    )
    .slice(0, 6);
}
