import { expect, test, type Page } from '@playwright/test';
import { aBench, saved, untilSaved } from './support/editing.ts';

// A trace of hundreds of presses would take longer than the journey.
test.use({ trace: 'off' });

/** Goes on with Tab (or back) until what has the focus bears a name, as one who sees no pointer would. */
async function tabTo(page: Page, name: RegExp, within?: string, way: 'Tab' | 'Shift+Tab' = 'Tab'): Promise<void> {
  for (let n = 0; n < 150; n++) {
    await page.keyboard.press(way);
    const found = await page.evaluate((part) => {
      const on = document.activeElement as HTMLElement | null;
      if (!on || (part && !on.closest(`section[aria-label="${part}"]`))) return null;
      const labelled = on instanceof HTMLInputElement || on instanceof HTMLSelectElement ? (on.labels?.[0]?.textContent ?? '') : '';
      return on.getAttribute('aria-label') ?? (labelled || (on.textContent ?? ''));
    }, within);
    if (found !== null && name.test(found.trim())) return;
  }
  throw new Error(`Tab never came to ${name}.`);
}

test('a maker builds a collage of twelve frames of three patterns by keyboard alone', async ({ page, baseURL }) => {
  const bench = await aBench(page, baseURL!);
  await page.goto(bench.address);
  await expect(page.locator('[data-wall-stage] canvas').first()).toBeVisible();

  await test.step('Enter on a pattern of the tray places it beside the last, at the reveal', async () => {
    for (const pattern of ['Comb', 'Box', 'Wedge']) {
      await tabTo(page, new RegExp(`^${pattern}`), 'Tray');
      for (let n = 0; n < 4; n++) await page.keyboard.press('Enter');
    }
    await expect(page.getByRole('heading', { name: 'Frames (12)' })).toBeVisible();
    await expect(page.getByRole('region', { name: 'Findings' }).getByText('Frames overlap')).toHaveCount(0);
  });

  await test.step('one is chosen in the ledger, set exactly, turned, nudged and locked', async () => {
    await tabTo(page, /^12 /, 'Frames');
    await page.keyboard.press('Enter');
    // The sheet of what is chosen stands before the list.
    await tabTo(page, /^Centre from left/, undefined, 'Shift+Tab');
    await page.keyboard.press('Control+a');
    await page.keyboard.type('3500');
    await page.keyboard.press('Enter');
    await tabTo(page, /^Centre above floor/);
    await page.keyboard.press('Control+a');
    await page.keyboard.type('60"');
    await page.keyboard.press('Enter');
    await tabTo(page, /^Turn left/, undefined, 'Shift+Tab');
    await page.keyboard.press('Enter');
    await tabTo(page, /^The wall Long wall/, undefined, 'Shift+Tab');
    await page.keyboard.press('ArrowRight');
    await page.keyboard.press('Shift+ArrowUp');
    await tabTo(page, /^Lock/);
    await page.keyboard.press('Enter');
    await untilSaved(page);
    const frame = (await saved(page, bench)).frames.find((f) => f.label === '12')!;
    // 60 in = 1524 mm by the definition of the inch; a nudge is 1 mm, with Shift 10 mm; a step of a triangle is 60°.
    expect([frame.xMm, frame.yMm]).toEqual([3501, 1534]);
    expect(Math.abs(frame.turnRad % (Math.PI / 3))).toBeLessThan(1e-9);
  });

  await test.step('all are chosen from the wall and set as a whole; the locked one says why not', async () => {
    await tabTo(page, /^The wall Long wall/, undefined, 'Shift+Tab');
    await page.keyboard.press('Control+a');
    await expect(page.getByRole('region', { name: '12 frames' })).toBeVisible();
    await page.keyboard.press('ArrowUp');
    await untilSaved(page);
    expect((await saved(page, bench)).frames.find((f) => f.label === '12')).toMatchObject({ xMm: 3501, yMm: 1534 });
  });

  await test.step('the pattern of one is swapped in its place, and taken back by Ctrl+Z', async () => {
    await tabTo(page, /^1 /, 'Frames');
    await page.keyboard.press('Enter');
    await tabTo(page, /^Pattern$/, undefined, 'Shift+Tab');
    await page.keyboard.press('ArrowDown');
    await untilSaved(page);
    const swapped = (await saved(page, bench)).frames.find((f) => f.label === '1')!;
    expect(swapped.patternId).not.toBe(bench.patternIds[0]);
    await tabTo(page, /^The wall Long wall/, undefined, 'Shift+Tab');
    await page.keyboard.press('Control+z');
    await untilSaved(page);
    expect((await saved(page, bench)).frames.find((f) => f.label === '1')!.patternId).toBe(bench.patternIds[0]);
  });
});
