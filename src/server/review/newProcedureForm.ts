import { z } from 'zod';
import { LeftOut, type ImportedSheet } from '@/domain/api/schemas/imports';
import type { Actor } from '@/domain/people/may';
import { importText, importUpload, MOST_FILE, refuseWhoNeverWrites } from '../imports/importHowTo';
import { readForm, textsOf } from '../http/form';
import { isMultipart } from '../http/multipart';
import { OverLimit, readUpload, type Upload } from '../http/upload';
import { countCall } from '../http/rateLimit';
import { malformed, Refusal } from '../refusal';
import { beginProcedure, type Beginning } from './beginProcedure';

export const WAYS = ['empty', 'template', 'copy', 'import'] as const;
export type Way = (typeof WAYS)[number];

/** What stands in the form of the page. */
export interface TypedNew {
  title: string;
  book: string;
  from: Way;
  template: string;
  /** Number of the sheet to copy. */
  sheet: string;
  /** What it was looked up by. */
  q: string;
  markdown: string;
}

/** A document that was read and not stored. */
export interface ReadDocument {
  imported: Pick<ImportedSheet, 'source' | 'leftOut'> & Partial<ImportedSheet>;
  book: string;
  name: string;
  title: string;
}

export type NewOutcome =
  | { is: 'begun'; id: string }
  | { is: 'form'; status: number; typed: TypedNew; errors: Record<string, string> }
  | { is: 'read'; status: number; document: ReadDocument; error: string | null };

export const typedNew = (given: Record<string, string | undefined>): TypedNew => ({
  title: given['title'] ?? '',
  book: given['book'] ?? '',
  from: WAYS.find((way) => way === given['from']) ?? 'empty',
  template: given['template'] ?? '',
  sheet: given['sheet'] ?? '',
  q: (given['q'] ?? '').slice(0, 200),
  markdown: given['markdown'] ?? '',
});

const LeftOutField = z
  .string()
  .transform((text, context) => {
    try {
      return JSON.parse(text) as unknown;
    } catch {
      context.addIssue({ code: 'custom', message: 'is not what the page sent' });
      return z.NEVER;
    }
  })
  .pipe(z.array(LeftOut).max(600));

/** What the page of a document that was read sends back. */
const Read = z.object({
  book: z.string(),
  title: z.string(),
  source: z.string(),
  name: z.string().max(200).default(''),
  leftOut: LeftOutField,
});

/** Refusals that the author can mend on the page; the others have a page of their own. */
const MENDED_HERE = [403, 409, 413, 422];

/** The field that a refusal of a way speaks of. */
const FIELD: Record<Way, string> = { empty: 'title', template: 'template', copy: 'sheet', import: 'file' };

async function readDocument(actor: Actor, typed: TypedNew, upload: Upload | null): Promise<ReadDocument> {
  const { book, markdown } = typed;
  const pasted = !upload?.file;
  const imported =
    upload && !pasted ? await importUpload(actor, book, upload) : await importText(actor, book, markdown);
  return { imported, book, name: pasted ? '' : (upload?.file?.name ?? ''), title: imported.title };
}

function beginningOf(typed: TypedNew): Beginning | { missing: string; message: string } {
  switch (typed.from) {
    case 'template':
      return typed.template
        ? { from: 'template', name: typed.template }
        : { missing: 'template', message: 'Choose a template.' };
    case 'copy':
      return typed.sheet
        ? { from: 'copy', number: typed.sheet }
        : { missing: 'sheet', message: 'Look a sheet up, and choose it.' };
    default:
      return { from: 'empty' };
  }
}

async function act(actor: Actor, typed: TypedNew, upload: Upload | null, lookUp: boolean): Promise<NewOutcome> {
  const form = (status: number, errors: Record<string, string>): NewOutcome => ({ is: 'form', status, typed, errors });
  if (lookUp) return form(200, {});
  if (typed.from === 'import') {
    if (!upload?.file && !typed.markdown.trim()) return form(422, { file: 'Choose a file, or paste a text below.' });
    return { is: 'read', status: 200, document: await readDocument(actor, typed, upload), error: null };
  }
  const beginning = beginningOf(typed);
  const errors: Record<string, string> = {
    ...('missing' in beginning ? { [beginning.missing]: beginning.message } : {}),
    ...(typed.title.trim() ? {} : { title: 'Write which task it is.' }),
  };
  if ('missing' in beginning || Object.keys(errors).length > 0) return form(422, errors);
  return { is: 'begun', id: await beginProcedure(actor, typed.book, typed.title, beginning) };
}

/** Starts the draft of a document that was read on the page before. */
async function startRead(actor: Actor, fields: Record<string, string>): Promise<NewOutcome> {
  const read = Read.safeParse(fields);
  if (!read.success) throw malformed('The form came without some of its fields. Go back and send it again.');
  const { book, title, source, name, leftOut } = read.data;
  const document = { imported: { source, leftOut }, book, name, title };
  if (!title.trim()) return { is: 'read', status: 422, document, error: 'Write which task it is.' };
  try {
    const origin = { kind: 'import' as const, name, leftOut };
    return { is: 'begun', id: await beginProcedure(actor, book, title, { from: 'import', source, origin }) };
  } catch (error) {
    if (!(error instanceof Refusal) || error.status !== 422) throw error;
    return { is: 'read', status: 422, document, error: error.detail };
  }
}

/**
 * What the page for a new procedure sends: it looks a sheet up, reads a document and shows what it holds, or begins the
 * draft. What can be mended on the page comes back with what was typed; only a file must be chosen again.
 */
export async function actOnNewProcedure(actor: Actor, request: Request): Promise<NewOutcome> {
  let upload: Upload | null = null;
  let typed = typedNew({});
  try {
    refuseWhoNeverWrites(actor);
    await countCall(actor.personId, 'changing');
    upload = isMultipart(request) ? await readUpload(request, 'file', MOST_FILE) : null;
    const fields = upload ? upload.fields : textsOf(await readForm(request));
    if (fields['act'] === 'start-read') return await startRead(actor, fields);
    typed = typedNew(fields);
    return await act(actor, typed, upload, fields['act'] === 'look-up');
  } catch (error) {
    if (!(error instanceof Refusal) || !MENDED_HERE.includes(error.status)) throw error;
    if (error instanceof OverLimit) typed = typedNew({ ...error.fields, from: 'import' });
    const field = error.errors?.some(({ path }) => path === 'markdown') ? 'markdown' : FIELD[typed.from];
    return { is: 'form', status: error.status, typed, errors: { [field]: error.detail } };
  } finally {
    await upload?.discard();
  }
}
