import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { aBench, onScreen, saved, untilSaved } from './support/editing.ts';

test('a maker builds a collage of twelve frames of three patterns by mouse', async ({ page, baseURL }) => {
  const bench = await aBench(page, baseURL!);
  await page.goto(bench.address);
  const stage = page.locator('[data-wall-stage]');
  await expect(stage.locator('canvas').first()).toBeVisible();

  const dragFromTray = async (pattern: string, xMm: number, yMm: number) => {
    const from = (await page.getByRole('region', { name: 'Tray' }).getByRole('button', { name: new RegExp(`^${pattern}`) }).boundingBox())!;
    const to = await onScreen(page, xMm, yMm);
    await page.mouse.move(from.x + 30, from.y + 20);
    await page.mouse.down();
    await page.mouse.move(to.x, to.y, { steps: 4 });
    await page.mouse.up();
  };

  await test.step('frames are dragged from the tray and meet at the reveal', async () => {
    // Combs side by side by their slanting edges are 1.5 sides apart across and half their height upwards; held 10 mm off, they snap.
    const rise = 200 * Math.sqrt(3) + 6;
    await dragFromTray('Comb', 1000, 1448);
    for (const [i, [dx, dy]] of [[1, 0.5], [2, 0], [3, 0.5], [4, 0]].entries()) {
      await dragFromTray('Comb', 1000 + dx! * (rise * Math.cos(Math.PI / 6)) + 8, 1448 + dy! * rise + (i % 2 ? 9 : -9));
    }
    await untilSaved(page);
    const { frames } = await saved(page, bench);
    expect(frames).toHaveLength(5);
    const [first, ...others] = [...frames].sort((a, b) => a.xMm - b.xMm);
    others.reduce((left, right) => {
      expect(Math.hypot(right.xMm - left.xMm, right.yMm - left.yMm)).toBeCloseTo(rise, 6);
      return right;
    }, first!);
  });

  await test.step('boxes over them and wedges beside', async () => {
    for (const x of [1000, 1610, 2220]) await dragFromTray('Box', x, 900);
    for (const x of [2800, 3100, 3400]) await dragFromTray('Wedge', x, 900);
    await dragFromTray('Box', 3300, 2000);
    await expect(page.getByRole('heading', { name: 'Frames (12)' })).toBeVisible();
  });

  await test.step('several are chosen by a box drawn over the bare wall, aligned and spaced', async () => {
    const [from, to] = [await onScreen(page, 820, 760), await onScreen(page, 2400, 1060)];
    await page.mouse.move(from.x, from.y);
    await page.mouse.down();
    await page.mouse.move(to.x, to.y, { steps: 4 });
    await page.mouse.up();
    const sheet = page.getByRole('region', { name: '3 frames' });
    await sheet.getByRole('button', { name: 'Align bottom edges' }).click();
    await sheet.getByRole('button', { name: 'Space evenly across' }).click();
    await untilSaved(page);
    const boxes = (await saved(page, bench)).frames.filter((f) => f.patternId === bench.patternIds[1] && f.yMm < 1100).sort((a, b) => a.xMm - b.xMm);
    expect(new Set(boxes.map((f) => f.yMm.toFixed(6))).size).toBe(1);
    expect(boxes[1]!.xMm - boxes[0]!.xMm).toBeCloseTo(boxes[2]!.xMm - boxes[1]!.xMm, 6);
  });

  await test.step('a frame dragged with Ctrl held goes exactly where the hand does', async () => {
    const before = (await saved(page, bench)).frames.find((f) => f.yMm > 1900)!;
    const [from, to] = [await onScreen(page, before.xMm, before.yMm), await onScreen(page, before.xMm - 300, before.yMm - 137)];
    await page.mouse.move(from.x, from.y);
    await page.keyboard.down('Control');
    await page.mouse.down();
    await page.mouse.move(to.x, to.y, { steps: 5 });
    await page.mouse.up();
    await page.keyboard.up('Control');
    await untilSaved(page);
    const after = (await saved(page, bench)).frames.find((f) => f.id === before.id)!;
    expect(after.xMm).toBeCloseTo(before.xMm - 300, 3);
    expect(after.yMm).toBeCloseTo(before.yMm - 137, 3);
  });

  await test.step('undo takes everything back, redo makes it again', async () => {
    const undo = page.getByRole('button', { name: /^Undo/ });
    const whole = (await saved(page, bench)).frames;
    while ((await undo.getAttribute('aria-disabled')) === null) await undo.click();
    await expect(page.getByRole('heading', { name: 'Frames (0)' })).toBeVisible();
    const redo = page.getByRole('button', { name: /^Redo/ });
    while ((await redo.getAttribute('aria-disabled')) === null) await redo.click();
    await untilSaved(page);
    const again = (await saved(page, bench)).frames;
    const byId = <T extends { id: string }>(list: T[]) => [...list].sort((a, b) => (a.id < b.id ? -1 : 1));
    expect(byId(again)).toEqual(byId(whole));
  });

  await test.step('the page has nothing serious to mend for those who hear or press keys', async () => {
    const { violations } = await new AxeBuilder({ page }).analyze();
    expect(violations.filter((v) => v.impact === 'serious' || v.impact === 'critical').map((v) => `${v.id}: ${v.nodes[0]?.html}`)).toEqual([]);
  });

});
