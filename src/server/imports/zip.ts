import { inflateRawSync } from 'node:zlib';

/**
 * The entries of a zip archive, read with bounds (PKWARE APPNOTE 6.3, sections 4.3.7, 4.3.12 and 4.3.16). What an entry
 * says of its size is a claim: the bytes are counted as they come out, and no entry gets more than is left in all.
 */
export interface ZipEntry {
  name: string;
  bytes: Buffer;
}

/** A file that cannot be read as an archive, in a sentence for whoever sent it. */
export class BadZip extends Error {
  override name = 'BadZip';
}

export interface ZipBounds {
  entries: number;
  /** Uncompressed bytes of all wanted entries together. */
  bytes: number;
}

const END = 0x06054b50;
const DIRECTORY = 0x02014b50;
const LOCAL = 0x04034b50;
const STORED = 0;
const DEFLATED = 8;

const broken = () =>
  new BadZip('The file is damaged. Open it in a word processor, save it again as .docx, and try that one.');
const bomb = () =>
  new BadZip('The file unpacks to more than a document of a how-to can hold. Divide it, or paste its text.');

/** Place of the record that ends the archive; a comment of 64 KB at most may stand behind it. */
function endOf(file: Buffer): number {
  for (let at = file.length - 22; at >= Math.max(0, file.length - 22 - 0xffff); at -= 1)
    if (file.readUInt32LE(at) === END && at + 22 + file.readUInt16LE(at + 20) === file.length) return at;
  throw broken();
}

function inflate(bytes: Buffer, most: number): Buffer {
  try {
    return inflateRawSync(bytes, { maxOutputLength: Math.max(1, most) });
  } catch (error) {
    throw (error as NodeJS.ErrnoException).code === 'ERR_BUFFER_TOO_LARGE' ? bomb() : broken();
  }
}

/** Unpacks the entries that `wanted` names. Throws `BadZip`. */
export function readZip(file: Buffer, wanted: (name: string) => boolean, bounds: ZipBounds): ZipEntry[] {
  try {
    return entriesOf(file, wanted, bounds);
  } catch (error) {
    // A place outside of the file: the archive contradicts itself.
    throw error instanceof RangeError ? broken() : error;
  }
}

function entriesOf(file: Buffer, wanted: (name: string) => boolean, bounds: ZipBounds): ZipEntry[] {
  if (file.length < 22) throw broken();
  const end = endOf(file);
  const count = file.readUInt16LE(end + 10);
  let at = file.readUInt32LE(end + 16);
  if (count === 0xffff || at === 0xffffffff) throw broken();
  if (count > bounds.entries) throw bomb();
  const out: ZipEntry[] = [];
  let left = bounds.bytes;
  for (let i = 0; i < count; i += 1) {
    if (file.readUInt32LE(at) !== DIRECTORY) throw broken();
    const [flags, method] = [file.readUInt16LE(at + 8), file.readUInt16LE(at + 10)];
    const [packed, claimed] = [file.readUInt32LE(at + 20), file.readUInt32LE(at + 24)];
    const [nameLength, extra, comment] = [28, 30, 32].map((offset) => file.readUInt16LE(at + offset)) as [
      number,
      number,
      number,
    ];
    const local = file.readUInt32LE(at + 42);
    const name = file.toString('utf8', at + 46, at + 46 + nameLength);
    at += 46 + nameLength + extra + comment;
    if (!wanted(name)) continue;
    if (flags & 1) throw new BadZip('The file is locked with a password. Take the password off, and try again.');
    if (claimed > left) throw bomb();
    if (file.readUInt32LE(local) !== LOCAL) throw broken();
    const from = local + 30 + file.readUInt16LE(local + 26) + file.readUInt16LE(local + 28);
    const bytes = file.subarray(from, from + packed);
    if (bytes.length !== packed) throw broken();
    if (method !== STORED && method !== DEFLATED) throw broken();
    const plain = method === STORED ? bytes : inflate(bytes, left);
    if (plain.length > left) throw bomb();
    left -= plain.length;
    out.push({ name, bytes: plain });
  }
  return out;
}
