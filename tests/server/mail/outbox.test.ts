import { pino } from 'pino';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createOutbox, type Outbox } from '../../../server/mail/outbox.ts';
import { outboxRepository } from '../../../server/mail/outbox.repository.ts';
import type { Letter } from '../../../server/mail/letter.ts';
import { aShop, aTestApp, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
let shopId: string;
beforeAll(async () => {
  app = await aTestApp();
  ({ shopId } = await aShop(app));
});
afterAll(() => app.close());

const letter = (subject: string): Letter => ({ subject, paragraphs: ['Dear Tova,', 'A <script>alert(1)</script> & a line'], closing: 'The shop' });
const to = () => ({ shopId, address: 'tova@client.example', replyTo: 'owner@example.com' });
const inbox = async (subject: string) => (await app.fakeMail.list()).filter((m) => m.subject === subject);
const minutes = (n: number) => (app.time.now = new Date(app.time.now.getTime() + n * 60_000));

/** An outbox whose mail server does not answer. */
const cutOff = (): Outbox =>
  createOutbox(outboxRepository(app.data), { smtpUrl: 'smtp://127.0.0.1:1', from: 'Combwright <mail@example.com>', clock: () => app.time.now, log: pino({ level: 'silent' }) });

describe('the outbox', () => {
  it('keeps a message while the mail server is down, and delivers it once when it is back', async () => {
    const down = cutOff();
    await down.post(to(), letter('While it was down'));
    expect(await down.sendDue()).toBe(0);
    expect(await inbox('While it was down')).toHaveLength(0);
    await down.stop();
    expect(await app.outbox.sendDue()).toBe(0);
    minutes(1);
    await app.outbox.sendDue();
    minutes(60);
    await app.outbox.sendDue();
    expect(await inbox('While it was down')).toHaveLength(1);
  });

  it('sends again what a sender took and died with, under the same Message-ID', async () => {
    await app.outbox.post(to(), letter('Taken and dropped'));
    const rows = outboxRepository(app.data);
    const [row] = (await rows.due(app.time.now)).filter((r) => r.subject === 'Taken and dropped');
    expect(await rows.claim(row!, new Date(app.time.now.getTime() + 90_000))).toBe(true);
    expect(await rows.claim(row!, new Date(app.time.now.getTime() + 90_000))).toBe(false);
    await app.outbox.sendDue();
    expect(await inbox('Taken and dropped')).toHaveLength(0);
    minutes(2);
    await app.outbox.sendDue();
    expect(await inbox('Taken and dropped')).toHaveLength(1);
  });

  it('gives up after its last try, and says why', async () => {
    const down = cutOff();
    await down.post(to(), letter('Never to arrive'));
    for (let i = 0; i < 12; i++) {
      await down.sendDue();
      minutes(60 * 9);
    }
    await down.stop();
    const [row] = await app.data.query("SELECT state, lastError FROM outbox WHERE subject = 'Never to arrive'");
    expect(row).toMatchObject({ state: 'failed', lastError: expect.stringContaining('ECONNREFUSED') });
  });

  it('lets no line end of a subject begin a header, and no tag of a text become HTML', async () => {
    await app.outbox.post(to(), letter('Layout\r\nBcc: everyone@example.com'));
    await app.outbox.sendDue();
    const [mail] = await inbox('Layout Bcc: everyone@example.com');
    expect(mail!.to).toBe('tova@client.example');
    expect(mail!.html).not.toContain('<script>');
  });
});
