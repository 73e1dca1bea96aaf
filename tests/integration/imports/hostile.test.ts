import { monitorEventLoopDelay } from 'node:perf_hooks';
import JSZip from 'jszip';
import { afterAll, describe, expect, it } from 'vitest';
import { importSafely, stopImporting } from '@/server/imports/importing';
import * as d from '../../factories/documents';

afterAll(stopImporting);

const W = 'http://schemas.openxmlformats.org/wordprocessingml/2006/main';
const xmlOf = (body: string) => `<?xml version="1.0"?><w:document xmlns:w="${W}"><w:body>${body}</w:body></w:document>`;

/** A sound document with one part put in place of another. */
async function withPart(name: string, content: string | Buffer): Promise<Buffer> {
  const zip = await JSZip.loadAsync(await d.docx([d.heading(1, 'Fit it'), d.para('Words')]));
  zip.file(name, content);
  return zip.generateAsync({ type: 'nodebuffer', compression: 'DEFLATE' });
}
const withBody = (body: string) => withPart('word/document.xml', xmlOf(body));
const paragraph = (text: string) => `<w:p><w:r><w:t>${text}</w:t></w:r></w:p>`;

/** Where the central directory names an entry, in the bytes of an archive. */
function directoryOf(file: Buffer, name: string): number {
  for (
    let at = file.indexOf('PK\u0001\u0002', 0, 'latin1');
    at >= 0;
    at = file.indexOf('PK\u0001\u0002', at + 4, 'latin1')
  )
    if (file.toString('utf8', at + 46, at + 46 + file.readUInt16LE(at + 28)) === name) return at;
  throw new Error(`${name} is not in the archive.`);
}

async function answer(bytes: Uint8Array | string): Promise<string> {
  const read = await importSafely(typeof bytes === 'string' ? { markdown: bytes } : { bytes: new Uint8Array(bytes) });
  return read.ok ? 'ok' : read.message;
}

const BOMB = /unpacks to more than a document of a how-to can hold/;
const DAMAGED = /damaged|cannot be read|could not be read/;
const NOT_DOCX = /not a \.docx document, whatever its name says/;

describe('a hostile file is refused in a sentence', { timeout: 60_000 }, () => {
  it('an archive that unpacks to far more than it weighs', async () => {
    const file = await withPart('word/document.xml', Buffer.alloc(40 * 1024 * 1024, 0x20));
    expect(file.length).toBeLessThan(200_000);
    expect(await answer(file)).toMatch(BOMB);
  });

  it('one that lies about what it unpacks to', async () => {
    const file = await withPart('word/document.xml', Buffer.alloc(40 * 1024 * 1024, 0x20));
    file.writeUInt32LE(100, directoryOf(file, 'word/document.xml') + 24);
    expect(await answer(file)).toMatch(BOMB);
  });

  it('one with many thousand entries', async () => {
    const zip = await JSZip.loadAsync(await d.docx([d.para('Words')]));
    for (let i = 0; i < 2500; i += 1) zip.file(`x/${i}`, '');
    expect(await answer(await zip.generateAsync({ type: 'nodebuffer' }))).toMatch(BOMB);
  });

  it('one that is locked, cut off, or points outside of itself', async () => {
    const locked = await withBody(paragraph('Words'));
    locked.writeUInt16LE(1, directoryOf(locked, 'word/document.xml') + 8);
    expect(await answer(locked)).toMatch(/locked with a password/);
    const whole = await withBody(paragraph('Words'));
    expect(await answer(whole.subarray(0, whole.length / 2))).toMatch(DAMAGED);
    const outside = Buffer.from(whole);
    outside.writeUInt32LE(0x7fffffff, directoryOf(outside, 'word/document.xml') + 42);
    expect(await answer(outside)).toMatch(DAMAGED);
  });

  it('another kind of file under the name of a document', async () => {
    const program = Buffer.concat([Buffer.from('MZ\x90\0\x03\0\0\0', 'latin1'), Buffer.alloc(300)]);
    const zip = await new JSZip().file('notes.txt', 'words').generateAsync({ type: 'nodebuffer' });
    for (const file of [
      program,
      zip,
      Buffer.from('%PDF-1.7\n%âãÏÓ\n'),
      Buffer.from('\x89PNG\r\n\x1a\n\0\0\0\rIHDR', 'latin1'),
    ])
      expect(await answer(file)).toMatch(NOT_DOCX);
    expect(await answer(new Uint8Array())).toMatch(/is empty/);
    for (const file of [Buffer.from([0xc3, 0x28, 0x41]), Buffer.from('words\0words')])
      expect(await answer(file)).toMatch(/neither a \.docx document nor a text/);
  });

  it('tables in tables without end, and a part that is no XML', async () => {
    const depth = 20_000;
    const nested = `${'<w:tbl><w:tr><w:tc>'.repeat(depth)}${paragraph('deep')}${'</w:tc></w:tr></w:tbl>'.repeat(depth)}`;
    expect(await answer(await withBody(nested))).toMatch(/cannot be read|could not be read|cannot be made|too long/);
    expect(await answer(await withPart('word/document.xml', '<w:document'))).not.toBe('ok');
  });

  it('five megabytes of brackets, as text and in a document', async () => {
    const brackets = '['.repeat(5 * 1024 * 1024);
    expect(await answer(Buffer.from(brackets))).toMatch(/larger than 64 KB/);
    expect(await answer(brackets)).toMatch(/larger than 64 KB/);
    expect(await answer(await withBody(paragraph(brackets)))).toMatch(/more than fits into one sheet/);
  });
});

