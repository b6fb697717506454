import { expect, test } from '@playwright/test';
import { aBench, saved, untilSaved } from './support/editing.ts';

test('a maker has twenty frames arranged, looks through what was found, takes one and takes it back in one step', async ({ page, baseURL }) => {
  const bench = await aBench(page, baseURL!, 2);
  await page.goto(bench.address);
  await expect(page.locator('[data-wall-stage] canvas').first()).toBeVisible();

  await page.getByRole('button', { name: 'Arrange for me' }).press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Arrange for me' });
  await expect(dialog.getByText('Nothing arranged yet.')).toBeVisible();
  await dialog.getByRole('button', { name: 'Arrange', exact: true }).click();
  await expect(dialog.getByText('Choose how many frames of which pattern.')).toBeVisible();

  await dialog.getByRole('spinbutton', { name: 'Comb' }).fill('8');
  await dialog.getByRole('spinbutton', { name: 'Box' }).fill('6');
  await dialog.getByRole('spinbutton', { name: 'Wedge' }).fill('6');
  await dialog.getByRole('radio', { name: /^Drift/ }).check();
  await dialog.getByRole('checkbox', { name: /^In place of the 2 frames/ }).check();
  await dialog.getByRole('button', { name: 'Arrange', exact: true }).click();
  await expect(dialog.getByText(/^\d+ found in \d+ of \d+ ways/)).toBeVisible();
  const found = dialog.getByRole('group', { name: 'Candidates, the best first' }).getByRole('radio');
  expect(await found.count()).toBeGreaterThanOrEqual(3);
  await expect(found.first()).toBeChecked();
  // The second, by keyboard.
  await found.first().press('ArrowDown');
  await expect(found.nth(1)).toBeChecked();
  await page.screenshot({ path: test.info().outputPath('candidates.png') });
  await dialog.getByRole('button', { name: 'Take this one' }).click();

  await expect(dialog).toBeHidden();
  await expect(page.getByRole('heading', { name: 'Frames (20)' })).toBeVisible();
  await expect(page.getByRole('region', { name: 'Findings' }).getByText('Frames overlap')).toHaveCount(0);
  await expect(page.getByRole('region', { name: 'Findings' }).getByText('Frame reaches past the wall')).toHaveCount(0);
  await page.screenshot({ path: test.info().outputPath('taken.png') });
  await untilSaved(page);
  expect((await saved(page, bench)).frames).toHaveLength(20);

  await page.getByRole('button', { name: /^Undo: Arranged/ }).click();
  await expect(page.getByRole('heading', { name: 'Frames (2)' })).toBeVisible();
});
