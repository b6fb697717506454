import { readFileSync } from 'node:fs';
import { expect, test, type FileChooser } from '@playwright/test';

const scene = 'server/database/seed/scenes/calibration-wall';
interface Scene {
  photo: { width: number; height: number };
  marks: { kind: string; pixel: [number, number] }[];
}

test('a maker measures a wall: photo, four marks, straightened picture, studs, an outlet, saved', async ({ page, baseURL }) => {
  const post = async (url: string, data: object) => {
    const reply = await page.request.post(url, { data, headers: { Origin: baseURL! } });
    expect(reply.status()).toBe(201);
    return (await reply.json()) as { id: string };
  };
  await post('/api/people/register', { shopName: 'Measure & Sons', name: 'Ines Maker', email: `ines${Date.now()}@example.com`, password: 'a good long password', units: 'mm' });
  const job = await post('/api/jobs', { title: 'Stair hall', clientName: 'Tova Lind', clientEmail: 'tova@client.example', site: '4 Quay Row' });
  const wall = await post(`/api/jobs/${job.id}/walls`, { name: 'Target wall', widthMm: 3000, heightMm: 2400, construction: 'wood studs', coveringMm: 12.5 });
  await page.goto(`/jobs/${job.id}/walls/${wall.id}`);

  await test.step('a file that is no photo is refused in words', async () => {
    await choose({ name: 'plan.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>') });
    await expect(page.getByText('This is a drawing or a web page, not a photo.')).toBeVisible();
  });

  await test.step('the marks are dragged near, then set to the pixel by keyboard', async () => {
    await choose(`${scene}.jpg`);
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
  });

  await test.step('the tape rectangle is typed in either unit and the photo straightened', async () => {
    const straighten = page.getByRole('button', { name: 'Straighten the photo' });
    await expect(straighten).toBeDisabled();
    await page.getByLabel('Rectangle’s width').fill('2400');
    await page.getByLabel('Rectangle’s height').fill('1.5 m');
    await page.getByLabel('Its left side from the wall’s left end').fill('300 mm');
    await page.getByLabel('Its foot above the floor').fill('17 23/32 in');
    await straighten.click();
    await expect(page.getByRole('img', { name: /from the front/ })).toBeVisible({ timeout: 60_000 });
  });

  await test.step('studs and an outlet are set, saved, and there again after a reload', async () => {
    await page.getByLabel('First stud’s centre').fill('400');
    await page.getByRole('button', { name: 'Lay out the studs' }).click();
    await page.getByLabel('Stud 2: found by').selectOption('Probed');
    await page.getByRole('button', { name: 'Add an obstruction' }).click();
    for (const [what, mm] of [['from the left', '1130'], ['above the floor', '258'], ['width', '70'], ['height', '114']]) {
      await page.getByLabel(`Obstruction 1: ${what}`).fill(mm!);
    }
    await page.getByRole('button', { name: 'Save the wall' }).click();
    await expect(page.getByRole('button', { name: 'Saved' })).toBeVisible();
    await page.reload();
    await expect(page.getByText('7, 6 unconfirmed')).toBeVisible();
    await expect(page.getByLabel('Obstruction 1: from the left')).toHaveValue('1130 mm');
  });

  async function choose(file: Parameters<FileChooser['setFiles']>[0]) {
    const [chooser] = await Promise.all([page.waitForEvent('filechooser'), page.getByRole('button', { name: 'Choose a photo' }).click()]);
    await chooser.setFiles(file);
  }
});
