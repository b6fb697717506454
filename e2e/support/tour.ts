import { execFileSync } from 'node:child_process';
import { copyFileSync, mkdtempSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { chromium, type Page } from '@playwright/test';

// Takes the pictures of the README from the demo of a running app: node --import tsx e2e/support/tour.ts http://127.0.0.1:4310
const base = process.argv[2] ?? 'http://127.0.0.1:4310';
const folder = path.resolve(import.meta.dirname, '../tour');
const browser = await chromium.launch({ executablePath: process.env.COMBWRIGHT_CHROMIUM ?? '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu'] });
const page = await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage();
const shot = async (of: Page, name: string) => {
  await of.waitForTimeout(2500);
  await of.screenshot({ path: path.join(folder, `${name}.jpg`), type: 'jpeg', quality: 82 });
};
const ask = async <T>(address: string): Promise<T> => (await (await page.request.get(base + address)).json()) as T;

await page.goto(base);
await page.getByRole('button', { name: /Maren Tolland/ }).click();
await page.getByRole('heading', { name: 'Job book' }).waitFor();
await shot(page, 'jobs');
const job = (await ask<{ id: string; title: string }[]>('/api/jobs')).find((j) => j.title.startsWith('Reading room'))!;
const [wall] = await ask<{ id: string }[]>(`/api/jobs/${job.id}/walls`);
const [layout] = await ask<{ id: string }[]>(`/api/jobs/${job.id}/layouts`);
await page.goto(`${base}/jobs/${job.id}/walls/${wall!.id}`);
await shot(page, 'measure');
await page.goto(`${base}/jobs/${job.id}/layouts/${layout!.id}`);
await shot(page, 'layout');
await page.goto(`${base}/hardware`);
await shot(page, 'hardware');

const mails = await ask<{ id: string; to: string }[]>('/api/development/mailbox');
const { text } = await ask<{ text: string }>(`/api/development/mailbox/${mails.find((m) => m.to.includes('bela@'))!.id}`);
const phone = await (await browser.newContext({ viewport: { width: 390, height: 800 } })).newPage();
await phone.goto(base + /\/p\/[\w-]+/.exec(text)![0]);
await shot(phone, 'portal');

const pdf = path.join(mkdtempSync(path.join(os.tmpdir(), 'tour-')), 'template.pdf');
writeFileSync(pdf, await (await page.request.get(`${base}/api/layouts/${layout!.id}/template.pdf?paper=letter`)).body());
execFileSync('pdftoppm', ['-jpeg', '-r', '70', '-f', '11', '-l', '11', '-singlefile', pdf, pdf]);
copyFileSync(`${pdf}.jpg`, path.join(folder, 'template.jpg'));
await browser.close();
