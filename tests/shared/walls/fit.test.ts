import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { edgesMarked, heldBack, marksAt, measuredScenes, seeded, seen, type MeasuredScene } from '../../../server/bin/bench/scenes/measured-scenes.ts';
import { fitPhoto, type Fit } from '../../../shared/walls/fit.ts';
import { applyHomography, invertHomography, type Point } from '../../../shared/walls/homography.ts';
import { Knowledge, type TrueLine } from '../../../shared/walls/knowledge.ts';
import type { Mark } from '../../../shared/walls/marks.ts';
import { project, unproject } from '../../../shared/walls/wall-camera.ts';
import { aCamera, photoSize, seenBy } from '../../support/a-camera.ts';
import { byOpenCv, cv, openCvReady } from '../../support/open-cv.ts';

const sceneOf = (name: string) => measuredScenes.find((s) => s.name === name)!;
const known = (k: Partial<Knowledge> & { marks: Mark[] }): Knowledge => ({ straightEdges: [], lines: [], lengths: [], ...k });
const apart = (a: Point, b: Point) => Math.hypot(a.x - b.x, a.y - b.y);
const wallSeen = (fit: Fit, px: Point) => unproject(fit.frame, fit.camera, px);

/** The worst miss on the wall over points that took no part, mm. */
const worstOver = (s: MeasuredScene, back: (px: Point) => Point) => Math.max(...heldBack(s).map((p) => apart(back(seen(s.camera, p)), p)));

beforeAll(openCvReady);

describe('the scenes', () => {
  it('show wall points where OpenCV projectPoints shows them, lens terms and all', () => {
    for (const s of measuredScenes) {
      const { camera } = s;
      // The wall's points in the camera's own axes (x right, y down, z forward) by the columns of its turn.
      const points = [...s.fourMm, ...s.moreMm];
      const eye = { at: camera.at, to: camera.lookAt, roll: (camera.rollDegrees * Math.PI) / 180 };
      const ahead = unit(eye.to.map((v, i) => v - eye.at[i]!));
      const across = unit([-ahead[2]!, 0, ahead[0]!]);
      const down = [across[1]! * ahead[2]! - across[2]! * ahead[1]!, across[2]! * ahead[0]! - across[0]! * ahead[2]!, across[0]! * ahead[1]! - across[1]! * ahead[0]!].map((v) => -v);
      const right = across.map((v, i) => v * Math.cos(eye.roll) + down[i]! * Math.sin(eye.roll));
      const below = down.map((v, i) => v * Math.cos(eye.roll) - across[i]! * Math.sin(eye.roll));
      const inCamera = points.map((p) => [p.x - eye.at[0], p.y - eye.at[1], -eye.at[2]]).map((r) => [right, below, ahead].map((axis) => r.reduce((t, v, i) => t + v * axis[i]!, 0)));
      const from = cv.matFromArray(points.length, 1, cv.CV_64FC3, inCamera.flat());
      const none = cv.matFromArray(3, 1, cv.CV_64F, [0, 0, 0]);
      const lens = cv.matFromArray(3, 3, cv.CV_64F, [camera.focalPx, 0, camera.photo.widthPx / 2, 0, camera.focalPx, camera.photo.heightPx / 2, 0, 0, 1]);
      const bends = cv.matFromArray(4, 1, cv.CV_64F, [camera.k1, camera.k2, 0, 0]);
      const to = new cv.Mat();
      cv.projectPoints(from, none, none, lens, bends, to);
      points.forEach((p, i) => expect(apart(seen(camera, p), { x: to.data64F[2 * i]!, y: to.data64F[2 * i + 1]! })).toBeLessThan(1e-6));
      for (const mat of [from, none, lens, bends, to]) mat.delete();
    }
  });
});

