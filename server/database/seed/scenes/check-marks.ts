/**
 * Finds every mark in a finished photo and compares it with the pixel written in `<scene>.json`.
 * Fails when one is off by more than a pixel.
 *
 * Run from this folder: npx tsx check-marks.ts <scene>
 */
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import sharp from 'sharp';
import { meetWall, pinholeOf, projectPoint, type Point2 } from './scene-camera.ts';
import { sceneNamed } from './scene-descriptions.ts';

const ALLOWED_PIXELS = 1;
/** Half the side of the square searched round each mark, mm: less than the card of a target, more than a cross. */
const REACH_MM = 28;
const REACH_PX = 60;
/** Linear light, 0 to 1: a mark must stand out from its ground by this much. */
const LEAST_CONTRAST = 0.1;
/** Coverage below this is taken for noise. */
const GROUND_NOISE = 0.15;

interface WrittenMark {
  id: string;
  wallMm: Point2;
  pixel: Point2;
}

const scene = sceneNamed(process.argv[2]);
const camera = pinholeOf(scene.camera, scene.photo);
const beside = (ending: string): string => fileURLToPath(new URL(`${scene.name}.${ending}`, import.meta.url));
const { marks } = JSON.parse(readFileSync(beside('json'), 'utf8')) as { marks: WrittenMark[] };
// rotate() without an angle stands the photo upright by its EXIF orientation.
const { data, info } = await sharp(beside('jpg')).rotate().raw().toBuffer({ resolveWithObject: true });

const linear = (step: number): number =>
  step <= 10.31 ? step / 3294.6 : ((step / 255 + 0.055) / 1.055) ** 2.4;

/** Darkness of a pixel, -1 (white) to 0 (black), in linear light (IEC 61966-2-1): tape and targets alike are darker than their ground. */
function darkness(column: number, row: number): number {
  const at = (row * info.width + column) * info.channels;
  return -[0, 1, 2].reduce((sum, channel) => sum + linear(data[at + channel] ?? 0), 0) / 3;
}

/**
 * The mark's centroid in pixels, each pixel weighed by how much of it the mark covers. The mean is taken on the
 * wall, by the wall area behind each pixel, because a centroid taken in the photo is drawn to the mark's nearer half.
 */
function centroid(mark: WrittenMark): Point2 {
  const u = Math.round(mark.pixel[0]);
  const v = Math.round(mark.pixel[1]);
  const near: { wall: Point2; area: number; dark: number }[] = [];
  for (let row = Math.max(0, v - REACH_PX); row <= Math.min(info.height - 1, v + REACH_PX); row += 1) {
    for (
      let column = Math.max(0, u - REACH_PX);
      column <= Math.min(info.width - 1, u + REACH_PX);
      column += 1
    ) {
      const { wall, depth } = meetWall(camera, [column + 0.5, row + 0.5]);
      if (Math.abs(wall[0] - mark.wallMm[0]) > REACH_MM || Math.abs(wall[1] - mark.wallMm[1]) > REACH_MM)
        continue;
      near.push({ wall, area: depth ** 3, dark: darkness(column, row) });
    }
  }
  const ordered = near.map(({ dark }) => dark).sort((a, b) => a - b);
  const ground = ordered[Math.floor(ordered.length / 2)] ?? 0;
  const full = ordered[Math.floor(ordered.length * 0.97)] ?? 0;
  if (full - ground < LEAST_CONTRAST) throw new Error(`${mark.id} cannot be seen near (${u}, ${v}).`);
  let [total, x, y] = [0, 0, 0];
  for (const { wall, area, dark } of near) {
    const covered = Math.min(1, (dark - ground) / (full - ground));
    if (covered < GROUND_NOISE) continue;
    total += covered * area;
    x += covered * area * wall[0];
    y += covered * area * wall[1];
  }
  return projectPoint(camera, [x / total, y / total, 0]);
}

const found = marks.map((mark) => {
  const [u, v] = centroid(mark);
  return { id: mark.id, across: u - mark.pixel[0], down: v - mark.pixel[1] };
});
for (const { id, across, down } of found)
  console.log(`${id.padEnd(18)} ${across.toFixed(2).padStart(6)} ${down.toFixed(2).padStart(6)}`);
const worst = Math.max(...found.map(({ across, down }) => Math.hypot(across, down)));
const mean = (values: number[]): string =>
  (values.reduce((sum, value) => sum + value, 0) / values.length).toFixed(3);
console.log(
  `worst ${worst.toFixed(3)} px; mean ${mean(found.map((f) => f.across))} across, ${mean(found.map((f) => f.down))} down`,
);
if (worst > ALLOWED_PIXELS) process.exitCode = 1;
