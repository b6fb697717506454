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
