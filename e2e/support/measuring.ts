import { readFileSync } from 'node:fs';
import { expect, type Page } from '@playwright/test';

type FileToChoose = string | { name: string; mimeType: string; buffer: Buffer };

export const calibrationScene = 'server/database/seed/scenes/calibration-wall';

interface Scene {
  photo: { width: number; height: number };
  marks: { kind: string; pixel: [number, number] }[];
}

export async function choosePhoto(page: Page, file: FileToChoose): Promise<void> {
  const [chooser] = await Promise.all([page.waitForEvent('filechooser'), page.getByRole('button', { name: 'Choose a photo' }).click()]);
  await chooser.setFiles(file);
}

/** Drags the four marks near the tape crosses of a scene, then sets them to the pixel by the arrow keys, as a careful measurer would. */
export async function setMarks(page: Page, scene = calibrationScene): Promise<void> {
  const { photo, marks } = JSON.parse(readFileSync(`${scene}.json`, 'utf8')) as Scene;
  const picture = page.getByAltText('The wall as photographed');
  for (const [i, { pixel }] of marks.filter((m) => m.kind === 'tape').entries()) {
    const mark = page.getByRole('button', { name: new RegExp(`^Mark ${i + 1},`) });
    await mark.scrollIntoViewIfNeeded();
    const from = (await mark.boundingBox())!;
    const box = (await picture.boundingBox())!;
    await page.mouse.move(from.x + from.width / 2, from.y + from.height / 2);
    await page.mouse.down();
    await page.mouse.move(box.x + (pixel[0] / photo.width) * box.width, box.y + (pixel[1] / photo.height) * box.height, { steps: 3 });
    await page.mouse.up();
    const [, x, y] = /: (\d+) px across, (\d+) px down/.exec((await mark.getAttribute('aria-label')) ?? '') ?? [];
    const nudge = async (by: number, more: string, less: string) => {
      expect(Math.abs(by)).toBeLessThan(20);
      for (let n = 0; n < Math.abs(by); n++) await mark.press(by > 0 ? more : less);
    };
    await nudge(Math.round(pixel[0]) - Number(x), 'ArrowRight', 'ArrowLeft');
    await nudge(Math.round(pixel[1]) - Number(y), 'ArrowDown', 'ArrowUp');
    await expect(mark).toHaveAccessibleName(new RegExp(`: ${Math.round(pixel[0])} px across, ${Math.round(pixel[1])} px down`));
  }
}

/** Types the tape rectangle of the calibration scene, each length in another way of writing, and straightens. */
export async function straighten(page: Page): Promise<void> {
  await page.getByLabel('Rectangle’s width').fill('2400');
  await page.getByLabel('Rectangle’s height').fill('1.5 m');
  await page.getByLabel('Its left side from the wall’s left end').fill('300 mm');
  await page.getByLabel('Its foot above the floor').fill('17 23/32 in');
  await page.getByRole('button', { name: 'Straighten the photo' }).click();
  await expect(page.getByRole('img', { name: /from the front/ })).toBeVisible({ timeout: 60_000 });
}

/** A target of a scene: where the photo shows it (px) and where it is on the wall (mm). */
export interface Target {
  px: [number, number];
  mm: [number, number];
}

/** The scene's targets, which no mark need know. */
export function targetsOf(scene = calibrationScene): Target[] {
  const { marks } = JSON.parse(readFileSync(`${scene}.json`, 'utf8')) as { marks: { kind: string; pixel: [number, number]; wallMm: [number, number] }[] };
  return marks.filter((m) => m.kind !== 'tape').map(({ pixel, wallMm }) => ({ px: pixel, mm: wallMm }));
}

/** Adds a mark and types all of it: where the photo shows it, and where it is on the wall. */
export async function typeMark(page: Page, number: number, { px, mm }: Target): Promise<void> {
  await page.getByRole('button', { name: 'Add a mark' }).click();
  const across = page.getByLabel(`Mark ${number} across the photo`);
  if (!(await across.isVisible())) await page.getByText('Type where the marks are on the photo').click();
  await across.fill(px[0].toFixed(1));
  await page.getByLabel(`Mark ${number} down the photo`).fill(px[1].toFixed(1));
  await page.getByLabel(`Mark ${number} from the left`).fill(`${mm[0]} mm`);
  await page.getByLabel(`Mark ${number} above the floor`).fill(`${mm[1]} mm`);
}

/** Where a place on the wall is on the screen, while a tool is in hand and the whole wall is shown. */
export async function onElevation(page: Page, wall: { widthMm: number; heightMm: number }, xMm: number, yMm: number): Promise<{ x: number; y: number }> {
  const drawing = page.locator('[data-wall-board] svg');
  await drawing.scrollIntoViewIfNeeded();
  const box = (await drawing.boundingBox())!;
  const margin = Math.max(wall.widthMm, wall.heightMm) * 0.01;
  const scale = Math.min(box.width / (wall.widthMm + 2 * margin), box.height / (wall.heightMm + 2 * margin));
  return { x: box.x + box.width / 2 + (xMm - wall.widthMm / 2) * scale, y: box.y + box.height / 2 - (yMm - wall.heightMm / 2) * scale };
}