describe('marks alone', () => {
  it('four of them give OpenCV findHomography’s own map, on every scene', () => {
    for (const s of measuredScenes) {
      const marks = marksAt(s, s.fourMm, seeded(7));
      const fit = fitPhoto(known({ marks }), s.camera.photo)!;
      const theirs = byOpenCv(marks.map((m) => m.px), marks.map((m) => m.mm));
      for (const p of heldBack(s)) {
        const px = seen(s.camera, p);
        expect(apart(wallSeen(fit, px), applyHomography(theirs, px))).toBeLessThan(0.01);
      }
      expect(fit.verdict).toEqual({ state: 'left out', why: 'too little to tell it by' });
    }
  });

  it('eight of them, of equal sureness on the photo and no lens, give the least squares on the photo that OpenCV finds', () => {
    for (const s of measuredScenes.slice(0, 4)) {
      const marks = marksAt(s, [...s.fourMm, ...s.moreMm], seeded(11));
      const fit = fitPhoto(known({ marks }), s.camera.photo, { px: 1, mm: 0 }, false)!;
      // Its least squares are among `to`: from the wall to the photo.
      const theirs = byOpenCv(marks.map((m) => m.mm), marks.map((m) => m.px));
      const back = invertHomography(theirs);
      const sum = (of: (mm: Point) => Point) => marks.reduce((t, m) => t + apart(of(m.mm), m.px) ** 2, 0);
      expect(sum((mm) => project(fit.frame, fit.camera, mm))).toBeLessThanOrEqual(sum((mm) => applyHomography(theirs, mm)) * 1.00001);
      for (const p of heldBack(s)) {
        const px = seen(s.camera, p);
        // OpenCV takes points to single precision and stops after ten steps.
        expect(apart(wallSeen(fit, px), applyHomography(back, px))).toBeLessThan(0.15);
      }
    }
  });

  it('eight of them tell a barrel lens, which a plain map cannot follow', () => {
    const s = sceneOf('barrel');
    for (const seed of [1, 2, 3, 4, 5]) {
      const marks = marksAt(s, [...s.fourMm, ...s.moreMm], seeded(seed));
      const fit = fitPhoto(known({ marks }), s.camera.photo)!;
      const theirs = byOpenCv(marks.map((m) => m.px), marks.map((m) => m.mm));
      expect(fit.verdict.state).toBe('fitted');
      expect(worstOver(s, (px) => wallSeen(fit, px))).toBeLessThan(worstOver(s, (px) => applyHomography(theirs, px)) / 3);
    }
  });

  it('crowded into a corner do not tell the lens, and it is refused', () => {
    const s = sceneOf('frontal');
    const crowd = [0, 1, 2].flatMap((i) => [0, 1].map((j) => ({ x: 1900 + 150 * i, y: 1150 + 150 * j })));
    const fit = fitPhoto(known({ marks: marksAt(s, crowd, seeded(3)) }), s.camera.photo)!;
    expect(fit.verdict).toEqual({ state: 'left out', why: 'too unsure' });
    expect(fit.lens).toBeNull();
  });
});

describe('straight edges', () => {
  it('marked beside four marks take out a barrel lens: at least three times better than a plain map, and nothing worse on a perfect lens', () => {
    for (const s of [sceneOf('barrel'), sceneOf('wide angle')]) {
      for (const seed of [1, 2, 3, 4, 5]) {
        const chance = seeded(seed);
        const marks = marksAt(s, s.fourMm, chance);
        const fit = fitPhoto(known({ marks, straightEdges: edgesMarked(s, 9, chance) }), s.camera.photo)!;
        const plain = byOpenCv(marks.map((m) => m.px), marks.map((m) => m.mm));
        expect(fit.lens!.lambda).toBeLessThan(-0.05);
        expect(worstOver(s, (px) => wallSeen(fit, px))).toBeLessThan(worstOver(s, (px) => applyHomography(plain, px)) / 3);
      }
    }
    const s = sceneOf('oblique 20°');
    const chance = seeded(9);
    const fit = fitPhoto(known({ marks: marksAt({ ...s, noisePx: 0 }, s.fourMm, chance), straightEdges: edgesMarked({ ...s, noisePx: 0 }, 9, chance) }), s.camera.photo)!;
    expect(worstOver(s, (px) => wallSeen(fit, px))).toBeLessThan(0.01);
  });
});

