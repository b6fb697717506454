/**
 * Turns a rendered scene into the demo photo: a little sensor noise and lens falloff, JPEG, and EXIF where
 * the scene asks for it (the pixels then lie turned in the file, as a phone stores them).
 *
 * Run from this folder: npx tsx finish-photo.ts <scene> <rendered.png>
 */
import { fileURLToPath } from 'node:url';
import sharp from 'sharp';
import { sceneNamed } from './scene-descriptions.ts';

const NOISE_STEPS = 1.5;
const CORNER_FALLOFF = 0.1;
const JPEG_QUALITY = 86;

/** A small repeatable source of noise (Park and Miller's "minimal standard" generator): roughly normal, unit spread. */
function grain(seed: number): () => number {
  let state = seed;
  const even = (): number => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
  return () => (even() + even() + even() - 1.5) * 2;
}

const [name, rendered] = process.argv.slice(2);
if (!rendered) throw new Error('Give a scene name and the rendered image.');
const { photo, name: scene } = sceneNamed(name);

const { data, info } = await sharp(rendered)
  .removeAlpha()
  .toColourspace('srgb')
  .raw()
  .toBuffer({ resolveWithObject: true });
if (info.width !== photo.width || info.height !== photo.height)
  throw new Error(
    `${rendered} is ${info.width} x ${info.height}; the scene asks for ${photo.width} x ${photo.height}.`,
  );

const noise = grain(20011);
const halfDiagonal = Math.hypot(info.width, info.height) / 2;
for (let row = 0; row < info.height; row += 1) {
  for (let column = 0; column < info.width; column += 1) {
    const outward = Math.hypot(column - info.width / 2, row - info.height / 2) / halfDiagonal;
    const gain = 1 - CORNER_FALLOFF * outward ** 4;
    const step = noise() * NOISE_STEPS;
    const at = (row * info.width + column) * 3;
    for (let channel = at; channel < at + 3; channel += 1)
      data[channel] = Math.max(0, Math.min(255, Math.round((data[channel] ?? 0) * gain + step)));
  }
}

const upright = sharp(data, { raw: { width: info.width, height: info.height, channels: 3 } });
// Orientation 6 is shown by turning the stored pixels a quarter turn clockwise, so they are stored turned back.
const stored = photo.orientation === 6 ? upright.rotate(270) : upright;
if (photo.taggedAs) {
  const { make, model, latitude, longitude } = photo.taggedAs;
  stored.withExif({
    IFD0: { Make: make, Model: model, Orientation: String(photo.orientation) },
    IFD3: { GPSLatitudeRef: 'N', GPSLatitude: latitude, GPSLongitudeRef: 'W', GPSLongitude: longitude },
  });
}
if (photo.orientation !== 1) stored.withMetadata({ orientation: photo.orientation });
const file = fileURLToPath(new URL(`${scene}.jpg`, import.meta.url));
const written = await stored.jpeg({ quality: JPEG_QUALITY, chromaSubsampling: '4:2:0' }).toFile(file);
console.log(`${scene}.jpg: ${written.width} x ${written.height}, ${(written.size / 1e6).toFixed(2)} MB`);
