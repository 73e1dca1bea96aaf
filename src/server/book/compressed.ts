import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';

export type Encoding = 'br' | 'gzip' | 'identity';

const brotli = promisify(brotliCompress);
const zip = promisify(gzip);

/** Up to here the best brotli takes less than half a second. */
const QUICK = 400_000;

function squeeze(bytes: Buffer<ArrayBuffer>, quality: number): Promise<Buffer<ArrayBuffer>> {
  return brotli(bytes, {
    params: {
      [constants.BROTLI_PARAM_QUALITY]: quality,
      [constants.BROTLI_PARAM_LGWIN]: 24,
      [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length,
    },
  });
}

/** Bytes that are sent often: compressed once, off the main thread, when they are first asked for. */
export class Compressed {
  readonly bytes: Buffer<ArrayBuffer>;
  readonly #made = new Map<Encoding, Promise<Buffer<ArrayBuffer>>>();

  constructor(bytes: Buffer<ArrayBuffer>) {
    this.bytes = bytes;
  }

  as(encoding: Encoding): Promise<Buffer<ArrayBuffer>> {
    if (encoding === 'identity') return Promise.resolve(this.bytes);
    const known = this.#made.get(encoding) ?? (encoding === 'br' ? this.#brotli() : zip(this.bytes));
    this.#made.set(encoding, known);
    return known;
  }

  /** Large ones go out at a middle quality until the best, which takes many seconds, is ready. */
  #brotli(): Promise<Buffer<ArrayBuffer>> {
    if (this.bytes.length <= QUICK) return squeeze(this.bytes, 11);
    const first = squeeze(this.bytes, 6);
    void first.then(async () => {
      const best = await squeeze(this.bytes, 11);
      this.#made.set('br', Promise.resolve(best));
    });
    return first;
  }
}

/** The best encoding a caller takes, from `Accept-Encoding`; a quality of 0 refuses it. */
export function acceptedEncoding(header: string | null): Encoding {
  const takes = (name: string): boolean =>
    (header ?? '').split(',').some((part) => {
      const [what, quality] = part.split(';').map((text) => text.trim().toLowerCase());
      return what === name && !/^q=0(\.0*)?$/.test(quality ?? '');
    });
  if (takes('br')) return 'br';
  return takes('gzip') ? 'gzip' : 'identity';
}
