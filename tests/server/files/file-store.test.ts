import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createFileStore } from '../../../server/files/file-store.ts';

const shop = '11111111-1111-4111-8111-111111111111';
let dataDir: string;
beforeEach(() => {
  dataDir = mkdtempSync(path.join(os.tmpdir(), 'cw-store-'));
});
afterEach(() => rmSync(dataDir, { recursive: true, force: true }));
const kept = () => (readdirSync(path.join(dataDir, 'files'), { recursive: true }) as string[]).filter((f) => /\.\w+$/.test(f));

describe('the file store', () => {
  it('keeps a file whole or not at all', async () => {
    const store = createFileStore(dataDir);
    await expect(store.make(shop, 'jpg', async (place) => {
      writeFileSync(place, 'half');
      throw new Error('the disk is full');
    })).rejects.toThrow('the disk is full');
    expect(kept()).toEqual([]);
    const { key } = await store.make(shop, 'jpg', async (place) => writeFileSync(place, 'whole'));
    expect(kept()).toEqual([key]);
  });

  it('copies under a key of its own, so that deleting the first leaves the second', async () => {
    const store = createFileStore(dataDir);
    const { key } = await store.make(shop, 'jpg', async (place) => writeFileSync(place, 'picture'));
    const copy = await store.copy(shop, key);
    await store.remove(key, null);
    await store.remove(key);
    expect(readFileSync(store.pathOf(copy), 'utf8')).toBe('picture');
  });

  it('sweeps what a crash left half written', async () => {
    mkdirSync(path.join(dataDir, 'files', shop), { recursive: true });
    const left = path.join(dataDir, 'files', shop, '22222222-2222-4222-8222-222222222222.jpg.part');
    writeFileSync(left, 'half');
    createFileStore(dataDir);
    expect(existsSync(left)).toBe(false);
  });

  it.each(['../../etc/passwd', `${shop}/../x.jpg`, `/etc/hosts`, `${shop}/${shop}.jpg/..`, ''])('takes "%s" for no key of its own', (key) => {
    expect(() => createFileStore(dataDir).pathOf(key)).toThrow(RangeError);
  });
});
