import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { calibrationScene, choosePhoto, onElevation, setMarks, straighten, targetsOf, typeMark } from './support/measuring.ts';

const size = { widthMm: 3000, heightMm: 2400 };

async function openWall(page: Page, baseURL: string): Promise<void> {
  const post = async (url: string, data: object) => {
    const reply = await page.request.post(url, { data, headers: { Origin: baseURL } });
    expect(reply.status()).toBe(201);
    return (await reply.json()) as { id: string };
  };
  await post('/api/people/register', { shopName: 'Measure & Sons', name: 'Ines Maker', email: `ines${Date.now()}@example.com`, password: 'a good long password', units: 'mm' });
  const job = await post('/api/jobs', { title: 'Stair hall', clientName: 'Tova Lind', clientEmail: 'tova@client.example', site: '4 Quay Row' });
  const wall = await post(`/api/jobs/${job.id}/walls`, { name: 'Target wall', ...size, construction: 'wood studs', coveringMm: 12.5 });
  await page.goto(`/jobs/${job.id}/walls/${wall.id}`);
}

async function nothingSerious(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.filter((v) => v.impact === 'serious' || v.impact === 'critical').map((v) => `${v.id}: ${v.nodes[0]?.html}`)).toEqual([]);
}

async function save(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Save the wall' }).click();
  await expect(page.getByRole('button', { name: 'Saved' })).toBeVisible();
}

test('a maker measures a wall: photo, four marks, straightened picture, studs, an outlet, saved', async ({ page, baseURL }) => {
  await openWall(page, baseURL!);

  await test.step('a file that is no photo is refused in words', async () => {
    await choosePhoto(page, { name: 'plan.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>') });
    await expect(page.getByText('This is a drawing or a web page, not a photo.')).toBeVisible();
  });

  await test.step('the marks are dragged near, then set to the pixel by keyboard', async () => {
    await choosePhoto(page, `${calibrationScene}.jpg`);
    await setMarks(page);
  });

  await test.step('the tape rectangle is typed in either unit and the photo straightened', async () => {
    await expect(page.getByRole('button', { name: 'Straighten the photo' })).toBeDisabled();
    await straighten(page);
  });

  await test.step('studs and an outlet are set, saved, and there again after a reload', async () => {
    await page.getByLabel('First stud’s centre').fill('400');
    await page.getByRole('button', { name: 'Lay out the studs' }).click();
    await page.getByLabel('Stud 2: found by').selectOption('Probed');
    await page.getByRole('button', { name: 'Add an obstruction' }).click();
    for (const [what, mm] of [['from the left', '1130'], ['above the floor', '258'], ['width', '70'], ['height', '114']]) {
      await page.getByLabel(`Obstruction 1: ${what}`).fill(mm!);
    }
    await save(page);
    await page.reload();
    await expect(page.getByText('7, 6 unconfirmed')).toBeVisible();
    await expect(page.getByLabel('Obstruction 1: from the left')).toHaveValue('1130 mm');
  });

  await test.step('what is drawn on the wall by keyboard can be taken back and made again', async () => {
    await page.getByRole('button', { name: 'Draw studs' }).click();
    await page.locator('[data-wall-board]').focus();
    for (const key of ['Shift+ArrowLeft', 'ArrowLeft', 'Enter']) await page.keyboard.press(key);
    await expect(page.getByText('8, 7 unconfirmed')).toBeVisible();
    await expect(page.getByLabel('Stud 4: centre from the left')).toHaveValue('1390 mm');
    await page.keyboard.press('Control+z');
    await expect(page.getByText('7, 6 unconfirmed')).toBeVisible();
    await page.keyboard.press('Control+Shift+z');
    await expect(page.getByText('8, 7 unconfirmed')).toBeVisible();
  });
});

