import { createHash, randomUUID } from 'node:crypto';
import { mkdir, open, readdir, rename, rm, stat, utimes } from 'node:fs/promises';
import path from 'node:path';

const keyForm = /^[0-9a-f]{64}\.[a-z]{3}$/;
const shopForm = /^[0-9a-f-]{36}$/;
/** Raised when the drawing itself changes, so that no older file is served for it. */
const drawingVersion = 2;

/**
 * Templates made before, under `dataDir`/templates, one folder a shop, named by the hash of all they were drawn from: the same revision with the same
 * options is read from there. Past `mostBytes` a shop's least used are let go; any can be made again.
 */
export function createTemplateStore(dataDir: string, mostBytes = 200e6) {
  const root = path.join(dataDir, 'templates');

  return {
    root,

    /** What a template drawn from `input` is called. When it is drawn does not count. */
    keyOf(input: { drawnAt: string }, ending: 'pdf' | 'dxf' | 'svg'): string {
      const { drawnAt: _, ...rest } = input;
      return `${createHash('sha256').update(JSON.stringify([drawingVersion, rest])).digest('hex')}.${ending}`;
    },

    /** The file's path under the root, made by `write` where it is not there yet. It appears whole or not at all. */
    async find(shopId: string, key: string, write: (place: string) => Promise<void>): Promise<{ file: string; made: boolean }> {
      if (!shopForm.test(shopId) || !keyForm.test(key)) throw new RangeError(`"${shopId}/${key}" is not a key of the template store.`);
      const folder = path.join(root, shopId);
      const file = path.join(shopId, key);
      const now = new Date();
      if (await utimes(path.join(root, file), now, now).then(() => true, () => false)) return { file, made: false };
      await mkdir(folder, { recursive: true, mode: 0o700 });
      const part = path.join(folder, `${randomUUID()}.part`);
      try {
        await write(part);
        const written = await open(part, 'r+');
        await written.sync().finally(() => written.close());
        await rename(part, path.join(root, file));
      } catch (error) {
        await rm(part, { force: true });
        throw error;
      }
      await letGo(folder, key, mostBytes);
      return { file, made: true };
    },
  };
}
export type TemplateStore = ReturnType<typeof createTemplateStore>;

async function letGo(folder: string, keep: string, mostBytes: number): Promise<void> {
  const found = await Promise.all((await readdir(folder)).map(async (name) => ({ name, stat: await stat(path.join(folder, name)).catch(() => null) })));
  const files = found.flatMap(({ name, stat: of }) => (of ? [{ name, bytes: of.size, usedMs: of.mtimeMs }] : [])).sort((a, b) => b.usedMs - a.usedMs);
  const old = Date.now() - 3_600_000;
  let bytes = 0;
  for (const file of files) {
    bytes += file.bytes;
    const leftOver = file.name.endsWith('.part');
    if (file.name === keep || (leftOver ? file.usedMs > old : bytes <= mostBytes)) continue;
    await rm(path.join(folder, file.name), { force: true });
  }
}
