import { deflateSync } from 'node:zlib';
import sharp from 'sharp';

/** Real pictures, made anew for each test. */

const blank = (width: number, height: number) =>
  sharp({ create: { width, height, channels: 3, background: '#7a8b87' } });

/** A picture whose every pixel differs, as a photo's do: it is as heavy to read and write as one. */
export const grain = (width: number, height: number) =>
  sharp({
    create: { width, height, channels: 3, background: '#808080', noise: { type: 'gaussian', mean: 128, sigma: 24 } },
  });

export const jpegOf = (width = 320, height = 200): Promise<Buffer> => blank(width, height).jpeg().toBuffer();
export const pngOf = (width = 320, height = 200): Promise<Buffer> => blank(width, height).png().toBuffer();
export const webpOf = (width = 320, height = 200): Promise<Buffer> => blank(width, height).webp().toBuffer();
export const avifOf = (width = 64, height = 64): Promise<Buffer> => blank(width, height).avif({ effort: 0 }).toBuffer();

/** A photo as a phone makes it: place, maker, a colour profile and XMP, and lying on its side (EXIF orientation 6). */
export const phonePhoto = (width = 320, height = 200): Promise<Buffer> =>
  blank(width, height)
    .withIccProfile('p3')
    .withExif({
      IFD0: { Make: 'Halden', Model: 'Bench phone', Orientation: '6', Artist: 'Lotte Vance' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '59/1 7/1 30/1', GPSLongitudeRef: 'E', GPSLongitude: '11/1 23/1 0/1' },
    })
    .withXmp(
      `<x:xmpmeta xmlns:x="adobe:ns:meta/"><rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#"><rdf:Description rdf:about="" xmlns:dc="http://purl.org/dc/elements/1.1/" dc:source="Northgate bench 2"/></rdf:RDF></x:xmpmeta>`,
    )
    .jpeg()
    .toBuffer();

/** Left half red, right half blue, as it lies in the file; `orientation` 6 says to turn it a quarter clockwise. */
export async function halves(orientation: number): Promise<Buffer> {
  const red = await sharp({ create: { width: 100, height: 100, channels: 3, background: '#ff0000' } })
    .png()
    .toBuffer();
  return sharp({ create: { width: 200, height: 100, channels: 3, background: '#0000ff' } })
    .composite([{ input: red, left: 0, top: 0 }])
    .withMetadata({ orientation })
    .jpeg({ quality: 95 })
    .toBuffer();
}

const chunk = (type: string, data: Buffer): Buffer => {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const head = Buffer.alloc(4);
  head.writeUInt32BE(data.length);
  const sum = Buffer.alloc(4);
  sum.writeUInt32BE(crc(body));
  return Buffer.concat([head, body, sum]);
};

/** CRC-32 as PNG has it (ISO/IEC 15948, Annex D). */
function crc(bytes: Buffer): number {
  let rest = 0xffffffff;
  for (const byte of bytes) {
    rest ^= byte;
    for (let bit = 0; bit < 8; bit++) rest = rest & 1 ? (rest >>> 1) ^ 0xedb88320 : rest >>> 1;
  }
  return (rest ^ 0xffffffff) >>> 0;
}

/** A sound PNG of one colour, one bit a pixel: 30,000 by 30,000 pixels weigh 110 KB and unpack to 2.7 GB in RGB. */
export function bomb(side = 30_000): Buffer {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(side, 0);
  head.writeUInt32BE(side, 4);
  head[8] = 1;
  const pixels = deflateSync(Buffer.alloc(side * (1 + Math.ceil(side / 8))), { level: 1 });
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', head),
    chunk('IDAT', pixels),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** Begins as a HEIC file does (ISO/IEC 23008-12): the brand is all that is looked at. */
export const heicHead = (): Buffer =>
  Buffer.concat([Buffer.from([0, 0, 0, 24]), Buffer.from('ftypheic\0\0\0\0mif1heic', 'latin1'), Buffer.alloc(64)]);
