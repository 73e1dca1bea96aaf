import { fileTypeFromBuffer } from 'file-type';
import { importMarkdown, type Imported } from '@/domain/writing/import/importHowTo';
import { importDocx } from './docx';

/** Some programs write the parts of a document in an order by which it is only known for an archive. */
const ARCHIVES = ['application/vnd.openxmlformats-officedocument.wordprocessingml.document', 'application/zip'];
const WANTED = 'Choose a .docx document or a text file of Markdown, or paste the text.';

/** What is to be made into a draft: the bytes of a file, or a text. */
export type ToImport = { bytes: Uint8Array } | { markdown: string };

const no = (message: string): Imported => ({ ok: false, message });

/** A file or a text as a draft. A file is told by what it holds, never by its name. */
export async function importAny(given: ToImport): Promise<Imported> {
  if ('markdown' in given) return importMarkdown(given.markdown);
  const bytes = Buffer.from(given.bytes);
  if (bytes.length === 0) return no(`The file is empty. ${WANTED}`);
  const type = await fileTypeFromBuffer(bytes);
  if (type && ARCHIVES.includes(type.mime)) return importDocx(bytes);
  if (type)
    return no(`This is not a .docx document, whatever its name says: it holds a file of type ${type.ext}. ${WANTED}`);
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    if (!text.includes('\0')) return importMarkdown(text);
  } catch {
    // Not a text in UTF-8; said below.
  }
  return no(`This file is neither a .docx document nor a text in UTF-8. ${WANTED}`);
}
