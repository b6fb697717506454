import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { startMariadb, type Database } from './mariadb.ts';
import type { Tools } from './system-tools.ts';

/** A fast database server of its own in a temporary folder; stop() ends it and removes the folder. */
export async function startThrowawayDatabase(tools: Tools): Promise<Database> {
  const home = mkdtempSync(path.join(os.tmpdir(), 'combwright-test-'));
  const remove = () => rmSync(home, { recursive: true, force: true });
  try {
    const database = await startMariadb({ home, tools, keeping: 'throwaway', say: () => {} });
    return {
      ...database,
      async stop() {
        await database.stop();
        remove();
      },
    };
  } catch (error) {
    remove();
    throw error;
  }
}