test.describe('on a phone', () => {
  test.use({ viewport: { width: 390, height: 844 }, hasTouch: true });

  test('a maker measures a wall: six marks, one of them wrong, the accuracy told, a length checked, a stud and an outlet tapped', async ({ page, baseURL }) => {
    await openWall(page, baseURL!);
    const targets = targetsOf();
    const upperLeft = targets.reduce((a, b) => (b.mm[0] - b.mm[1] < a.mm[0] - a.mm[1] ? b : a));
    const upperRight = targets.reduce((a, b) => (b.mm[0] + b.mm[1] > a.mm[0] + a.mm[1] ? b : a));

    await test.step('four marks are dragged, two more typed, the rectangle typed', async () => {
      await choosePhoto(page, `${calibrationScene}.jpg`);
      await setMarks(page);
      await typeMark(page, 5, { ...upperLeft, mm: [upperLeft.mm[0] + 100, upperLeft.mm[1]] });
      await typeMark(page, 6, upperRight);
      for (const [label, length] of [['Rectangle’s width', '2400'], ['Rectangle’s height', '1500'], ['Its left side from the wall’s left end', '300'], ['Its foot above the floor', '450']]) {
        await page.getByLabel(label!).fill(length!);
      }
      await expect(page.getByRole('img', { name: 'The wall as it will be straightened' })).toBeVisible();
    });

    await test.step('the measure that contradicts the others is named, and set right', async () => {
      await expect(page.getByText(/Mark 5 contradicts all the others/)).toBeVisible();
      await page.getByLabel('Mark 5 from the left').fill(`${upperLeft.mm[0]} mm`);
      await expect(page.getByText(/Mark 5 contradicts all the others/)).toBeHidden();
      await expect(page.getByText(/^Out by at most [\d.]+ mm/)).toBeVisible();
      await nothingSerious(page);
      await page.getByRole('button', { name: 'Straighten the photo' }).click();
      await expect(page.getByRole('img', { name: /from the front/ })).toBeVisible({ timeout: 60_000 });
    });

    await test.step('the map of accuracy is shown, and a length drawn over the wall is checked', async () => {
      await page.getByLabel('Show how far the picture may be out').check();
      await expect(page.locator('[data-accuracy-map]')).toBeVisible();
      await page.getByLabel('Show how far the picture may be out').uncheck();
      await page.getByRole('button', { name: 'Check a length' }).click();
      const [a, b] = [await onElevation(page, size, 300, 1950), await onElevation(page, size, 2700, 1950)];
      await page.mouse.move(a.x, a.y);
      await page.mouse.down();
      await page.mouse.move(b.x, b.y, { steps: 4 });
      await page.mouse.up();
      const drawn = Number(/Drawn length: (\d+)/.exec((await page.getByText(/^Drawn length/).textContent()) ?? '')?.[1]);
      // A pixel of this screen is some 9 mm of wall.
      expect(Math.abs(drawn - 2400)).toBeLessThan(25);
      for (const [label, mm] of [['First end from the left', '300'], ['First end above the floor', '1950'], ['Second end from the left', '2700'], ['Second end above the floor', '1950']]) await page.getByLabel(label!).fill(mm!);
      await page.getByLabel('Length as measured').fill('2400');
      await expect(page.getByText(/within the .* to be expected/)).toBeVisible();
      await page.getByLabel('Length as measured').fill('2350');
      await expect(page.getByText(/50 mm longer than measured, more than/)).toBeVisible();
      await page.getByRole('button', { name: 'Done checking' }).click();
    });

    await test.step('a stud and an outlet are tapped on the picture, and saved', async () => {
      await page.getByRole('button', { name: 'Draw studs' }).click();
      const stud = await onElevation(page, size, 1200, 1200);
      await page.touchscreen.tap(stud.x, stud.y);
      await expect(page.getByText('1, 1 unconfirmed')).toBeVisible();
      await page.getByRole('button', { name: 'Draw rectangles' }).click();
      for (const [x, y] of [[1130, 258], [1200, 372]] as const) {
        const at = await onElevation(page, size, x, y);
        await page.touchscreen.tap(at.x, at.y);
      }
      await expect(page.getByLabel('Obstruction 1: kind')).toHaveValue('outlet');
      await expect(page.getByLabel('Obstruction 1: keep clear by')).toHaveValue('50 mm');
      await nothingSerious(page);
      await save(page);
    });
  });
});
