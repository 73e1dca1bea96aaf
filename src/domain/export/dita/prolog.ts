import type { XMLBuilder } from 'xmlbuilder2/lib/interfaces';
import { SYSTEMS } from '../../procedure/systems';
import type { Frontmatter } from '../../procedure/schema';
import { element } from './nodes';

/** What the title block says of a revision. Dates are ISO 8601. */
export interface TaskFacts {
  number: string;
  letter: string;
  sheetCheck: string;
  standing: 'current' | 'superseded' | 'withdrawn';
  firstPublished: string;
  published: string;
  author: string;
  reviewers: readonly string[];
  book: string;
  /** Names of the engines it is for. */
  engines: readonly string[];
}

const day = (at: string): string => at.slice(0, 10);

/** Who wrote and reviewed it, when, for which engines, and by what it is known to be the sheet that it says it is. */
export function prolog(task: XMLBuilder, f: Frontmatter, facts: TaskFacts): void {
  const made = element(task, 'prolog');
  element(made, 'author', { type: 'creator' }, facts.author);
  for (const name of facts.reviewers) element(made, 'author', { type: 'contributor' }, name);
  const dates = element(made, 'critdates');
  element(dates, 'created', { date: day(facts.firstPublished) });
  element(dates, 'revised', { modified: day(facts.published) });
  const metadata = element(made, 'metadata');
  element(metadata, 'audience', { experiencelevel: f.skill });
  element(metadata, 'category', {}, SYSTEMS[f.system]);
  for (const engine of facts.engines) {
    const product = element(metadata, 'prodinfo');
    element(product, 'prodname', {}, engine);
    element(element(product, 'vrmlist'), 'vrm', { version: 'all' });
    element(product, 'component', {}, SYSTEMS[f.system]);
  }
  const others = {
    procedure: facts.number,
    revision: facts.letter,
    'sheet-check': facts.sheetCheck,
    standing: facts.standing,
    book: facts.book,
    'bench-time-minutes': String(f.minutes),
    critical: f.critical ? 'yes' : 'no',
  };
  for (const [name, content] of Object.entries(others)) element(metadata, 'othermeta', { name, content });
}