describe('a rectangle of unknown size, or plumb and level lines', () => {
  const corners = [{ x: 700, y: 500 }, { x: 2900, y: 500 }, { x: 2900, y: 1900 }, { x: 700, y: 1900 }] as const;
  const turned = fc.record({ x: fc.double({ min: 600, max: 3400, noNaN: true }), y: fc.double({ min: 900, max: 1700, noNaN: true }), z: fc.double({ min: 2500, max: 4000, noNaN: true }), rollDegrees: fc.double({ min: -5, max: 5, noNaN: true }) });
  const linesOf = (see: (p: Point) => Point): TrueLine[] => {
    const [a, b, c, d] = corners.map(see) as [Point, Point, Point, Point];
    return [{ direction: 'level', px: [a, b] }, { direction: 'level', px: [d, c] }, { direction: 'plumb', px: [a, d] }, { direction: 'plumb', px: [b, c] }];
  };
  const others = [{ x: 300, y: 300 }, { x: 3300, y: 2200 }, { x: 1800, y: 1200 }];

  it('with one mark and a length each way give the wall’s true measures, from wherever it is seen', () => {
    fc.assert(
      fc.property(turned, ({ x, y, z, rollDegrees }) => {
        const camera = aCamera({ at: [x, y, z], lookAt: [1800, 1200, 0], rollDegrees });
        const see = (p: Point) => seenBy(camera, p);
        const [a, b, c] = corners.map(see) as [Point, Point, Point];
        const fit = fitPhoto(known({ marks: [{ px: a, mm: corners[0] }], lines: linesOf(see), lengths: [{ px: [a, b], mm: 2200 }, { px: [b, c], mm: 1400 }] }), photoSize)!;
        for (const p of others) expect(apart(wallSeen(fit, see(p)), p)).toBeLessThan(1);
      }),
      { numRuns: 40 },
    );
  });

  it('with a single length too, where the photo’s focal length is known', () => {
    fc.assert(
      fc.property(turned, ({ x, y, z, rollDegrees }) => {
        const camera = aCamera({ at: [x, y, z], lookAt: [1800, 1200, 0], rollDegrees });
        const see = (p: Point) => seenBy(camera, p);
        const [a, b] = corners.map(see) as [Point, Point];
        // 3000 px on a diagonal of 5000 px: 3000 / 5000 of film's 43.27 mm.
        const fit = fitPhoto(known({ marks: [{ px: a, mm: corners[0] }], lines: linesOf(see), lengths: [{ px: [a, b], mm: 2200 }], focal35Mm: 0.6 * Math.hypot(36, 24) }), photoSize)!;
        for (const p of others) expect(apart(wallSeen(fit, see(p)), p)).toBeLessThan(2);
      }),
      { numRuns: 40 },
    );
  });

  it('are asked for in words where too little is given', () => {
    const see = (p: Point) => seenBy(aCamera(), p);
    const mark = { px: see(corners[0]), mm: corners[0] };
    const words = (k: object) => Knowledge.safeParse(k).error?.issues[0]?.message;
    expect(words({ marks: [mark, mark, mark] })).toMatch(/^Mark four points/);
    expect(words({ marks: [mark], lines: linesOf(see).slice(1), lengths: [{ px: [mark.px, mark.px], mm: 1000 }] })).toMatch(/two plumb and two level/);
    expect(words({ marks: [mark], lines: linesOf(see) })).toMatch(/at least one length/);
    expect(words({ marks: [mark], lines: linesOf(see), lengths: [{ px: [mark.px, mark.px], mm: 1000 }] })).toBeUndefined();
  });
});

const unit = (a: readonly number[]) => a.map((v) => v / Math.hypot(...a));
