import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import readExif from 'exif-reader';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readPicture, writePreview } from '../../../server/files/read-picture.ts';
import { cv, openCvReady } from '../../support/open-cv.ts';

const folder = mkdtempSync(path.join(os.tmpdir(), 'cw-upright-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** A stored picture without any symmetry. */
async function stored(orientation: number): Promise<Buffer> {
  const [width, height] = [360, 240];
  const data = Uint8Array.from({ length: width * height * 3 }, (_, i) => {
    const p = Math.floor(i / 3);
    const [x, y] = [(p % width) / width, Math.floor(p / width) / height];
    return [200 * x + 30, 200 * y + 30, 120 + 60 * Math.sin(7 * x + 3 * y)][i % 3]!;
  });
  return sharp(data, { raw: { width, height, channels: 3 } }).withExif({ IFD2: { FocalLengthIn35mmFilm: '26' } }).withMetadata({ orientation }).jpeg({ quality: 95, chromaSubsampling: '4:4:4' }).toBuffer();
}

describe('a photo stored in one of the eight orientations', () => {
  beforeAll(openCvReady);

  it.each([1, 2, 3, 4, 5, 6, 7, 8])('%i comes out upright as OpenCV turns and flips it by what exif-reader reads', async (orientation) => {
    const bytes = await stored(orientation);
    const file = path.join(folder, `${orientation}.jpg`);
    writeFileSync(file, bytes);
    const told = readExif((await sharp(bytes).metadata()).exif!).Image!.Orientation!;
    expect(told).toBe(orientation);

    const raw = await sharp(bytes).raw().toBuffer({ resolveWithObject: true });
    const from = cv.matFromArray(raw.info.height, raw.info.width, cv.CV_8UC3, Array.from(raw.data));
    const to = new cv.Mat();
    // Exif 2.32, tag 0x0112, in OpenCV's words: flip 1 is left to right, 0 is top to bottom, -1 both.
    if (told === 1) from.copyTo(to);
    else if (told === 2) cv.flip(from, to, 1);
    else if (told === 3) cv.rotate(from, to, cv.ROTATE_180);
    else if (told === 4) cv.flip(from, to, 0);
    else if (told === 5) cv.transpose(from, to);
    else if (told === 6) cv.rotate(from, to, cv.ROTATE_90_CLOCKWISE);
    else if (told === 7) { cv.transpose(from, to); cv.flip(to, to, -1); }
    else cv.rotate(from, to, cv.ROTATE_90_COUNTERCLOCKWISE);

    const place = path.join(folder, `${orientation}-preview.jpg`);
    const picture = await readPicture(file);
    await writePreview(file, place);
    const ours = await sharp(place).raw().toBuffer({ resolveWithObject: true });
    expect([picture.widthPx, picture.heightPx, ours.info.width, ours.info.height]).toEqual([to.cols, to.rows, to.cols, to.rows]);
    let sum = 0;
    for (let i = 0; i < ours.data.length; i++) sum += Math.abs(ours.data[i]! - to.data[i]!);
    for (const mat of [from, to]) mat.delete();
    // The preview is a JPEG again: within two grey levels on the average. Any other turn is out by tens.
    expect(sum / ours.data.length).toBeLessThan(2);
    expect(picture.focal35Mm).toBe(26);
  });
});
