import { createHash, randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { ReadableStream as NodeStream } from 'node:stream/web';
import busboy from 'busboy';
import { app } from '../context';
import { storeFails } from '../files/store';
import { malformed, Refusal, tooLarge } from '../refusal';

/** A file as it was sent, in a temporary file whose name is ours. */
export interface SentFile {
  /** Name of its field. */
  field: string;
  /** What its sender called it; a claim. */
  name: string;
  path: string;
  bytes: number;
  /** Hex. */
  sha256: string;
  /** Larger than allowed; what was over is not in it. */
  overlong: boolean;
}

export interface Sent {
  /** The text fields. */
  fields: FormData;
  files: SentFile[];
  /** Deletes the temporary files. */
  dispose: () => Promise<void>;
}

export interface Limits {
  /** What the files are called in a refusal. */
  what: 'photo' | 'file';
  files: number;
  /** Of one file. */
  fileBytes: number;
  /** Of one text field. */
  fieldBytes?: number;
  /** Of the whole body. */
  bodyBytes: number;
  /** A file that is too large ends the reading with 413, or is marked and the rest is still read. */
  overlong: 'refuse' | 'mark';
}

/** Bytes that the text fields and the marks between the parts may take beside the files. */
export const FIELD_BYTES = 64 * 1024;

export const isMultipart = (request: Request): boolean =>
  /^multipart\/form-data\s*;/i.test(request.headers.get('content-type') ?? '');

/** "A photo may have 15 MB at most. Send a smaller one." */
export const overWords = (what: Limits['what'], fileBytes: number) =>
  `A ${what} may have ${megabytes(fileBytes)} MB at most. Send a smaller one.`;
const megabytes = (bytes: number) => Math.floor(bytes / (1024 * 1024));
/** The rest of the body is not read, so the connection cannot be used for another request. */
const over = ({ what, fileBytes }: Limits) =>
  new Refusal(413, 'too-large', 'Too large', overWords(what, fileBytes), { headers: { connection: 'close' } });

/** So many forms with files come in at once; each may hold its bytes on the disk for minutes. */
const MOST_OPEN = 24;
let open = 0;
const busy = () =>
  new Refusal(503, 'busy', 'Busy', 'Many files are coming in just now. Nothing was kept; try again in a minute.', {
    headers: { 'Retry-After': '30', connection: 'close' },
  });

/** Where files lie while they are looked at; emptied at each start. */
export const uploadFolder = async (): Promise<string> => join((await app()).config.dataDir, 'uploads');

function parserOf(request: Request, { files, fileBytes, fieldBytes = FIELD_BYTES }: Limits): busboy.Busboy {
  try {
    return busboy({
      headers: { 'content-type': request.headers.get('content-type') ?? '' },
      defParamCharset: 'utf8',
      // One byte more than allowed tells one that is too large from one that is just right.
      limits: {
        files,
        fileSize: fileBytes + 1,
        fields: 40,
        fieldSize: fieldBytes,
        parts: files + 40,
        headerPairs: 20,
      },
    });
  } catch {
    throw malformed('The form has no boundary between its parts. Send it as multipart/form-data.');
  }
}

/** Writes one file to disk as it comes in, and hashes it on the way. */
async function writeOut(
  { field, name }: Pick<SentFile, 'field' | 'name'>,
  stream: Readable,
  folder: string,
  limits: Limits,
): Promise<SentFile | null> {
  const path = join(folder, randomUUID());
  const hash = createHash('sha256');
  let bytes = 0;
  const tap = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      bytes += chunk.length;
      if (bytes > limits.fileBytes && limits.overlong === 'refuse') return done(over(limits));
      hash.update(chunk);
      done(null, chunk);
    },
  });
  try {
    await pipeline(stream, tap, createWriteStream(path, { flags: 'wx', mode: 0o600 }));
  } catch (error) {
    await rm(path, { force: true });
    if (/^(ENOSPC|EDQUOT|EROFS|EACCES|EIO|ENOENT)$/.test(String((error as NodeJS.ErrnoException).code)))
      throw storeFails(error);
    throw error;
  }
  return { field, name, path, bytes, sha256: hash.digest('hex'), overlong: bytes > limits.fileBytes };
}

/**
 * Reads a `multipart/form-data` body as it comes in: files to disk, never into memory, and no further than the limits, whatever
 * `Content-Length` says or leaves out. A field for a file that was left empty gives none.
 *
 * Refuses 413 over a limit, 415 another content type, 400 what is cut off or malformed, 503 where the disk is full.
 */
export async function receive(request: Request, limits: Limits): Promise<Sent> {
  if (open >= MOST_OPEN) throw busy();
  open += 1;
  try {
    return await receiveNow(request, limits);
  } finally {
    open -= 1;
  }
}

async function receiveNow(request: Request, limits: Limits): Promise<Sent> {
  if (!isMultipart(request))
    throw new Refusal(
      415,
      'not-multipart',
      'Not a form with a file',
      `Send the ${limits.what} as multipart/form-data.`,
    );
  if (Number(request.headers.get('content-length') ?? 0) > limits.bodyBytes) throw over(limits);
  if (!request.body) throw malformed(`The body is empty; this call needs a form with a ${limits.what}.`);
  const parser = parserOf(request, limits);
  const folder = await uploadFolder();
  await mkdir(folder, { recursive: true, mode: 0o700 }).catch((error: unknown) => Promise.reject(storeFails(error)));

  const fields = new FormData();
  const writing: Promise<SentFile | null>[] = [];
  const dispose = async () => {
    for (const file of await Promise.allSettled(writing))
      if (file.status === 'fulfilled' && file.value) await rm(file.value.path, { force: true });
  };
  const source = Readable.fromWeb(request.body as NodeStream);
  try {
    await new Promise<void>((resolve, reject) => {
      let bytes = 0;
      source.on('data', (chunk: Buffer) => {
        bytes += chunk.length;
        if (bytes > limits.bodyBytes) reject(over(limits));
      });
      parser.on('field', (name, value, { valueTruncated }) => {
        if (valueTruncated) reject(tooLarge('A field of the form is too long.'));
        else fields.append(name, value);
      });
      parser.on('file', (name, stream, { filename }) => {
        if (!filename) return void stream.resume();
        const written = writeOut({ field: name, name: filename.slice(0, 200) }, stream, folder, limits);
        written.catch(reject);
        writing.push(written);
      });
      for (const limit of ['filesLimit', 'fieldsLimit', 'partsLimit'] as const)
        parser.on(limit, () =>
          reject(
            tooLarge(
              `The form has too many parts; ${limits.files} ${limits.what}${limits.files === 1 ? ' fits' : 's fit'} in one.`,
            ),
          ),
        );
      parser.on('close', resolve);
      parser.on('error', () => reject(malformed('The form is cut off or damaged. Send it again.')));
      source.on('error', () => reject(malformed('The connection broke off before all of it had come. Send it again.')));
      source.pipe(parser);
    });
    const files = (await Promise.all(writing)).flatMap((file) => (file ? [file] : []));
    return { fields, files, dispose };
  } catch (error) {
    // Not read any further, and not cancelled either: that would cut the line on which the answer goes out.
    source.unpipe(parser);
    source.pause();
    parser.destroy();
    await dispose();
    throw error;
  }
}
