import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { databasePaths } from './database-folder.ts';
import { serverOn } from './mariadb.ts';
import { holderOf, writePidFile } from './pid-file.ts';
import { endProcess } from './processes.ts';

const prefix = 'combwright-throwaway-';
const ownerFile = 'owner.pid';

/** A new temporary folder that this process owns: if the process is killed outright, a later run removes the folder. */
export function makeOwnedFolder(): string {
  const folder = mkdtempSync(path.join(os.tmpdir(), prefix));
  writePidFile(path.join(folder, ownerFile), process.pid);
  return folder;
}

/** Removes owned folders whose owner is gone, and ends by id the database servers that still run in them. */
export async function sweepAbandonedFolders(): Promise<void> {
  for (const name of readdirSync(os.tmpdir()).filter((entry) => entry.startsWith(prefix))) {
    const folder = path.join(os.tmpdir(), name);
    try {
      // Without the owner's file the folder was made this very moment.
      if (!readdirSync(folder).includes(ownerFile) || holderOf(path.join(folder, ownerFile), '') !== null) continue;
      const pid = serverOn(databasePaths(folder).files);
      if (pid !== null) await endProcess(pid, 20_000);
      rmSync(folder, { recursive: true, force: true });
    } catch {
      // Another user's folder: not ours to remove.
    }
  }
}
