import { expect, test } from '@playwright/test';

test('a hanger signs in on a phone, sees the job they are sent to and no other, and changes nothing', async ({ browser, baseURL }) => {
  const phone = await (await browser.newContext({ viewport: { width: 390, height: 844 }, baseURL: baseURL! })).newPage();
  await phone.goto('/');
  await phone.getByRole('button', { name: /Juno Pell/ }).click();
  await expect(phone.getByRole('heading', { name: 'Job book' })).toBeVisible();
  await expect(phone.getByText('Reading room, Sallow Street')).toBeVisible();
  await expect(phone.getByText('Café counter')).toHaveCount(0);
  await expect(phone.getByRole('button', { name: 'New job' })).toHaveCount(0);
  await phone.getByRole('link', { name: 'Reading room, Sallow Street' }).click();
  await expect(phone.getByRole('button', { name: 'Add a wall' })).toHaveCount(0);
  await phone.getByRole('link', { name: 'Over the sideboard', exact: true }).click();
  await expect(phone.getByText('A, signed')).toBeVisible();
  await expect(phone.getByRole('button', { name: 'Send to client' })).toHaveCount(0);
  await phone.context().close();
});

test('a client asks for changes; the maker sees it on the job and sends the next revision', async ({ page, browser, baseURL }) => {
  await page.goto('/');
  await page.getByRole('button', { name: /Idris Vane/ }).click();
  await expect(page.getByRole('heading', { name: 'Job book' })).toBeVisible();
  await expect(page.getByRole('link', { name: 'Team' })).toHaveCount(0);

  const mails = (await (await page.request.get('/api/development/mailbox')).json()) as { id: string; to: string }[];
  const { text } = (await (await page.request.get(`/api/development/mailbox/${mails.find((m) => m.to.includes('bela@'))!.id}`)).json()) as { text: string };
  const phone = await (await browser.newContext({ viewport: { width: 360, height: 740 }, baseURL: baseURL! })).newPage();
  await phone.goto(/\/p\/[\w-]+/.exec(text)![0]);
  await phone.getByRole('button', { name: /^Ask for changes/ }).click();
  await phone.getByRole('textbox').fill('Could the row sit a hand higher, please?');
  await phone.getByRole('button', { name: /^(Send|Ask)/ }).last().click();
  await expect(phone.getByText('Could the row sit a hand higher, please?')).toBeVisible();

  await page.getByRole('link', { name: 'Café counter, Tidewater Arcade' }).click();
  await expect(page.getByText('client asked for changes', { exact: false }).first()).toBeVisible();
  await page.getByRole('link', { name: 'Row above the tiles', exact: true }).click();
  await expect(page.getByText(/A, changes asked/)).toBeVisible();
  const frame = page.getByRole('button', { name: /^1\b/ }).first();
  await frame.click();
  await page.getByRole('group', { name: /^The wall/ }).press('Shift+ArrowUp');
  await expect(page.getByText(/B, draft/)).toBeVisible();
  await page.getByRole('button', { name: 'Send to client' }).click();
  await page.getByRole('button', { name: 'Send revision B' }).click();
  await expect(page.getByText(/B, with client/)).toBeVisible();

  await phone.reload();
  await expect(phone.getByText(/newer revision|superseded|revision B/i).first()).toBeVisible();
  await phone.context().close();
});
