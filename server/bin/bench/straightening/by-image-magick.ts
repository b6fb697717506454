import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import type { Mark } from '../../../../shared/walls/marks.ts';
import type { Photo } from '../../../../shared/walls/photo.ts';

/** Where ImageMagick's own program is, or null. A distribution's stands before anything else of the name. */
export function imageMagick(): string | null {
  const isIt = (program: string) => {
    const said = spawnSync(program, ['-version'], { encoding: 'utf8', timeout: 10_000 });
    return said.status === 0 && /Version: ImageMagick/.test(said.stdout);
  };
  // A program, not a script that passes for one.
  const isProgram = (file: string) => existsSync(file) && readFileSync(file).subarray(0, 4).equals(Buffer.from([0x7f, 0x45, 0x4c, 0x46]));
  return ['/usr/bin/magick', '/usr/bin/convert', '/usr/local/bin/magick', '/usr/local/bin/convert'].find((p) => isProgram(p) && isIt(p)) ?? null;
}

/**
 * The same work by ImageMagick: upright, a preview of 2048 px, and the warp by the same four marks to the same size, blended from
 * the four nearest pixels. `slow` leaves it its usual way instead (an elliptical average). Resolves to seconds and most memory, MB.
 */
export async function byImageMagick(program: string, photo: string, folder: string, marks: readonly Mark[], elevation: NonNullable<Photo['elevation']>, slow: boolean): Promise<{ seconds: number; peakMb: number }> {
  const { leftMm, bottomMm, widthMm, heightMm, pxPerMm } = elevation;
  const size = `${Math.round(widthMm * pxPerMm)}x${Math.round(heightMm * pxPerMm)}`;
  const pairs = marks.map(({ px, mm }) => [px.x, px.y, (mm.x - leftMm) * pxPerMm, (bottomMm + heightMm - mm.y) * pxPerMm].join(',')).join(' ');
  const args = [
    photo, '-auto-orient', '-strip', '(', '+clone', '-resize', '2048x2048', '-quality', '84', '-write', `${folder}/preview.jpg`, '+delete', ')',
    '-virtual-pixel', 'background', '-background', '#e9e4d6', ...(slow ? [] : ['-filter', 'point', '-interpolate', 'bilinear']),
    '-define', `distort:viewport=${size}+0+0`, '-distort', 'Perspective', pairs, '-quality', '86', `${folder}/elevation.jpg`,
  ];
  const began = performance.now();
  const child = spawn(program, args, { stdio: ['ignore', 'ignore', 'pipe'] });
  let said = '';
  child.stderr.on('data', (d: Buffer) => (said += d.toString()));
  let peakMb = 0;
  const sampler = setInterval(() => {
    try {
      peakMb = Math.max(peakMb, Number(/VmHWM:\s+(\d+)/.exec(readFileSync(`/proc/${child.pid}/status`, 'utf8'))?.[1] ?? 0) / 1000);
    } catch {
      // It has ended.
    }
  }, 20);
  const status = await new Promise((ended) => child.on('close', ended));
  clearInterval(sampler);
  if (status !== 0) throw new Error(`ImageMagick failed: ${said}`);
  return { seconds: (performance.now() - began) / 1000, peakMb };
}
