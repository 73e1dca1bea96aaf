import type { Origin } from '@/domain/api/schemas/imports';
import type { Actor } from '@/domain/people/may';
import { BLANK_PROCEDURE } from '@/domain/procedure/blank';
import { readDraft, sourceOf } from '@/domain/writing/readDraft';
import { refuseOverlong } from '../book/check';
import { invalid } from '../refusal';
import { sheetToCopy } from './origin';
import { bookToWriteFor, startProcedure } from './startProcedure';
import { readTemplates } from './templates';

/** What a new procedure is begun from. */
export type Beginning =
  | { from: 'empty' }
  /** `name` of a template. */
  | { from: 'template'; name: string }
  | { from: 'copy'; number: string }
  | { from: 'import'; source: string; origin: Extract<Origin, { kind: 'import' }> };

/** The text under the title that was asked for; as it is where the form could not give it back. */
function titled(source: string, title: string): string {
  const draft = readDraft(source);
  return draft ? sourceOf({ ...draft, title: title.trim() || draft.title }) : source;
}

const importReason = ({ name, leftOut }: Extract<Origin, { kind: 'import' }>): string => {
  const lost = leftOut.filter(({ became }) => became === null).length;
  const from = name ? `Imported from “${name}”.` : 'Imported from a text that was pasted.';
  return lost === 0
    ? from
    : `${from} ${lost} ${lost === 1 ? 'passage' : 'passages'} could not be taken over and ${lost === 1 ? 'is' : 'are'} listed with it.`;
};

/**
 * Begins a new procedure under its own title. Returns the draft's id. Refuses as `startProcedure` does, a copy also as
 * `sheetToCopy`, and 422 a template that there is not.
 */
export async function beginProcedure(actor: Actor, book: string, title: string, beginning: Beginning): Promise<string> {
  const to = bookToWriteFor(actor, book);
  const start = async (source: string, reason: string, origin?: Origin) =>
    (await startProcedure(actor, { book, source: titled(source, title), reason, origin })).id;
  switch (beginning.from) {
    case 'empty':
      return start(BLANK_PROCEDURE, '');
    case 'template': {
      const template = (await readTemplates()).find(({ name }) => name === beginning.name);
      if (!template) throw invalid('Choose a template.', [{ path: 'template', message: 'Choose a template.' }]);
      return start(template.source, '');
    }
    case 'copy': {
      const { number, revision, source, book } = await sheetToCopy(actor, to, beginning.number);
      const { letter } = revision;
      // A shop's own number means nothing to others, and is none of their business.
      const what =
        book.kind === 'shop' && to.kind === 'common' ? `a sheet of ${book.name}` : `${number} revision ${letter}`;
      return start(source, `Copied from ${what}.`, { kind: 'copy', number, letter });
    }
    case 'import':
      refuseOverlong(beginning.source + JSON.stringify(beginning.origin.leftOut));
      return start(beginning.source, importReason(beginning.origin), beginning.origin);
  }
}
