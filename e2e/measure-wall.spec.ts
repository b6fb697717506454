import { expect, test } from '@playwright/test';
import { calibrationScene, choosePhoto, setMarks, straighten } from './support/measuring.ts';

test('a maker measures a wall: photo, four marks, straightened picture, studs, an outlet, saved', async ({ page, baseURL }) => {
  const post = async (url: string, data: object) => {
    const reply = await page.request.post(url, { data, headers: { Origin: baseURL! } });
    expect(reply.status()).toBe(201);
    return (await reply.json()) as { id: string };
  };
  await post('/api/people/register', { shopName: 'Measure & Sons', name: 'Ines Maker', email: `ines${Date.now()}@example.com`, password: 'a good long password', units: 'mm' });
  const job = await post('/api/jobs', { title: 'Stair hall', clientName: 'Tova Lind', clientEmail: 'tova@client.example', site: '4 Quay Row' });
  const wall = await post(`/api/jobs/${job.id}/walls`, { name: 'Target wall', widthMm: 3000, heightMm: 2400, construction: 'wood studs', coveringMm: 12.5 });
  await page.goto(`/jobs/${job.id}/walls/${wall.id}`);

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
    await page.getByRole('button', { name: 'Save the wall' }).click();
    await expect(page.getByRole('button', { name: 'Saved' })).toBeVisible();
    await page.reload();
    await expect(page.getByText('7, 6 unconfirmed')).toBeVisible();
    await expect(page.getByLabel('Obstruction 1: from the left')).toHaveValue('1130 mm');
  });
});
