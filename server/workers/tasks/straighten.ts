import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import sharp from 'sharp';
import { elevationToPhoto, type ElevationPlan } from '../../../shared/walls/elevation-plan.ts';
import { setProgress } from '../progress.ts';
import { warp, type Pixels } from '../warp.ts';

export interface StraightenInput {
  /** The original photo, and where the elevation (JPEG) goes. */
  photoFile: string;
  elevationFile: string;
  /** Size of the upright photo that the plan was made for, px. */
  widthPx: number;
  heightPx: number;
  plan: ElevationPlan;
  /** Where to tell how far the work has come. */
  progress?: SharedArrayBuffer;
}

export interface StraightenResult {
  sha256: string;
  bytes: number;
}

/** What the photo does not show is the colour of bare plaster. */
const bare = [233, 228, 214] as const;

/** Straightens a photo by its plan and writes the elevation, without any metadata. */
export default async function straighten({ photoFile, elevationFile, widthPx, heightPx, plan, progress }: StraightenInput): Promise<StraightenResult> {
  setProgress(progress, 'reading', 0);
  const photo = await uprightPixels(photoFile, widthPx, heightPx, plan);
  const toPhoto = elevationToPhoto(plan);
  const sx = photo.width / widthPx;
  const sy = photo.height / heightPx;
  const scaled = toPhoto.map((v, i) => (i < 3 ? v * sx : i < 6 ? v * sy : v));
  const { lens } = plan;
  const picture = warp(photo, scaled, { width: plan.widthPx, height: plan.heightPx }, bare, {
    lens: lens && { lambda: lens.lambda, centreX: lens.centre.x * sx, centreY: lens.centre.y * sy, radiusX: lens.radiusPx * sx, radiusY: lens.radiusPx * sy },
    onShare: (share) => setProgress(progress, 'drawing', share),
  });
  setProgress(progress, 'writing', 0);
  await sharp(picture.data, { raw: { width: picture.width, height: picture.height, channels: 3 } })
    .jpeg({ quality: 86, chromaSubsampling: '4:2:0' })
    .toFile(elevationFile);
  const written = await readFile(elevationFile);
  return { sha256: createHash('sha256').update(written).digest('hex'), bytes: written.length };
}

/** The upright photo in 8-bit sRGB; made smaller first where the elevation is far coarser, which would alias otherwise. */
async function uprightPixels(file: string, widthPx: number, heightPx: number, plan: ElevationPlan): Promise<Pixels> {
  const shrink = Math.max(1, plan.photoPxPerMm / plan.pxPerMm / 1.5);
  const upright = sharp(file, { failOn: 'error', limitInputPixels: 61e6 }).autoOrient();
  const sized = shrink > 1.2 ? upright.resize(Math.round(widthPx / shrink), Math.round(heightPx / shrink), { fit: 'fill' }) : upright;
  const { data, info } = await sized.flatten({ background: '#ffffff' }).toColourspace('srgb').raw({ depth: 'uchar' }).toBuffer({ resolveWithObject: true });
  if (info.channels !== 3) throw new Error(`The photo came out with ${info.channels} channels, not 3.`);
  return { data, width: info.width, height: info.height };
}
