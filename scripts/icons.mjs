import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import sharp from 'sharp';

/** Draws the PNG icons from public/favicon.svg; run it after changing the drawing. */
const at = (name) => fileURLToPath(new URL(`../public/${name}`, import.meta.url));
const drawing = readFileSync(at('favicon.svg'));
for (const size of [32, 180, 512])
  await sharp(drawing, { density: 72 * (size / 32) })
    .resize(size)
    .png({ compressionLevel: 9 })
    .toFile(at(`favicon-${size}.png`));
