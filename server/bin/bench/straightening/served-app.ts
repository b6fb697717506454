import { randomBytes } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { monitorEventLoopDelay } from 'node:perf_hooks';
import mysql from 'mysql2/promise';
import { pino } from 'pino';
import { createApp } from '../../../app.ts';
import { readConfig } from '../../../config.ts';
import { createDataSource } from '../../../database/data-source.ts';
import { FakeMailServer } from '../../../fakes/mail-server.ts';
import { createOutbox } from '../../../mail/outbox.ts';
import { outboxRepository } from '../../../mail/outbox.repository.ts';
import { createPool } from '../../../workers/pool.ts';

/** What the process went through between `begin` and `end`. */
export interface Strain {
  /** Longest time that the event loop was held up, and what 99 in 100 stay below, ms. */
  longestMs: number;
  most99Ms: number;
  /**
   * The most that the loop's own thread computed between two ticks of 5 ms, ms: what it held up by itself, without the waits that
   * other programs on the machine cost it. Null where the system does not tell (it is read from Linux's schedstat).
   */
  ownMs: number | null;
  /** Memory in use, MB: at the beginning, and at most (sampled every 10 ms). */
  restMb: number;
  peakMb: number;
}

/** The whole server as a process of its own on a new schema of DATABASE_SERVER; tells its address, and its strain when asked. */
const name = `combwright_bench_${randomBytes(4).toString('hex')}`;
const databaseServer = (process.env.DATABASE_SERVER ?? '').replace(/\/$/, '');
const onServer = async (statement: string) => {
  const connection = await mysql.createConnection(databaseServer);
  await connection.query(statement);
  await connection.end();
};
await onServer(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);

const dataDir = mkdtempSync(path.join(os.tmpdir(), 'cw-bench-'));
const read = readConfig({ DATABASE_URL: `${databaseServer}/${name}`, DATA_DIR: dataDir, APP_ORIGIN: 'http://127.0.0.1' });
const config = { ...read, limits: { general: 1e6, signIn: 1e6, mail: 1e6, heavy: 1e6 } };
const log = pino({ level: 'error' }, pino.destination(2));
const data = await createDataSource(config.databaseUrl).initialize();
await data.runMigrations();
const fakeMail = new FakeMailServer(dataDir);
const clock = () => new Date();
const outbox = createOutbox(outboxRepository(data), { smtpUrl: await fakeMail.start(), from: config.mailFrom, clock, log });
const pool = createPool();
const { app } = createApp({ config, data, log, outbox, pool, fakeMail, clock, demo: null, bcryptCost: 4 });
const server = app.listen(0, '127.0.0.1', () => process.send?.({ port: (server.address() as AddressInfo).port }));

const delay = monitorEventLoopDelay({ resolution: 5 });
let restMb = 0;
let peakMb = 0;
let sampler: NodeJS.Timeout | undefined;
let ticker: NodeJS.Timeout | undefined;
let ownMs: number | null = null;

/** Time that the main thread (its number is the process's) has computed, ms. */
function computedMs(): number | null {
  try {
    return Number(readFileSync(`/proc/self/task/${process.pid}/schedstat`, 'utf8').split(' ')[0]) / 1e6;
  } catch {
    return null;
  }
}
const mb = () => process.memoryUsage.rss() / 1e6;

process.on('message', (message: 'begin' | 'end' | 'stop') => {
  if (message === 'begin') {
    restMb = peakMb = mb();
    sampler = setInterval(() => (peakMb = Math.max(peakMb, mb())), 10);
    let before = computedMs();
    ownMs = before === null ? null : 0;
    ticker = setInterval(() => {
      const now = computedMs();
      if (now !== null && before !== null) ownMs = Math.max(ownMs ?? 0, now - before);
      before = now;
    }, 5);
    delay.reset();
    delay.enable();
    process.send?.({ began: true });
  } else if (message === 'end') {
    delay.disable();
    clearInterval(sampler);
    clearInterval(ticker);
    const strain: Strain = { longestMs: delay.max / 1e6, most99Ms: delay.percentile(99) / 1e6, ownMs, restMb, peakMb };
    process.send?.({ strain });
  } else void stop();
});

async function stop(): Promise<void> {
  server.closeAllConnections();
  server.close();
  await pool.close();
  await fakeMail.stop();
  await data.destroy();
  await onServer(`DROP DATABASE \`${name}\``);
  rmSync(dataDir, { recursive: true, force: true });
  process.exit(0);
}
