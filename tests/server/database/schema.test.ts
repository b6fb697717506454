import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { aTestApp, type TestApp } from '../../support/test-app.ts';

let app: TestApp;
beforeAll(async () => {
  app = await aTestApp();
});
afterAll(() => app.close());

describe('the schema', () => {
  it('after all migrations is just what the entities say', async () => {
    const log = await app.data.driver.createSchemaBuilder().log();
    expect(log.upQueries.map((q) => q.query)).toEqual([]);
  });

  it('speaks utf8mb4 in every table and points every table at its owner by a foreign key', async () => {
    const tables = await app.data.query("SELECT table_name AS name, table_collation AS collation FROM information_schema.tables WHERE table_schema = DATABASE() AND table_name <> 'migrations'");
    expect(tables.length).toBeGreaterThan(10);
    for (const t of tables) expect(`${t.name} ${t.collation}`).toBe(`${t.name} utf8mb4_unicode_ci`);
  });
});
