import { createWriteStream } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { ReadableStream } from 'node:stream/web';
import busboy from 'busboy';
import { malformed, Refusal } from '../refusal';
import { lineEnds } from './form';

/** A file that was sent, as it lies on the disk. */
export interface SentFile {
  path: string;
  /** What its sender called it; a claim. */
  name: string;
  /** Bytes. */
  size: number;
}

export interface Upload {
  fields: Record<string, string>;
  /** null where none was chosen. */
  file: SentFile | null;
  /** Takes the file off the disk; call it whatever becomes of it. */
  discard: () => Promise<void>;
}

/** 413, with the fields that came along, so that a page can show them again. */
export class OverLimit extends Refusal {
  constructor(
    detail: string,
    readonly fields: Readonly<Record<string, string>>,
  ) {
    super(413, 'too-large', 'Too large', detail);
  }
}

/** Bytes of one text field: a text of 64 KB with the line ends that a browser sends, in the longest letters. */
const MOST_TEXT = 256 * 1024;
const MOST_FIELDS = 24;

export const isMultipart = (request: Request): boolean =>
  /^multipart\/form-data\b/i.test(request.headers.get('content-type') ?? '');

/** A form that is too large is read to its end up to so many times what its file may have. */
const MOST_READ = 5;

const tooLargeAFile = (most: number) =>
  `A file may have ${Math.round(most / 1024 / 1024)} MB at most. Send a smaller one.`;

/**
 * Streams a form with one file: its bytes go to a temporary file as they come in and never stand in memory.
 *
 * @param field name of the file's field; files under another name are passed over
 * @param most bytes that the file may have
 *
 * Refuses 413 a larger file or a field that is too long, but reads the form to its end, since a browser shows no answer to
 * a form that is cut off; 400 what is no form or breaks off. Nothing is left on the disk then.
 */
export async function readUpload(request: Request, field: string, most: number): Promise<Upload> {
  const folder = await mkdtemp(join(tmpdir(), 'matchmark-upload-'));
  const discard = () => rm(folder, { recursive: true, force: true });
  try {
    return { ...(await stream(request, field, most, join(folder, 'file'))), discard };
  } catch (error) {
    await discard();
    throw error;
  }
}

async function stream(request: Request, field: string, most: number, path: string) {
  const unreadable = () => malformed('The form could not be read. Go back and send it again.');
  if (!request.body) throw unreadable();
  const fields: Record<string, string> = {};
  let file: SentFile | null = null;
  let tooMuch: string | null = null;
  const written: Promise<void>[] = [];
  let form: busboy.Busboy;
  try {
    form = busboy({
      headers: { 'content-type': request.headers.get('content-type') ?? '' },
      defParamCharset: 'utf8',
      limits: {
        fileSize: most,
        fieldSize: MOST_TEXT,
        fields: MOST_FIELDS,
        files: 1,
        parts: MOST_FIELDS + 1,
        headerPairs: 40,
      },
    });
  } catch {
    throw unreadable();
  }
  form.on('field', (name, value, { valueTruncated, nameTruncated }) => {
    if (valueTruncated || nameTruncated) tooMuch = 'One of the fields is too long. Send less.';
    else fields[name] = lineEnds(value);
  });
  form.on('file', (name, content, { filename }) => {
    // A browser sends an unfilled file field as one without a name.
    if (name !== field || !filename) {
      content.resume();
      return;
    }
    const sent: SentFile = { path, name: filename.slice(0, 200), size: 0 };
    content.on('data', (chunk: Buffer) => (sent.size += chunk.length));
    content.on('limit', () => (tooMuch = tooLargeAFile(most)));
    file = sent;
    written.push(pipeline(content, createWriteStream(path, { flags: 'wx', mode: 0o600 })));
  });
  for (const limit of ['fieldsLimit', 'filesLimit', 'partsLimit'] as const)
    form.on(limit, () => (tooMuch = 'The form has too many fields.'));
  const body = Readable.fromWeb(request.body as ReadableStream) as AsyncIterable<Buffer>;
  let received = 0;
  async function* counted() {
    for await (const chunk of body) {
      received += chunk.length;
      if (received > MOST_READ * most) throw new Error('Far more than a file may have.');
      yield chunk;
    }
  }
  const cameIn = await settled(pipeline(counted, form));
  // A form that broke off ends its file too, so this does not wait for anything.
  const kept = await Promise.all(written.map(settled));
  if (received > MOST_READ * most) tooMuch ??= tooLargeAFile(most);
  if (tooMuch !== null) throw new OverLimit(tooMuch, fields);
  if (!cameIn) throw unreadable();
  if (kept.includes(false)) throw new Error('The file that was sent could not be written to the disk.');
  return { fields, file };
}

const settled = (work: Promise<void>): Promise<boolean> =>
  work.then(
    () => true,
    () => false,
  );
