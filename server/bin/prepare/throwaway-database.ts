import { rmSync } from 'node:fs';
import { startMariadb, type Database } from './mariadb.ts';
import { makeOwnedFolder, sweepAbandonedFolders } from './owned-folder.ts';
import type { Tools } from './system-tools.ts';

/** A fast database server of its own in a temporary folder; stop() ends it and removes the folder. */
export async function startThrowawayDatabase(tools: Tools): Promise<Database> {
  await sweepAbandonedFolders();
  const home = makeOwnedFolder();
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
