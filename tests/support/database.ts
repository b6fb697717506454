import { randomBytes } from 'node:crypto';
import mysql from 'mysql2/promise';
import { afterAll } from 'vitest';

const made: string[] = [];

/**
 * The address of a new, empty schema (utf8mb4) for the tests of this file; it is dropped when the file's tests are over.
 * Each worker's schemas carry its number, so that workers never meet.
 */
export async function freshDatabase(): Promise<string> {
  const name = `combwright_test_${process.env.VITEST_POOL_ID ?? '0'}_${randomBytes(4).toString('hex')}`;
  await onServer(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  made.push(name);
  return `${serverUrl()}/${name}`;
}

// Registered first, so it runs last: after the tests' own connections are closed.
afterAll(async () => {
  for (const name of made.splice(0)) await onServer(`DROP DATABASE IF EXISTS \`${name}\``);
});

function serverUrl(): string {
  const url = process.env.TEST_DATABASE_URL;
  if (!url) throw new Error('TEST_DATABASE_URL is unset: run "npm test", or vitest with tests/support/global-setup.ts.');
  return url.replace(/\/$/, '');
}

async function onServer(statement: string): Promise<void> {
  const connection = await mysql.createConnection(serverUrl());
  try {
    await connection.query(statement);
  } finally {
    await connection.end();
  }
}
