import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { pino } from 'pino';
import supertest from 'supertest';
import { createApp, type Parts } from '../../server/app.ts';
import { readConfig } from '../../server/config.ts';
import { createDataSource } from '../../server/database/data-source.ts';
import { FakeMailServer } from '../../server/fakes/mail-server.ts';
import { createOutbox } from '../../server/mail/outbox.ts';
import { outboxRepository } from '../../server/mail/outbox.repository.ts';
import { createPool } from '../../server/workers/pool.ts';
import { freshDatabase } from './database.ts';

export const origin = 'http://127.0.0.1:4310';

/** The whole server on a database and a folder of its own; `now` may be moved. */
export async function aTestApp(change: (parts: Parts) => Partial<Parts> = () => ({})) {
  const database = await freshDatabase();
  const dataDir = mkdtempSync(path.join(os.tmpdir(), 'cw-app-'));
  const config = { ...readConfig({ DATABASE_URL: database, DATA_DIR: dataDir, APP_ORIGIN: origin }), limits: { general: 1e6, signIn: 1e6, mail: 1e6, heavy: 1e6 } };
  const log = pino({ level: 'silent' });
  const data = await createDataSource(database).initialize();
  await data.runMigrations();
  const fakeMail = new FakeMailServer(dataDir);
  const smtpUrl = await fakeMail.start();
  const time = { now: new Date('2026-03-02T09:00:00Z') };
  const clock = () => time.now;
  const outbox = createOutbox(outboxRepository(data), { smtpUrl, from: config.mailFrom, clock, log });
  const pool = createPool();
  const parts: Parts = { config, data, log, outbox, pool, fakeMail, clock, demo: null, bcryptCost: 4 };
  const made = createApp({ ...parts, ...change(parts) });
  return {
    ...made,
    data, dataDir, fakeMail, outbox, time,
    async close() {
      await outbox.stop();
      await pool.close();
      await fakeMail.stop();
      await data.destroy();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
export type TestApp = Awaited<ReturnType<typeof aTestApp>>;

/** A browser without a window: keeps cookies and names the app as the origin of what it sends. */
export function aBrowser(app: TestApp) {
  const agent = supertest.agent(app.app);
  agent.set('Origin', origin).set('Sec-Fetch-Site', 'same-origin');
  return agent;
}
export type Browser = ReturnType<typeof aBrowser>;

let counter = 0;

/** Registers a shop; the browser that comes back is its owner's. */
export async function aShop(app: TestApp, name = `Shop ${++counter}`) {
  const browser = aBrowser(app);
  const email = `owner${++counter}@example.com`;
  const reply = await browser.post('/api/people/register').send({ shopName: name, name: 'Olla Owner', email, password: 'a good long password', units: 'in' }).expect(201);
  return { browser, email, shopId: reply.body.shop.id as string, userId: reply.body.userId as string };
}

/** Adds a member to the owner's shop and signs them in. */
export async function aMember(app: TestApp, owner: Browser, role: 'owner' | 'maker' | 'hanger') {
  const email = `${role}${++counter}@example.com`;
  const password = 'another long password';
  const reply = await owner.post('/api/people/members').send({ name: `A ${role}`, email, role, password }).expect(201);
  const browser = aBrowser(app);
  await browser.post('/api/people/sign-in').send({ email, password }).expect(200);
  return { browser, email, userId: reply.body.id as string };
}
