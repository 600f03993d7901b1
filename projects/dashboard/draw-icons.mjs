/** `node projects/dashboard/draw-icons.mjs`: draws the icons of the installed product anew from the mark. */
import { readFileSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';

const folder = path.join(import.meta.dirname, 'public');
/** Paper, seam and bead of the light theme: a home screen tells nothing of the theme inside. */
const [paper, seam, bead] = ['#f6f4ef', '#1e2a2f', '#8c3a22'];
const mark = readFileSync(path.join(folder, 'mark.svg'), 'utf8')
  .replace(/^[\s\S]*<\/style>/, '')
  .replace('</svg>', '')
  .replaceAll('class="seam"', `fill="${seam}"`)
  .replaceAll('class="bead"', `fill="${bead}"`);

// A maskable icon may be cut to the circle of 80 % of its width (W3C Web Application Manifest, icon masks).
const icons = [
  { name: 'icon-192', size: 192, markShare: 0.8, corner: 0.18 },
  { name: 'icon-512', size: 512, markShare: 0.8, corner: 0.18 },
  { name: 'icon-maskable-512', size: 512, markShare: 0.6, corner: 0 },
  { name: 'icon-apple-180', size: 180, markShare: 0.74, corner: 0 },
];

for (const { name, size, markShare, corner } of icons) {
  const units = 34 / markShare;
  const edge = (units - 34) / 2;
  const drawn = `<svg xmlns="http://www.w3.org/2000/svg" width="${size}" height="${size}" viewBox="${-edge} ${-edge} ${units} ${units}">
    <rect x="${-edge}" y="${-edge}" width="${units}" height="${units}" rx="${units * corner}" fill="${paper}"/>${mark}</svg>`;
  await sharp(Buffer.from(drawn))
    .png({ compressionLevel: 9 })
    .toFile(path.join(folder, 'icons', `${name}.png`));
}
