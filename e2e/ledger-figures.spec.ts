import { expect, test, type Page } from '@playwright/test';

async function openLayoutOf(page: Page, baseURL: string, jobTitle: string): Promise<void> {
  const signIn = await page.request.post('/api/people/sign-in', { data: { email: 'maren@fennmark.example', password: 'chalk-line-and-plumb' }, headers: { Origin: baseURL } });
  expect(signIn.ok()).toBe(true);
  const jobs = (await (await page.request.get('/api/jobs')).json()) as { id: string; title: string }[];
  const job = jobs.find((j) => j.title.startsWith(jobTitle))!;
  const [layout] = (await (await page.request.get(`/api/jobs/${job.id}/layouts`)).json()) as { id: string }[];
  await page.goto(`/jobs/${job.id}/layouts/${layout!.id}`);
  await expect(page.getByRole('heading', { name: 'Loads' })).toBeVisible();
}

test('the ledger opens a load down to its formula and source, by keyboard', async ({ page, baseURL }) => {
  await openLayoutOf(page, baseURL!, 'Reading room');
  const loads = page.getByRole('region', { name: 'Loads' });
  await expect(loads.getByText('Weight on the wall')).toBeVisible();
  await loads.locator('summary', { hasText: 'frame 1' }).first().focus();
  await page.keyboard.press('Enter');
  const hanger = loads.getByRole('region', { name: 'Hanger 1a of frame 1' });
  await expect(hanger.getByText(/^V .+ lbf, T .+ lbf, R .+ lbf$/)).toBeVisible();
  const figure = hanger.locator('details', { hasText: /^Out of the wall, T/ });
  await figure.locator('summary').focus();
  await page.keyboard.press('Enter');
  await expect(figure.getByText('Formula: T = W z h / Σh²')).toBeVisible();
  await expect(figure.getByText('Source: Elastic (vector) method')).toBeVisible();
});

test('studs are sought, previewed, put in place as one step, and taken back as one', async ({ page, baseURL }) => {
  await openLayoutOf(page, baseURL!, 'Stair hall');
  await page.getByRole('button', { name: 'Seek studs', exact: true }).click();
  const panel = page.getByRole('region', { name: 'Seek studs' });
  await expect(panel.locator('p', { hasText: 'Today:' })).toContainText('hangers in studs');
  await expect(panel.getByRole('radio').first()).toBeChecked();
  await panel.getByText('Hanger by hanger').click();
  await expect(panel.getByRole('list', { name: 'Hangers and how they would stand' })).toContainText('In the stud');
  const counts = async (words: string) => /(\d+) of (\d+) hangers in studs/.exec((await panel.locator('p', { hasText: words }).textContent())!)!.slice(1).map(Number);
  const [before = 0, hangers = 0] = await counts('Today:');
  const [inStuds = 0] = await counts('At best:');
  expect(inStuds).toBeGreaterThan(before);
  await panel.getByRole('button', { name: 'Put it so' }).click();
  await expect(panel).toHaveCount(0);
  const findings = page.getByRole('region', { name: 'Findings' });
  const missing = findings.locator('summary', { hasText: 'Hanger not in a stud' });
  const expectMissing = async (n: number) => {
    await expect(missing).toHaveCount(n > 0 ? 1 : 0);
    if (n > 1) await expect(missing).toContainText(`× ${n}`);
  };
  await expectMissing(hangers - inStuds);
  await page.getByRole('button', { name: /^Undo: Studs sought/ }).click();
  await expectMissing(hangers - before);
  await page.getByRole('button', { name: /^Redo: Studs sought/ }).click();
  await expect(page.getByText(/^Saved/)).toBeVisible();
  await page.reload();
  await expectMissing(hangers - inStuds);
  await page.getByRole('button', { name: 'Seek studs', exact: true }).click();
  await expect(panel.locator('p', { hasText: 'Today:' })).toContainText(`${inStuds} of ${hangers} hangers in studs`);
});
