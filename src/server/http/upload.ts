import { Refusal } from '../refusal';
import { textsOf } from './form';
import { overWords, receive, type SentFile } from './multipart';

/** A form with one file that was chosen, or none. */
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

/** A form that is too large is read to its end up to so many times what its file may have. */
const MOST_READ = 5;

/**
 * Streams a form with one file: its bytes go to a temporary file as they come in and never stand in memory.
 *
 * @param field name of the file's field; files under another name are passed over
 * @param most bytes that the file may have
 *
 * Refuses like `receive`. A larger file is `OverLimit`, and the form is read to its end all the same, since a browser shows
 * no answer to a form that is cut off. Nothing is left on the disk then.
 */
export async function readUpload(request: Request, field: string, most: number): Promise<Upload> {
  const { fields, files, dispose } = await receive(request, {
    what: 'file',
    files: 1,
    fileBytes: most,
    fieldBytes: MOST_TEXT,
    bodyBytes: MOST_READ * most + MOST_TEXT,
    overlong: 'mark',
  });
  const texts = textsOf(fields);
  const file = files.find((one) => one.field === field) ?? null;
  if (file?.overlong) {
    await dispose();
    throw new OverLimit(overWords('file', most), texts);
  }
  return { fields: texts, file, discard: dispose };
}
