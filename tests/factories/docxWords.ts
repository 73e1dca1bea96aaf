import JSZip from 'jszip';
import { XmlDocument } from 'libxml2-wasm';

const NAMESPACES = {
  w: 'http://schemas.openxmlformats.org/wordprocessingml/2006/main',
  m: 'http://schemas.openxmlformats.org/officeDocument/2006/math',
};
const PARTS = /^word\/(document|footnotes|endnotes|comments|header\d*|footer\d*)\.xml$/;

/**
 * Every word of a .docx, by a general unpacker and libxml2: a line for each paragraph, what was deleted on a line of
 * its own. It shares nothing with the code that it checks.
 */
export async function docxWords(file: Buffer): Promise<string> {
  const zip = await JSZip.loadAsync(file);
  const lines: string[] = [];
  for (const name of Object.keys(zip.files).filter((name) => PARTS.test(name))) {
    const xml = XmlDocument.fromBuffer(await zip.file(name)!.async('uint8array'));
    const text = (path: string, of: { find: typeof xml.root.find }) =>
      of.find(path, NAMESPACES).map(({ content }) => content);
    for (const paragraph of xml.root.find('//w:p', NAMESPACES) as unknown as (typeof xml.root)[]) {
      lines.push(text('.//w:t[not(ancestor::w:del)]', paragraph).join(''));
      lines.push(...text('.//w:delText', paragraph), ...text('.//m:t', paragraph));
    }
    xml.dispose();
  }
  return lines.join('\n');
}
