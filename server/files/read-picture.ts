import { open } from 'node:fs/promises';
import readExif from 'exif-reader';
import sharp from 'sharp';
import { ProblemError } from '../http/problems.ts';
import type { Ending } from './file-store.ts';

export const mostPixels = 60e6;
const leastSidePx = 200;
export const previewSidePx = 2048;

export interface Picture {
  ending: Extract<Ending, 'jpg' | 'png' | 'webp'>;
  /** Size once upright, px. */
  widthPx: number;
  heightPx: number;
  /** Focal length as if on 35 mm film, mm, where the camera wrote it (Exif 2.32, tag 0xA405; nought means unknown). */
  focal35Mm: number | null;
}

/**
 * What an uploaded file is, by its content alone and before any of it is decoded.
 * Throws ProblemError, in words for whoever sent it, unless it is a JPEG, PNG or WebP of a size that can be used.
 */
export async function readPicture(file: string): Promise<Picture> {
  const ending = pictureKind(await firstBytes(file, 64));
  const header = await sharp(file, { limitInputPixels: false, failOn: 'error' }).metadata().catch(() => null);
  const { width = 0, height = 0 } = header ?? {};
  if (!header || width < 1 || height < 1) throw new ProblemError('wrong-type', damaged);
  if (width * height > mostPixels) {
    throw new ProblemError('too-large', `This picture has ${Math.round((width * height) / 1e6)} megapixels (${width} × ${height}); at most 60 are taken. Please send it smaller.`);
  }
  if (Math.min(width, height) < leastSidePx) {
    throw new ProblemError('bad-input', `This picture is only ${width} × ${height} pixels, too small to measure a wall by. Please send the photo as the camera took it.`);
  }
  const turned = (header.orientation ?? 1) >= 5;
  return { ending, widthPx: turned ? height : width, heightPx: turned ? width : height, focal35Mm: focal35MmIn(header.exif) };
}

/**
 * Decodes the whole picture and writes it upright, at most 2048 px on a side, as JPEG in sRGB with no metadata.
 * Throws ProblemError where the picture is cut off or damaged.
 */
export async function writePreview(file: string, place: string): Promise<void> {
  try {
    await sharp(file, { limitInputPixels: mostPixels + 1, failOn: 'error' })
      .timeout({ seconds: 60 })
      .autoOrient()
      .resize(previewSidePx, previewSidePx, { fit: 'inside', withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .toColourspace('srgb')
      .jpeg({ quality: 84 })
      .toFile(place);
  } catch (error) {
    // A full disk is ours to know of; everything else the decoder complains of is the picture's.
    if (/no space|ENOSPC|unable to write/i.test((error as Error).message)) throw error;
    throw new ProblemError('wrong-type', damaged);
  }
}

const damaged = 'This picture is cut off or damaged, so it cannot be read to its end. Please copy it from the camera again and send it once more.';

/** Whatever an Exif block holds, it never stops a photo: what cannot be read is not known. */
function focal35MmIn(exif: Buffer | undefined): number | null {
  if (!exif) return null;
  try {
    const told = readExif(exif).Photo?.FocalLengthIn35mmFilm;
    return typeof told === 'number' && told >= 5 && told <= 300 ? told : null;
  } catch {
    return null;
  }
}

/** Told by the file's first bytes; its name and declared type are not believed. */
function pictureKind(head: Buffer): Picture['ending'] {
  if (head.length === 0) throw new ProblemError('wrong-type', 'This file is empty. Please choose the photo again.');
  if (head[0] === 0xff && head[1] === 0xd8 && head[2] === 0xff) return 'jpg';
  if (head.subarray(0, 8).equals(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]))) return 'png';
  const latin = head.toString('latin1');
  if (latin.startsWith('RIFF') && latin.slice(8, 12) === 'WEBP') return 'webp';
  throw new ProblemError('wrong-type', otherKind(latin));
}

function otherKind(head: string): string {
  const brand = head.slice(4, 8) === 'ftyp' ? head.slice(8, 12) : null;
  const taken = 'Photos are taken as JPEG, PNG or WebP.';
  if (brand && /^(hei[cxsm]|hev[cxsm]|mif1|msf1)$/.test(brand)) {
    return 'This is a HEIC photo, which cannot be read here. To get a JPEG: in the phone’s camera settings choose the most compatible format and take it again, or open the photo, share it and save a copy as JPEG.';
  }
  if (brand && /^avi[fs]$/.test(brand)) return `This is an AVIF picture. ${taken} Please save a copy as JPEG.`;
  if (brand) return `This is a film, not a photo. ${taken}`;
  if (/^GIF8/.test(head)) return `This is a GIF picture. ${taken}`;
  if (/^(II\*\0|MM\0\*)/.test(head)) return `This is a TIFF or raw camera picture. ${taken} Please save a copy as JPEG.`;
  if (/^BM/.test(head)) return `This is a BMP picture. ${taken}`;
  if (/^%PDF/.test(head)) return `This is a PDF, not a photo. ${taken}`;
  if (/^[\s\u00ef\u00bb\u00bf]*<(\?xml|svg|!doctype|html|!--)/i.test(head)) return `This is a drawing or a web page, not a photo. ${taken}`;
  return `This is not a picture that can be read. ${taken}`;
}

async function firstBytes(file: string, count: number): Promise<Buffer> {
  const handle = await open(file, 'r');
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(count), 0, count, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await handle.close();
  }
}
