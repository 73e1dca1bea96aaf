import { LARGEST_FILE } from '@/domain/photos/photos';
import type { Operation } from '@/domain/api/operation';
import { invalid } from '../refusal';
import { readJson } from './body';
import { FIELD_BYTES, receive } from './multipart';
import { textsOf } from './form';

/** What came with a call. */
export interface SentBody {
  /** Tells one body from another, for repeated calls with the same key. */
  print: string;
  value: unknown;
  /** Path of the temporary file of a call that takes one, else empty. */
  file: string;
  dispose: () => Promise<void>;
}

const nothing = async () => undefined;

/** Of a call whose route reads the body itself. */
export const NOTHING_SENT: SentBody = { print: '', value: undefined, file: '', dispose: nothing };

/** A form with one file. Refuses like `receive`, and 422 where the file is missing or empty. */
async function readFileForm(request: Request, field: string): Promise<SentBody> {
  const { fields, files, dispose } = await receive(request, {
    what: 'photo',
    files: 1,
    fileBytes: LARGEST_FILE,
    bodyBytes: LARGEST_FILE + FIELD_BYTES,
    overlong: 'refuse',
  });
  const [file] = files;
  if (!file || file.field !== field || file.bytes === 0) {
    await dispose();
    const message = file?.bytes === 0 ? 'This file is empty. Choose another one.' : 'Choose a photo.';
    throw invalid(message, [{ path: field, message }]);
  }
  const value = textsOf(fields);
  return { print: `${file.sha256}\n${JSON.stringify(value)}`, value, file: file.path, dispose };
}

/** Reads the body that an operation takes. */
export async function readBody({ body, file }: Operation, request: Request): Promise<SentBody> {
  if (body._def.typeName === 'ZodUndefined') return NOTHING_SENT;
  if (file !== null) return readFileForm(request, file);
  const { text, value } = await readJson(request);
  return { print: text, value, file: '', dispose: nothing };
}
