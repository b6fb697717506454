import sharp from 'sharp';
import { sharpnessOf } from '../sharpness.ts';

/** The sharpness of a picture file (a preview). */
export default async function sharpness({ file }: { file: string }): Promise<number> {
  const { data, info } = await sharp(file).greyscale().raw().toBuffer({ resolveWithObject: true });
  return sharpnessOf(data, info.width, info.height);
}
