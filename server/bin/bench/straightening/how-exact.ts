import { createRequire } from 'node:module';
import type openCvModule from '@techstark/opencv-js';
import { fitPhoto } from '../../../../shared/walls/fit.ts';
import { accuracyOver } from '../../../../shared/walls/accuracy.ts';
import { applyHomography, type Homography, type Point } from '../../../../shared/walls/homography.ts';
import type { Knowledge } from '../../../../shared/walls/knowledge.ts';
import type { Mark } from '../../../../shared/walls/marks.ts';
import { unproject } from '../../../../shared/walls/wall-camera.ts';
import { edgesMarked, heldBack, marksAt, measuredScenes, seeded, seen, type MeasuredScene } from '../scenes/measured-scenes.ts';

// The module has a `then` of its own and must never be awaited, which an import of it would do.
const cv = createRequire(import.meta.url)('@techstark/opencv-js') as typeof openCvModule;

const goes = 20;

interface Misses { mean: number; worst: number }

/** Error at points that took no part, ours and OpenCV's, on each scene; a line each, over twenty goes with another unsteadiness. */
export async function howExact(): Promise<string[]> {
  await new Promise<void>((ready) => {
    if (typeof cv.Mat === 'function') ready();
    else cv.onRuntimeInitialized = () => ready();
  });
  const lines = [`error at held-back points, mean and worst, mm; ${goes} goes each, marks unsteady by 0.7 px (one standard deviation) on 4032 × 3024`];
  for (const s of measuredScenes) {
    const points = heldBack(s);
    const four = { ours: [] as number[], cv: [] as number[] };
    const eight = { ours: [] as number[], cv: [] as number[] };
    const edges: number[] = [];
    const stated: number[] = [];
    let lens = '';
    for (let seed = 1; seed <= goes; seed++) {
      const chance = seeded(seed);
      const marks = marksAt(s, s.fourMm, chance);
      const straightEdges = edgesMarked(s, 9, chance);
      const more = [...marks, ...marksAt(s, s.moreMm, chance)];
      four.ours.push(...missesOf(s, points, ours(s, { marks })));
      four.cv.push(...missesOf(s, points, byOpenCv(marks)));
      eight.ours.push(...missesOf(s, points, ours(s, { marks: more })));
      eight.cv.push(...missesOf(s, points, byOpenCv(more)));
      edges.push(...missesOf(s, points, ours(s, { marks, straightEdges })));
      const fit = fitPhoto(knowledge({ marks, straightEdges }), s.camera.photo);
      if (fit?.verdict.state === 'fitted') lens = ` (lens ${(fit.verdict.lambda * 100).toFixed(1)} % at the corners)`;
      const over = fit && accuracyOver(fit, s.camera.photo, { leftMm: 0, bottomMm: 0, ...s.wall });
      if (over) stated.push(over.worstMm);
    }
    const [a, b, c, d, e] = [four.ours, four.cv, eight.ours, eight.cv, edges].map(summed) as [Misses, Misses, Misses, Misses, Misses];
    lines.push(
      `${s.name}: four marks ${told(a)}, OpenCV ${told(b)} (worst ${(a.worst / b.worst).toFixed(2)} of OpenCV’s); eight marks ${told(c)}, OpenCV ${told(d)}; ` +
        `four marks and straight edges ${told(e)}, ${(b.worst / e.worst).toFixed(1)} times better than OpenCV’s four at worst${lens}; stated at most ${(stated.reduce((t, v) => t + v, 0) / stated.length).toFixed(1)}`,
    );
  }
  return lines;
}

const knowledge = (k: Partial<Knowledge> & { marks: Mark[] }): Knowledge => ({ straightEdges: [], lines: [], lengths: [], ...k });

function ours(s: MeasuredScene, k: Partial<Knowledge> & { marks: Mark[] }): (px: Point) => Point {
  const fit = fitPhoto(knowledge(k), s.camera.photo);
  if (!fit) throw new Error(`Scene "${s.name}" was not fitted.`);
  return (px) => unproject(fit.frame, fit.camera, px);
}

function byOpenCv(marks: readonly Mark[]): (px: Point) => Point {
  const flat = (points: readonly Point[]) => points.flatMap((p) => [p.x, p.y]);
  const from = cv.matFromArray(marks.length, 1, cv.CV_64FC2, flat(marks.map((m) => m.px)));
  const to = cv.matFromArray(marks.length, 1, cv.CV_64FC2, flat(marks.map((m) => m.mm)));
  const map = cv.findHomography(from, to);
  const h = Array.from(map.data64F) as unknown as Homography;
  for (const mat of [from, to, map]) mat.delete();
  return (px) => applyHomography(h, px);
}

function missesOf(s: MeasuredScene, points: readonly Point[], back: (px: Point) => Point): number[] {
  return points.map((p) => {
    const q = back(seen(s.camera, p));
    return Math.hypot(q.x - p.x, q.y - p.y);
  });
}

const summed = (list: readonly number[]): Misses => ({ mean: list.reduce((t, v) => t + v, 0) / list.length, worst: list.reduce((t, v) => Math.max(t, v), 0) });
const told = (m: Misses) => `${m.mean.toFixed(2)} / ${m.worst.toFixed(2)}`;
