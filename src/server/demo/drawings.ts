import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import type { UploadedPhoto } from '@/domain/api/schemas/photos';
import type { Actor } from '@/domain/people/may';
import { uploadPhoto } from '../photos/upload';
import { strokes } from './strokes';

/** Drawings that stand in for photos in the demonstration. They are ours, and each says on itself what it is. */

const INK = '#14191b';
const words = (text: string, x: number, y: number, size: number, weight = 4) =>
  `<path d="${strokes(text, x, y, size)}" fill="none" stroke="${INK}" stroke-width="${weight}" stroke-linecap="round" stroke-linejoin="round"/>`;
const leader = (x1: number, y1: number, x2: number, y2: number) =>
  `<path d="M${x1} ${y1}L${x2} ${y2}" stroke="${INK}" stroke-width="3"/><circle cx="${x2}" cy="${y2}" r="8" fill="${INK}"/>`;

const sheet = (
  inside: string,
) => `<svg xmlns="http://www.w3.org/2000/svg" width="1600" height="1200" viewBox="0 0 1600 1200">
  <rect width="1600" height="1200" fill="#fbfcfc"/>
  <rect x="30" y="30" width="1540" height="1140" fill="none" stroke="${INK}" stroke-width="5"/>
  ${inside}
  <path d="M30 1076H1570" stroke="${INK}" stroke-width="5"/>
  ${words('DEMONSTRATION DRAWING. NOT A PHOTO', 70, 1104, 40)}
</svg>`;

/** The rear corner of a valve cover from above: bead of sealant, two bolts, and where it weeps. */
const CORNER = sheet(`
  <path d="M160 260H1010Q1180 260 1180 430V1076H160Z" fill="#e6ebea" stroke="${INK}" stroke-width="6"/>
  <path d="M160 400H940Q1040 400 1040 500V1076H160Z" fill="#fbfcfc" stroke="${INK}" stroke-width="6"/>
  <path d="M160 330H975Q1110 330 1110 465V1076" fill="none" stroke="#4a5653" stroke-width="34"/>
  ${[
    [420, 330],
    [1110, 820],
  ]
    .map(
      ([x = 0, y = 0]) =>
        `<circle cx="${x}" cy="${y}" r="66" fill="#fbfcfc" stroke="${INK}" stroke-width="6"/>
         <path d="M${x - 40} ${y}l20-35h40l20 35l-20 35h-40z" fill="#d5dedb" stroke="${INK}" stroke-width="6"/>`,
    )
    .join('')}
  <path d="M1128 372q74 26 60 118q-4 46 22 96" fill="none" stroke="${INK}" stroke-width="13" stroke-dasharray="4 26" stroke-linecap="round"/>
  ${leader(1250, 196, 1166, 382)}
  ${words('WEEPS HERE', 1090, 126, 48)}
  ${leader(1290, 880, 1168, 842)}
  ${words('LOOSE', 1310, 862, 48)}
  ${leader(300, 196, 402, 300)}
  ${words('TIGHT', 210, 126, 48)}`);

/** Two sealing washers in section: a new one, and one that took a set. */
const washer = (x: number, high: number) =>
  `<path d="M${x} ${640 - high}h120v${high}h-120z M${x + 300} ${640 - high}h120v${high}h-120z" fill="#4a5653" stroke="${INK}" stroke-width="6"/>
   <path d="M${x + 120} ${640 - high}V640M${x + 300} ${640 - high}V640" stroke="${INK}" stroke-width="6"/>
   <path d="M${x - 60} 640H${x + 480}" stroke="${INK}" stroke-width="6"/>`;
const WASHERS = sheet(`
  ${washer(240, 190)}
  ${washer(940, 104)}
  ${words('NEW', 390, 720, 56)}
  ${words('AFTER 1 HEAT', 860, 720, 56)}
  <path d="M780 450V640M750 450H900M750 640H930" stroke="${INK}" stroke-width="3" fill="none"/>
  <path d="M780 536H930" stroke="${INK}" stroke-width="3" stroke-dasharray="14 12"/>
  ${words('PRESSED FLAT', 800, 250, 56)}
  ${leader(1010, 330, 1000, 580)}`);

export const DRAWINGS = {
  corner: {
    svg: CORNER,
    alt: 'Demonstration drawing: the rear corner of the valve cover from above; it weeps between a tight and a loose bolt.',
  },
  washers: {
    svg: WASHERS,
    alt: 'Demonstration drawing: two sealing washers in section, a new one and one pressed flat after one heat.',
  },
} as const;
export type Drawing = keyof typeof DRAWINGS;

/** Uploads a drawing as a person uploads a photo. */
export async function uploadDrawing(actor: Actor, name: Drawing): Promise<UploadedPhoto> {
  const folder = await mkdtemp(join(tmpdir(), 'matchmark-drawing-'));
  try {
    const path = join(folder, 'drawing.jpg');
    await sharp(Buffer.from(DRAWINGS[name].svg)).jpeg({ quality: 88 }).toFile(path);
    return await uploadPhoto(actor, path, DRAWINGS[name].alt);
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
