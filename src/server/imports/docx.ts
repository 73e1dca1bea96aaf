import mammoth from 'mammoth';
import { importHtml, type Imported } from '@/domain/writing/import/importHowTo';
import { scanPart, type PartOfDocument } from '@/domain/writing/import/ooxml';
import { BadZip, readZip } from './zip';

/** What the converter and the count of words read: no pictures, no macros, no fonts. */
const WANTED =
  /^(\[Content_Types\]\.xml|_rels\/.*\.rels|docProps\/.*\.xml|word\/[^/]*\.xml|word\/diagrams\/data\d*\.xml|word\/charts\/chart\d*\.xml|word\/_rels\/.*\.rels)$/i;
const BOUNDS = { entries: 2000, bytes: 16 * 1024 * 1024 };

const STYLES = ["p[style-name='Title'] => h1:fresh", 'comment-reference => sup', 'strike => s'];

const no = (message: string): Imported => ({ ok: false, message });

const BODY = /^word\/document\d*\.xml$/i;
const PARTS: [RegExp, PartOfDocument][] = [
  [BODY, 'body'],
  [/^word\/(footnotes|endnotes|comments)\.xml$/i, 'note'],
  [/^word\/header\d*\.xml$/i, 'header'],
  [/^word\/footer\d*\.xml$/i, 'footer'],
  [/^word\/diagrams\/data\d*\.xml$/i, 'diagram'],
  [/^word\/charts\/chart\d*\.xml$/i, 'chart'],
];

/** `options.file` of the converter: it takes the unpacked parts, and so never unpacks anything itself. */
function unpacked(parts: ReadonlyMap<string, Buffer>) {
  return {
    exists: (name: string) => parts.has(name),
    read: (name: string, encoding?: string) => {
      const bytes = parts.get(name);
      if (!bytes) return Promise.reject(new Error(`${name} is not among the parts.`));
      if (encoding === 'base64') return Promise.resolve(bytes.toString('base64'));
      return Promise.resolve(encoding ? new TextDecoder(encoding).decode(bytes) : new Uint8Array(bytes));
    },
  };
}

/** The bytes of a .docx as a draft; what cannot be read is refused in a sentence. */
export async function importDocx(file: Buffer): Promise<Imported> {
  let parts: Map<string, Buffer>;
  try {
    parts = new Map(readZip(file, (name) => WANTED.test(name), BOUNDS).map(({ name, bytes }) => [name, bytes]));
  } catch (error) {
    if (error instanceof BadZip) return no(error.message);
    throw error;
  }
  if (![...parts.keys()].some((name) => BODY.test(name)))
    return no('This is not a .docx document, whatever its name says. Save it as .docx, or paste its text.');
  const scanned = PARTS.flatMap(([pattern, place]) =>
    [...parts].flatMap(([name, bytes]) => (pattern.test(name) ? [scanPart(bytes.toString('utf8'), place)] : [])),
  );
  let html: string;
  try {
    const options = {
      styleMap: STYLES,
      // What a document says of how it wants to be read is not asked.
      includeEmbeddedStyleMap: false,
      convertImage: mammoth.images.imgElement(() => Promise.resolve({ src: '' })),
    };
    html = (await mammoth.convertToHtml({ file: unpacked(parts) } as never, options)).value;
  } catch {
    return no('The document cannot be read. Open it in a word processor, save it again as .docx, and try that one.');
  }
  return importHtml(
    html,
    scanned.map(({ words }) => words).join('\n'),
    scanned.flatMap(({ leftOut }) => leftOut),
  );
}
