import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createRequire } from 'node:module';
import os from 'node:os';
import path from 'node:path';
import sharp from 'sharp';
import type openCvModule from '@techstark/opencv-js';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createPool } from '../../../server/workers/pool.ts';
import type { StraightenInput, StraightenResult } from '../../../server/workers/tasks/straighten.ts';
import { warp } from '../../../server/workers/warp.ts';
import { elevationPlan } from '../../../shared/walls/elevation-plan.ts';

// The module has a `then` of its own and must never be awaited, which an import of it would do.
const cv = createRequire(import.meta.url)('@techstark/opencv-js') as typeof openCvModule;
const scene = path.resolve('server/database/seed/scenes/calibration-wall');

interface Scene {
  wallMm: { width: number; height: number };
  photo: { width: number; height: number };
  marks: { kind: 'tape' | 'target'; wallMm: [number, number]; pixel: [number, number] }[];
}

describe('straightening the ray-traced calibration wall', () => {
  const pool = createPool({ maxThreads: 1 });
  const folder = mkdtempSync(path.join(os.tmpdir(), 'cw-straighten-'));
  afterAll(async () => {
    await pool.close();
    rmSync(folder, { recursive: true, force: true });
  });

  it('puts every checker target within 1 mm of its true place over the 3 m wall', async () => {
    const { wallMm, photo, marks } = JSON.parse(readFileSync(`${scene}.json`, 'utf8')) as Scene;
    const size = { widthPx: photo.width, heightPx: photo.height };
    const tape = marks.filter((m) => m.kind === 'tape').map((m) => ({ px: { x: m.pixel[0], y: m.pixel[1] }, mm: { x: m.wallMm[0], y: m.wallMm[1] } }));
    const plan = elevationPlan(tape, size, { widthMm: wallMm.width, heightMm: wallMm.height })!;
    const elevationFile = path.join(folder, 'elevation.jpg');
    const began = performance.now();
    const result = await pool.run<StraightenInput, StraightenResult>('straighten', { photoFile: `${scene}.jpg`, elevationFile, ...size, plan });
    expect(performance.now() - began).toBeLessThan(15_000);
    expect(result.sha256).toMatch(/^[0-9a-f]{64}$/);

    const { data, info } = await sharp(elevationFile).greyscale().raw().toBuffer({ resolveWithObject: true });
    expect([info.width, info.height]).toEqual([plan.widthPx, plan.heightPx]);
    const targets = marks.filter((m) => m.kind === 'target');
    expect(targets.length).toBeGreaterThanOrEqual(12);
    const off = targets.map(({ wallMm: [x, y] }) => {
      const found = targetCentre(data, info.width, info.height, (x - plan.leftMm) * plan.pxPerMm, (plan.bottomMm + plan.heightMm - y) * plan.pxPerMm, plan.pxPerMm);
      return Math.hypot(found.x / plan.pxPerMm + plan.leftMm - x, plan.bottomMm + plan.heightMm - found.y / plan.pxPerMm - y);
    });
    expect(Math.max(...off)).toBeLessThan(1);
  });

  it('stops when it is called off, and leaves nothing half written in force', async () => {
    const { wallMm, photo, marks } = JSON.parse(readFileSync(`${scene}.json`, 'utf8')) as Scene;
    const size = { widthPx: photo.width, heightPx: photo.height };
    const tape = marks.filter((m) => m.kind === 'tape').map((m) => ({ px: { x: m.pixel[0], y: m.pixel[1] }, mm: { x: m.wallMm[0], y: m.wallMm[1] } }));
    const plan = elevationPlan(tape, size, { widthMm: wallMm.width, heightMm: wallMm.height })!;
    const off = new AbortController();
    const running = pool.run('straighten', { photoFile: `${scene}.jpg`, elevationFile: path.join(folder, 'never.jpg'), ...size, plan }, { signal: off.signal });
    setTimeout(() => off.abort(), 100);
    await expect(running).rejects.toThrow(/called off/);
    expect(existsSync(path.join(folder, 'never.jpg'))).toBe(false);
  });
});

describe('the warp', () => {
  beforeAll(async () => {
    await new Promise<void>((ready) => {
      if (typeof cv.Mat === 'function') ready();
      else cv.onRuntimeInitialized = () => ready();
    });
  });

  it('agrees with OpenCV warpPerspective (linear, inverse map) to two grey levels', () => {
    const [width, height] = [220, 160];
    const photo = { width, height, data: Uint8Array.from({ length: width * height * 3 }, (_, i) => {
      const p = Math.floor(i / 3);
      const [x, y] = [p % width, Math.floor(p / width)];
      return Math.round(128 + 60 * Math.sin(x / 9 + (i % 3)) + 60 * Math.cos(y / 7));
    }) };
    const map = [0.9, 0.12, 14, -0.05, 0.85, 11, 2e-4, 3e-4, 1];
    const ours = warp(photo, map, { width: 180, height: 140 }, [0, 0, 0]);

    // OpenCV counts from pixel centres: shift by half a pixel on either side of the map.
    const shift = (d: number) => cv.matFromArray(3, 3, cv.CV_64F, [1, 0, d, 0, 1, d, 0, 0, 1]);
    const from = cv.matFromArray(height, width, cv.CV_8UC3, Array.from(photo.data));
    const m = cv.matFromArray(3, 3, cv.CV_64F, times(times([...shift(-0.5).data64F], map), [...shift(0.5).data64F]));
    const to = new cv.Mat();
    cv.warpPerspective(from, to, m, new cv.Size(180, 140), cv.INTER_LINEAR | cv.WARP_INVERSE_MAP, cv.BORDER_REPLICATE);
    let worst = 0;
    for (let i = 0; i < ours.data.length; i++) worst = Math.max(worst, Math.abs(ours.data[i]! - to.data[i]!));
    for (const mat of [from, m, to]) mat.delete();
    // OpenCV rounds places to 1/32 px; over the steepest slope here (about 12 a pixel) that is under one level.
    expect(worst).toBeLessThanOrEqual(2);
  });
});

function times(a: readonly number[], b: readonly number[]): number[] {
  return Array.from({ length: 9 }, (_, n) => [0, 1, 2].reduce((s, k) => s + a[Math.floor(n / 3) * 3 + k]! * b[k * 3 + (n % 3)]!, 0));
}

/**
 * A checker target's centre, px: the centroid of what is dark in a window of 54 mm, which is then laid about that
 * centroid and taken again. The target's two dark squares of 20 mm lie point-symmetrically about its centre.
 */
function targetCentre(grey: Buffer, width: number, height: number, x: number, y: number, pxPerMm: number): { x: number; y: number } {
  const reach = 27 * pxPerMm;
  let at = { x, y };
  for (let round = 0; round < 4; round++) {
    const inside: { x: number; y: number; value: number }[] = [];
    for (let j = Math.max(0, Math.floor(at.y - reach)); j <= Math.min(height - 1, at.y + reach); j++) {
      for (let i = Math.max(0, Math.floor(at.x - reach)); i <= Math.min(width - 1, at.x + reach); i++) {
        inside.push({ x: i + 0.5, y: j + 0.5, value: grey[j * width + i]! });
      }
    }
    const values = inside.map((p) => p.value);
    const middle = (Math.min(...values) + Math.max(...values)) / 2;
    const dark = inside.filter((p) => p.value < middle);
    at = { x: dark.reduce((s, p) => s + p.x, 0) / dark.length, y: dark.reduce((s, p) => s + p.y, 0) / dark.length };
  }
  return at;
}
