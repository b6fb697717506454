import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** Everything that the built page depends on, relative to the clone. */
const sources = ['src', 'shared', 'public', 'index.html', 'vite.config.ts', 'tailwind.config.ts', 'tsconfig.json', 'package-lock.json'];
const stampName = '.sources';

/** Whether dist/ was built from what the sources are now. */
export function isBuilt(clone: string): boolean {
  const stamp = path.join(clone, 'dist', stampName);
  return existsSync(stamp) && readFileSync(stamp, 'utf8') === hashOfSources(clone);
}

/**
 * Builds the page into dist/ and returns whether that succeeded. The build goes aside first and takes dist/'s place when
 * it is whole, so that a server that reads dist/ never sees half of it.
 */
export function build(clone: string): boolean {
  const hash = hashOfSources(clone);
  const cache = path.join(clone, 'node_modules', '.cache');
  const fresh = path.join(cache, `combwright-dist-${process.pid}`);
  const old = `${fresh}-old`;
  const vite = path.join(clone, 'node_modules', 'vite', 'bin', 'vite.js');
  const done = spawnSync(process.execPath, [vite, 'build', '--outDir', fresh, '--emptyOutDir', '--logLevel', 'warn'], {
    cwd: clone,
    stdio: 'inherit',
    env: { ...process.env, NODE_ENV: 'production' },
  });
  try {
    if (done.status !== 0) return false;
    writeFileSync(path.join(fresh, stampName), hash);
    const dist = path.join(clone, 'dist');
    if (existsSync(dist)) renameSync(dist, old);
    renameSync(fresh, dist);
    return true;
  } finally {
    rmSync(fresh, { recursive: true, force: true });
    rmSync(old, { recursive: true, force: true });
  }
}

function hashOfSources(clone: string): string {
  const hash = createHash('sha256');
  for (const source of sources) addTo(hash, clone, source);
  return hash.digest('hex');
}

function addTo(hash: ReturnType<typeof createHash>, clone: string, relative: string): void {
  const full = path.join(clone, relative);
  if (!existsSync(full)) return;
  if (statSync(full).isDirectory()) {
    for (const name of readdirSync(full).sort()) addTo(hash, clone, path.join(relative, name));
    return;
  }
  hash.update(`${relative}\0`).update(readFileSync(full)).update('\0');
}