it('keeps everybody else served while it reads a bad one, and reads the next', { timeout: 60_000 }, async () => {
  const slow = await withBody(Array.from({ length: 40_000 }, (_, i) => paragraph(`w${i}`)).join(''));
  await answer('# Warm up\n\nWords');
  const delay = monitorEventLoopDelay({ resolution: 5 });
  delay.enable();
  expect(await answer(slow)).not.toBe('ok');
  delay.disable();
  expect(delay.max / 1e6).toBeLessThan(500);
  expect(await answer('# Fit it\n\n1. Go')).toBe('ok');
});

describe('what looks like a program', () => {
  it('is words in a document, and HTML in a text is left out', async () => {
    const script = '<script>alert(1)</script>';
    const read = await importSafely({
      bytes: new Uint8Array(await d.docx([d.heading(1, 'T'), d.para(script), d.para('=cmd|x')])),
    });
    expect(read.ok && read.imported.source).toContain('\\<script>alert(1)\\</script>');
    const text = await importSafely({ markdown: `# T\n\n1. Go\n\n${script}\n\n<img src=x onerror=alert(1)>` });
    expect(text.ok && text.imported.source).not.toMatch(/script|onerror/);
    expect(text.ok && text.imported.leftOut.map(({ what }) => what)).toEqual(['HTML']);
  });

  it('is not followed: no address of the document is fetched, no picture is opened', async () => {
    const rels = `<?xml version="1.0"?><Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships"><Relationship Id="rId1" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/image" Target="file:///etc/passwd" TargetMode="External"/></Relationships>`;
    const blip = `<w:p><w:r><w:drawing><wp:inline xmlns:wp="http://schemas.openxmlformats.org/drawingml/2006/wordprocessingDrawing"><wp:docPr id="1" name="p" descr="a drum"/><a:graphic xmlns:a="http://schemas.openxmlformats.org/drawingml/2006/main"><a:graphicData><pic:pic xmlns:pic="http://schemas.openxmlformats.org/drawingml/2006/picture"><pic:blipFill><a:blip r:link="rId1" xmlns:r="http://schemas.openxmlformats.org/officeDocument/2006/relationships"/></pic:blipFill></pic:pic></a:graphicData></a:graphic></wp:inline></w:drawing></w:r></w:p>`;
    const zip = await JSZip.loadAsync(await withBody(paragraph('Words') + blip));
    zip.file('word/_rels/document.xml.rels', rels);
    const read = await importSafely({ bytes: new Uint8Array(await zip.generateAsync({ type: 'nodebuffer' })) });
    expect(JSON.stringify(read)).not.toMatch(/root:|passwd/);
    expect(read.ok).toBe(true);
  });
});
