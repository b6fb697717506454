import { expect, test, type Page } from '@playwright/test';
import { aBench, anotherBrowser, choose, saved, untilSaved } from './support/editing.ts';

const setHeight = async (page: Page, mm: string) => {
  const field = page.getByLabel('Centre above floor');
  await field.fill(mm);
  await field.press('Enter');
};
const height = async (page: Page, label: string) => (await page.getByRole('region', { name: 'Frames', exact: true }).getByRole('row', { name: new RegExp(`^${label} `) }).getByRole('cell').nth(1).textContent()) ?? '';

test('two people at one layout: different frames merge, the same frame asks', async ({ page, baseURL, browser }) => {
  const bench = await aBench(page, baseURL!, 3);
  await page.goto(bench.address);
  await expect(page.locator('[data-wall-stage] canvas').first()).toBeVisible();
  const other = await anotherBrowser(browser, baseURL!, bench);

  await test.step('what one saves appears at the other within seconds', async () => {
    await choose(page, '1');
    await setHeight(page, '1500');
    await untilSaved(page);
    await expect.poll(() => height(other, '1'), { timeout: 8000 }).toBe('1500 mm');
    await expect(other.getByText('Ines Maker saved: their changes are on the wall.')).toBeVisible();
  });

  await test.step('different frames changed at the same moment both stand', async () => {
    await Promise.all([choose(page, '2'), choose(other, '3')]);
    await Promise.all([setHeight(page, '1600'), setHeight(other, '1700')]);
    await Promise.all([untilSaved(page), untilSaved(other)]);
    await expect.poll(async () => (await saved(page, bench)).frames.map((f) => f.yMm).sort()).toEqual([1500, 1600, 1700]);
    await expect.poll(() => height(page, '3'), { timeout: 8000 }).toBe('1700 mm');
    await expect.poll(() => height(other, '2'), { timeout: 8000 }).toBe('1600 mm');
  });

  await test.step('the same frame changed by both is asked about, and nothing is overwritten before the answer', async () => {
    // The other is cut off while both change frame 2.
    await other.context().setOffline(true);
    await choose(other, '2');
    await setHeight(other, '1900');
    await choose(page, '2');
    await setHeight(page, '1800');
    await untilSaved(page);
    await other.context().setOffline(false);
    await expect(other.getByText(/saved other changes to frame 2 before you/)).toBeVisible();
    expect((await saved(page, bench)).frames.find((f) => f.label === '2')!.yMm).toBe(1800);
    await other.getByRole('button', { name: 'Put mine in its place' }).click();
    await expect.poll(async () => (await saved(page, bench)).frames.find((f) => f.label === '2')!.yMm).toBe(1900);
  });
  await other.context().close();
});

test('edits made while the network is cut outlive a reload and are sent when it is back', async ({ page, baseURL, context }) => {
  const bench = await aBench(page, baseURL!, 2);
  page.on('dialog', (dialog) => void dialog.accept());
  await page.goto(bench.address);
  await expect(page.locator('[data-wall-stage] canvas').first()).toBeVisible();
  await context.setOffline(true);
  await choose(page, '1');
  await setHeight(page, '1234');
  await choose(page, '2');
  await page.getByRole('button', { name: 'Duplicate' }).click();
  await expect(page.getByText('Not saved: offline, kept here')).toBeVisible();
  // Reloaded while cut, the page cannot come; it comes when the line does, with all that was done.
  await page.reload().catch(() => undefined);
  await context.setOffline(false);
  await page.goto(bench.address);
  await expect(page.getByRole('heading', { name: 'Frames (3)' })).toBeVisible();
  await untilSaved(page);
  await expect.poll(async () => (await saved(page, bench)).frames.length).toBe(3);
  expect((await saved(page, bench)).frames.find((f) => f.label === '1')!.yMm).toBe(1234);
});
