import { randomUUID } from 'node:crypto';
import { mkdirSync, readdirSync, rmSync } from 'node:fs';
import { copyFile, mkdir, open, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import type { Response } from 'express';
import { notFound } from '../http/problems.ts';

export type Ending = 'jpg' | 'png' | 'webp' | 'pdf';

const keyForm = /^[0-9a-f-]{36}\/[0-9a-f-]{36}\.[a-z]{3,4}$/;
const shopForm = /^[0-9a-f-]{36}$/;

/**
 * Files under `dataDir`/files, one folder a shop, by names made here: nothing a person typed ever becomes a path.
 * A file appears whole or not at all: it is written beside, forced to disk, then renamed.
 */
export function createFileStore(dataDir: string) {
  const root = path.join(dataDir, 'files');
  mkdirSync(root, { recursive: true, mode: 0o700 });
  // What a crash or a cut-off task left half written was never in force.
  for (const name of readdirSync(root, { recursive: true }) as string[]) if (name.endsWith('.part')) rmSync(path.join(root, name), { force: true });

  const pathOf = (key: string): string => {
    if (!keyForm.test(key)) throw new RangeError(`"${key}" is not a key of the file store.`);
    return path.join(root, key);
  };

  /** Makes a file by letting `write` fill a place that is not yet the file's own. Returns its key and what `write` gave. */
  async function make<T>(shopId: string, ending: Ending, write: (place: string) => Promise<T>): Promise<{ key: string; made: T }> {
    if (!shopForm.test(shopId)) throw new RangeError(`"${shopId}" is not a shop's identifier.`);
    const key = `${shopId}/${randomUUID()}.${ending}`;
    const place = `${pathOf(key)}.part`;
    await mkdir(path.dirname(place), { recursive: true, mode: 0o700 });
    try {
      const made = await write(place);
      await settle(place);
      await rename(place, pathOf(key));
      return { key, made };
    } catch (error) {
      await rm(place, { force: true });
      throw error;
    }
  }

  return {
    make,

    /** Where a stored file lies, for programs that read it from there. */
    pathOf,

    /** Takes a copy of a file from elsewhere on this machine. */
    async take(shopId: string, ending: Ending, from: string): Promise<string> {
      return (await make(shopId, ending, (place) => copyFile(from, place))).key;
    },

    /** A second file with the same content, under a key of its own. */
    async copy(shopId: string, key: string): Promise<string> {
      const ending = path.extname(key).slice(1) as Ending;
      return (await make(shopId, ending, (place) => copyFile(pathOf(key), place))).key;
    },

    /** Deletes; a file that is gone already is no error. */
    async remove(...keys: (string | null)[]): Promise<void> {
      for (const key of keys) if (key) await rm(pathOf(key), { force: true });
    },

    /** Streams a file as what it is declared to be and nothing else. Its address must change when its content does. */
    async sendTo(res: Response, key: string, type: 'image/jpeg' | 'application/pdf'): Promise<void> {
      const file = pathOf(key);
      if (!(await stat(file).then((s) => s.isFile(), () => false))) throw notFound('file');
      res.set({ 'Cache-Control': 'private, max-age=3600', 'X-Content-Type-Options': 'nosniff', 'Content-Disposition': 'inline' }).type(type);
      await new Promise<void>((resolve, reject) => {
        res.sendFile(key, { root, cacheControl: false }, (error?: Error & { code?: string }) => {
          // A reader who turns away in the middle is no failure.
          if (error && error.code !== 'ECONNABORTED' && error.code !== 'EPIPE' && !res.destroyed) reject(error);
          else resolve();
        });
      });
    },
  };
}
export type FileStore = ReturnType<typeof createFileStore>;

async function settle(place: string): Promise<void> {
  const file = await open(place, 'r+');
  try {
    await file.sync();
  } finally {
    await file.close();
  }
}
