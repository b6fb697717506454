import { mkdtempSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { expect, test, type Page } from '@playwright/test';
import { PrintedPage } from '../tests/support/printed-page.ts';

/** The sheets that the dialog counts. */
async function sheets(page: Page): Promise<number> {
  return Number(/^(\d+) sheets?/.exec((await page.getByText(/^\d+ sheets? of/).textContent())!)![1]);
}

async function made(page: Page): Promise<string> {
  const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Make the template' }).click()]);
  const file = path.join(mkdtempSync(path.join(os.tmpdir(), 'cw-template-')), 'template.pdf');
  await download.saveAs(file);
  return file;
}

test('a maker chooses how to print, pulls the grid, proves the printer, and the next print is corrected', async ({ page }) => {
  test.setTimeout(240_000);
  await page.goto('/');
  await page.getByRole('button', { name: /Idris Vane/ }).click();
  await page.getByRole('link', { name: 'Reading room, Sallow Street' }).click();
  await page.getByRole('link', { name: 'Over the sideboard', exact: true }).click();
  await page.getByRole('button', { name: 'Template' }).click();

  await expect(page.getByText(/^\d+ sheets? of Letter/)).toBeVisible({ timeout: 60_000 });
  const all = await sheets(page);
  await page.getByLabel('What to print').selectOption('Screws only');
  await expect(async () => expect(await sheets(page)).toBeLessThan(all)).toPass({ timeout: 60_000 });
  await page.getByLabel('What to print').selectOption('The full template');
  await expect(async () => expect(await sheets(page)).toBe(all)).toPass({ timeout: 60_000 });

  const wall = page.getByRole('img', { name: /sheets over the wall/ });
  const box = (await wall.boundingBox())!;
  await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
  await page.mouse.down();
  await page.mouse.move(box.x + box.width / 2 + 17, box.y + box.height / 2 + 13, { steps: 4 });
  await page.mouse.up();
  await expect(page.getByText(/more than the fewest|as few as can be/)).toBeVisible();
  expect(await sheets(page)).toBeGreaterThanOrEqual(all);
  await page.getByRole('button', { name: 'Back to fewest' }).click();
  expect(await sheets(page)).toBe(all);

  await page.getByLabel('Look at').selectOption({ index: 1 });
  await expect(page.getByRole('img', { name: /^Sheet .* as it will be printed/ })).toBeVisible();

  await page.getByLabel('Another printer’s name').fill('Workshop, upstairs');
  await page.getByRole('button', { name: 'Add', exact: true }).click();
  const across = page.getByLabel(/^Bar across, /);
  await expect(across).toBeVisible();
  const first = await PrintedPage.read(await made(page), 1);
  // Read on the uncorrected print as the hanger would, but for a printer that runs 1 % short across and true up.
  const [printed, up] = [first.barLength('across'), first.barLength('up')];
  await page.getByLabel(/^Bar up, /).fill(`${up.toFixed(2)} mm`);
  await across.fill(`${(printed * 0.95).toFixed(2)} mm`);
  await page.getByRole('button', { name: 'Correct this printer' }).click();
  await expect(page.getByText(/Untick “Fit to page”/).first()).toBeVisible();
  await across.fill(`${(printed * 0.99).toFixed(2)} mm`);
  await page.getByRole('button', { name: 'Correct this printer' }).click();
  await expect(page.getByText(/next print is drawn larger by [\d.]+ % across/)).toBeVisible();
  await expect(page.getByText(/no more than your rule can tell/)).toBeVisible();
  const second = await PrintedPage.read(await made(page), 1);
  expect(second.words).toContain('corrected for Workshop, upstairs');
  expect(Math.abs(second.barLength('across') * 0.99 - printed)).toBeLessThan(0.15);
  expect(Math.abs(second.barLength('up') - up)).toBeLessThan(0.1);
});
