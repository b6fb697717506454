import { mkdtempSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { expect, test, type Page } from '@playwright/test';
import { pdfFacts, readSheets } from '../tests/support/printed-template.ts';
import { calibrationScene, choosePhoto, setMarks, straighten } from './support/measuring.ts';

const side = 150;
const reveal = 6;
/** Centres of neighbouring hexagons are √3 s and the reveal apart. */
const apart = Math.sqrt(3) * side + reveal;

test('from a wall photo to the template: register, measure, lay out, send, sign, print', async ({ page, browser, baseURL }) => {
  test.setTimeout(300_000);
  const email = `una${Date.now()}@example.com`;

  await test.step('a shop registers', async () => {
    await page.goto('/register');
    await page.getByLabel('Name of the shop').fill('Comb & Quay');
    await page.getByLabel('Your name').fill('Una Reed');
    await page.getByLabel('E-mail').fill(email);
    await page.getByLabel('Password').fill('a good long password');
    await page.getByLabel('Lengths are shown in').selectOption('Millimetres');
    await page.getByRole('button', { name: 'Register the shop' }).click();
    await expect(page.getByRole('heading', { name: 'Job book' })).toBeVisible();
  });

  await test.step('opens a job with a wall', async () => {
    await page.getByRole('button', { name: 'New job' }).first().click();
    await page.getByLabel('Title').fill('Hall, Quay Row');
    await page.getByLabel('Client', { exact: true }).fill('Tova Lind');
    await page.getByLabel("Client's e-mail").fill('tova@client.example');
    await page.getByRole('button', { name: 'Open the job' }).click();
    await expect(page.getByRole('heading', { name: 'Hall, Quay Row' })).toBeVisible();
    await page.getByRole('button', { name: 'Add a wall' }).first().click();
    await page.getByRole('dialog').getByLabel('Name').fill('Target wall');
    await page.getByLabel('Width').fill('3000');
    await page.getByLabel('Height').fill('2.4 m');
    await page.getByRole('textbox', { name: 'Covering' }).fill('12.5');
    await page.getByRole('button', { name: 'Add the wall' }).click();
    await expect(page.getByRole('heading', { name: 'Target wall', level: 1 })).toBeVisible();
  });

  await test.step('uploads and straightens the photo, finds the studs', async () => {
    await choosePhoto(page, `${calibrationScene}.jpg`);
    await setMarks(page);
    await straighten(page);
    await page.getByLabel('First stud’s centre').fill('300');
    await page.getByLabel('Spacing').selectOption('400 mm o.c.');
    await page.getByRole('button', { name: 'Lay out the studs' }).click();
    await page.getByRole('button', { name: 'Save the wall' }).click();
    await expect(page.getByRole('button', { name: 'Saved' })).toBeVisible();
    await page.getByRole('link', { name: 'Hall, Quay Row' }).click();
  });

  await test.step('makes a pattern', async () => {
    await page.getByRole('link', { name: 'Pattern book' }).click();
    await page.getByRole('button', { name: 'New pattern' }).first().click();
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('Name').fill('Comb 150');
    await dialog.getByLabel('Side', { exact: true }).fill(String(side));
    await dialog.getByRole('textbox', { name: 'Thickness' }).fill('19');
    await dialog.getByLabel('Depth').first().fill('110');
    await page.getByRole('button', { name: 'Add to the pattern book' }).click();
    await expect(page.getByRole('heading', { name: 'Comb 150' })).toBeVisible();
  });

  await test.step('lays five frames out by mouse; each snaps to its neighbours at the reveal', async () => {
    await page.getByRole('link', { name: 'Jobs' }).click();
    await page.getByRole('link', { name: 'Hall, Quay Row' }).click();
    await page.getByRole('button', { name: 'New layout' }).first().click();
    await page.getByLabel('Name').fill('Five in a cluster');
    await page.getByLabel('Reveal').fill(String(reveal));
    await page.getByRole('button', { name: 'Start the layout' }).click();
    await expect(page.getByRole('heading', { name: 'Five in a cluster' })).toBeVisible();
    await dropFive(page);
  });

  const layoutUrl = page.url();
  const layoutId = layoutUrl.split('/').at(-1)!;

  await test.step('sends it to the client', async () => {
    await page.getByRole('button', { name: 'Send to client' }).click();
    await page.getByLabel(/Note to the client/).fill('Five boxes, as we said on the stairs.');
    await page.getByRole('button', { name: 'Send revision A' }).click();
    await expect(page.getByText('A, with client')).toBeVisible();
  });

  await test.step('the client opens the link from the mail on a phone and signs', async () => {
    const link = await linkFromMail(page);
    const phone = await (await browser.newContext({ viewport: { width: 390, height: 844 }, baseURL: baseURL! })).newPage();
    await phone.goto(link);
    await expect(phone.getByRole('heading', { name: 'Hall, Quay Row' })).toBeVisible();
    await expect(phone.getByText('Five boxes, as we said on the stairs.')).toBeVisible();
    await expect(phone.getByRole('img', { name: /5 frames/ })).toBeVisible();
    await phone.getByRole('button', { name: /^Sign / }).click();
    await phone.getByLabel('Your full name').fill('Tova Lind');
    await phone.getByRole('checkbox').check();
    await phone.getByRole('button', { name: 'Sign', exact: true }).click();
    await expect(phone.getByText(/signed/i).first()).toBeVisible();
    await phone.context().close();
  });

  await test.step('the shop sees it signed and prints a template that is true to the layout', async () => {
    await page.goto(layoutUrl);
    await expect(page.getByText('A, signed')).toBeVisible();
    const frames = (await (await page.request.get(`/api/layouts/${layoutId}`)).json()).frames as { label: string; xMm: number; yMm: number; patternId: string }[];
    const patterns = (await (await page.request.get('/api/patterns')).json()) as { id: string; design: { hangers: { alongMm: number; insetMm: number; member: number }[] } }[];
    for (const paper of ['Letter', 'A4']) {
      await page.getByRole('button', { name: 'Template' }).click();
      await page.getByLabel('Paper').selectOption(paper);
      const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Make the template' }).click()]);
      const file = path.join(mkdtempSync(path.join(os.tmpdir(), 'cw-template-')), 'template.pdf');
      await download.saveAs(file);
      await page.keyboard.press('Escape');
      expectPaper(file, paper === 'Letter' ? [215.9, 279.4] : [210, 297]);
      const sheets = await readSheets(file);
      for (const bar of sheets.flatMap((s) => s.bars)) expect(Math.abs(bar.printedMm - bar.statedMm)).toBeLessThan(0.1);
      const screws = sheets.flatMap((s) => s.screws);
      for (const frame of frames) {
        for (const hanger of patterns.find((p) => p.id === frame.patternId)!.design.hangers) {
          // The top side of a level hexagon runs to the left, √3/2 s above the centre.
          expect(hanger.member).toBe(3);
          const at = { x: frame.xMm - hanger.alongMm, y: frame.yMm + (Math.sqrt(3) / 2) * side - hanger.insetMm };
          const nearest = Math.min(...screws.map((s) => Math.hypot(s.x - at.x, s.y - at.y)));
          expect(nearest, `a screw of frame ${frame.label} on ${paper}`).toBeLessThan(0.2);
        }
      }
    }
  });
});

/** One in the middle, then four dropped some millimetres beside where they belong. */
async function dropFive(page: Page): Promise<void> {
  const wall = (await page.getByRole('group', { name: /^The wall/ }).boundingBox())!;
  const tray = page.getByRole('region', { name: 'Tray' }).getByRole('button', { name: /Comb 150/ });
  const scale = Number(/1 : ([\d.]+)/.exec((await page.locator('main').textContent()) ?? '')![1]);
  const pxPerMm = 96 / 25.4 / scale;
  const middle = { x: wall.x + wall.width / 2, y: wall.y + wall.height / 2 };
  const turns = [90, 30, -30, 150];
  const drops = [{ dx: 0, dy: 0 }, ...turns.map((t, i) => ({ dx: (apart + 14 - i) * Math.cos((t * Math.PI) / 180), dy: (apart + 14 - i) * Math.sin((t * Math.PI) / 180) }))];
  for (const [i, { dx, dy }] of drops.entries()) {
    const from = (await tray.boundingBox())!;
    await page.mouse.move(from.x + from.width / 2, from.y + from.height / 2);
    await page.mouse.down();
    await page.mouse.move(middle.x + dx * pxPerMm + 20, middle.y - dy * pxPerMm + 20, { steps: 4 });
    await page.mouse.move(middle.x + dx * pxPerMm, middle.y - dy * pxPerMm, { steps: 4 });
    await page.mouse.up();
    await expect(page.getByRole('heading', { name: `Frames (${i + 1})` })).toBeVisible();
  }
  await expect(page.getByText(/^Saved \d/)).toBeVisible();
  const frames = (await (await page.request.get(`/api/layouts/${page.url().split('/').at(-1)}`)).json()).frames as { xMm: number; yMm: number; label: string }[];
  const first = frames.find((f) => f.label === '1')!;
  for (const f of frames.filter((x) => x !== first)) expect(Math.hypot(f.xMm - first.xMm, f.yMm - first.yMm)).toBeCloseTo(apart, 6);
}

/** Where the newest mail to the client leads, as the mailbox page shows it. */
async function linkFromMail(page: Page): Promise<string> {
  await page.goto('/dev/mailbox');
  const mail = page.getByRole('link', { name: /Hall, Quay Row: please look/ }).or(page.getByRole('button', { name: /Hall, Quay Row: please look/ }));
  await expect(async () => {
    await page.reload();
    await expect(mail.first()).toBeVisible({ timeout: 2000 });
  }).toPass({ timeout: 30_000 });
  await mail.first().click();
  const link = page.getByRole('link', { name: /\/p\// });
  await expect(link).toBeVisible();
  return /\/p\/[A-Za-z0-9_-]+/.exec((await link.getAttribute('href'))!)![0];
}

function expectPaper(file: string, mm: number[]): void {
  const { sizesPt } = pdfFacts(file);
  expect(sizesPt.length).toBeGreaterThan(2);
  for (const pt of sizesPt) {
    const size = pt.map((n) => (n / 72) * 25.4).sort((a, b) => a - b);
    expect(Math.abs(size[0]! - mm[0]!)).toBeLessThan(0.1);
    expect(Math.abs(size[1]! - mm[1]!)).toBeLessThan(0.1);
  }
}
