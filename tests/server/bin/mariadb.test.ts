import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import mysql from 'mysql2/promise';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { startMariadb, serverOn, type Database } from '../../../server/bin/prepare/mariadb.ts';
import { eventually, isRunning } from '../../../server/bin/prepare/processes.ts';
import { findTools } from '../../../server/bin/prepare/system-tools.ts';
import { databaseTools } from '../../../server/bin/prepare/tool-list.ts';

const tools = findTools([databaseTools]);
let home = '';
const started: Database[] = [];

beforeEach(() => {
  home = mkdtempSync(path.join(os.tmpdir(), 'combwright-test-'));
});

afterEach(async () => {
  for (const database of started.splice(0)) await database.stop();
  rmSync(home, { recursive: true, force: true });
});

async function start(folder = home): Promise<Database> {
  const database = await startMariadb({ home: folder, tools, keeping: 'durable', say: () => {} });
  started.push(database);
  return database;
}

async function ask(url: string, statement: string): Promise<unknown> {
  const connection = await mysql.createConnection(url);
  const [rows] = await connection.query(statement).finally(() => connection.end());
  return rows;
}

async function killOutright({ pid }: Database): Promise<void> {
  process.kill(pid, 'SIGKILL');
  expect(await eventually(() => !isRunning(pid), 10_000)).toBe(true);
}

describe('the database that npm start keeps', () => {
  it('still holds a committed row after kill -9, at the same address', async () => {
    const first = await start();
    await ask(first.url, 'CREATE TABLE walls (name VARCHAR(40) PRIMARY KEY) ENGINE=InnoDB');
    await ask(first.url, "INSERT INTO walls VALUES ('Stair wall – größer')");
    await killOutright(first);
    const second = await start();
    expect(second.reused).toBe(false);
    expect(second.url).toBe(first.url);
    expect(await ask(second.url, 'SELECT name FROM walls')).toEqual([{ name: 'Stair wall – größer' }]);
  });

  it('is used again, not started twice, while it runs', async () => {
    const first = await start();
    const second = await start();
    expect(second).toMatchObject({ reused: true, pid: first.pid, url: first.url });
    expect(serverOn(path.join(home, 'mariadb'))).toBe(first.pid);
  });

  it('listens where the data folder has a long path', async () => {
    const deep = path.join(home, 'a'.repeat(120));
    mkdirSync(deep);
    expect(await ask((await start(deep)).url, 'SELECT 1 AS one')).toEqual([{ one: 1 }]);
  });

  it('refuses a folder that is not a database and leaves it alone', async () => {
    mkdirSync(path.join(home, 'mariadb'));
    writeFileSync(path.join(home, 'mariadb', 'letter.txt'), 'not a database');
    await expect(start()).rejects.toThrow(/not a whole MariaDB data folder/);
  });

  it('refuses files that another release series made', async () => {
    await (await start()).stop();
    writeFileSync(path.join(home, 'mariadb.json'), JSON.stringify({ series: '9.9', port: null }));
    await expect(start()).rejects.toThrow(/made by MariaDB 9\.9/);
  });
});
