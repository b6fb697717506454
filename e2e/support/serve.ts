import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import mysql from 'mysql2/promise';

// The app as a person meets it: its own process, a new database with the demo in it, a new data folder.
const server = process.env.TEST_DATABASE_URL?.replace(/\/$/, '');
const port = process.env.E2E_PORT;
if (!server || !port) throw new Error('TEST_DATABASE_URL and E2E_PORT must be set: run "npm test".');

const name = `combwright_e2e_${randomBytes(4).toString('hex')}`;
const dataDir = mkdtempSync(path.join(os.tmpdir(), 'cw-e2e-'));
const admin = async (statement: string) => {
  const connection = await mysql.createConnection(server);
  await connection.query(statement);
  await connection.end();
};

await admin(`CREATE DATABASE ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
const app = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
  stdio: 'inherit',
  env: { ...process.env, NODE_ENV: 'development', DATABASE_URL: `${server}/${name}`, DATA_DIR: dataDir, PORT: port, APP_ORIGIN: `http://127.0.0.1:${port}`, LOG_LEVEL: 'error' },
});

const stop = () => app.kill('SIGTERM');
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
app.on('exit', (code) => {
  void admin(`DROP DATABASE IF EXISTS ${name}`).finally(() => {
    rmSync(dataDir, { recursive: true, force: true });
    process.exit(code ?? 0);
  });
});
