import { spawnSync } from 'node:child_process';
import { accessSync, chmodSync, constants, existsSync, mkdirSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { exists } from './apt-install.ts';
import type { ToolGroup } from './tool-list.ts';

const clone = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../..');

/** Where a group's private copy has its programs, whether or not it has been made. */
export function privateBin(group: ToolGroup): string {
  return path.join(privateFolder(), group.name, 'bin');
}

/**
 * Without root: lets apt (with lists and cache of our own) download a group's packages and whatever they need that this
 * system lacks, unpacks them into a private folder, and puts beside them one small launcher per program.
 * Returns null, or why it did not work.
 */
export async function unpackPrivately(group: ToolGroup, say: (line: string) => void): Promise<string | null> {
  if (!exists('apt-get') || !exists('dpkg-deb')) return `${group.purpose}: this system has no apt to download packages with`;
  const home = privateFolder();
  const final = path.join(home, group.name);
  const fresh = path.join(home, `${group.name}.new-${process.pid}`);
  try {
    mkdirSync(path.join(fresh, 'root'), { recursive: true });
    say(`Unpacking ${group.packages.join(', ')} into ${final} (no root needed) …`);
    const archives = download(group.packages, path.join(home, 'apt'), path.join(fresh, 'archives'));
    for (const archive of archives) run('dpkg-deb', ['-x', archive, path.join(fresh, 'root')]);
    rmSync(path.join(fresh, 'archives'), { recursive: true });
    writeLaunchers(group, fresh, final);
    rmSync(final, { recursive: true, force: true });
    renameSync(fresh, final);
    return null;
  } catch (error) {
    return `${group.purpose}: ${(error as Error).message}`;
  } finally {
    rmSync(fresh, { recursive: true, force: true });
  }
}

function privateFolder(): string {
  const cache = process.env.XDG_CACHE_HOME || path.join(os.homedir(), '.cache');
  return isWritable(cache) ? path.join(cache, 'combwright', 'tools') : path.join(clone, 'node_modules', '.cache', 'combwright', 'tools');
}

function isWritable(folder: string): boolean {
  try {
    mkdirSync(folder, { recursive: true });
    accessSync(folder, constants.W_OK);
    return true;
  } catch {
    return false;
  }
}

/** Downloads packages with the dependencies that dpkg does not know as installed; returns the archives' paths. */
function download(packages: string[], apt: string, archives: string): string[] {
  mkdirSync(path.join(apt, 'state/lists/partial'), { recursive: true });
  mkdirSync(path.join(apt, 'cache'), { recursive: true });
  mkdirSync(path.join(archives, 'partial'), { recursive: true });
  const own = [
    '-q', '-o', `Dir::State=${apt}/state`, '-o', 'Dir::State::status=/var/lib/dpkg/status',
    '-o', `Dir::Cache=${apt}/cache`, '-o', `Dir::Cache::archives=${archives}`, '-o', 'Debug::NoLocking=1',
  ];
  run('apt-get', [...own, 'update']);
  run('apt-get', [...own, 'install', '-y', '--no-install-recommends', '--download-only', ...packages]);
  // A second C library beside the one that runs would crash every program.
  return readdirSync(archives).filter((name) => name.endsWith('.deb') && !/^libc(6|-bin)_/.test(name)).map((name) => path.join(archives, name));
}

/** One launcher per program of the unpacked packages, that says where their libraries, fonts and data are. */
function writeLaunchers(group: ToolGroup, fresh: string, final: string): void {
  const root = path.join(final, 'root');
  const libraries = libraryFolders(path.join(fresh, 'root')).map((folder) => path.join(root, folder));
  writeFileSync(path.join(fresh, 'fonts.conf'), fontsConf(root, path.join(final, 'font-cache')));
  mkdirSync(path.join(fresh, 'bin'));
  for (const folder of ['usr/sbin', 'usr/bin']) {
    const inside = path.join(fresh, 'root', folder);
    for (const name of existsSync(inside) ? readdirSync(inside) : []) {
      // Debian's chromium is a script that knows only /usr/lib/chromium.
      const program = name === 'chromium' ? 'usr/lib/chromium/chromium' : path.join(folder, name);
      const extra = /^mariadb(d|-install-db)$/.test(name) ? ` --basedir='${root}/usr'` : '';
      const launcher = path.join(fresh, 'bin', name);
      writeFileSync(launcher, [
        '#!/bin/sh',
        `export LD_LIBRARY_PATH='${libraries.join(':')}'`,
        ...(group.name === 'browser' ? [`export FONTCONFIG_FILE='${final}/fonts.conf'`] : []),
        `exec '${root}/${program}' "$@"${extra}`,
        '',
      ].join('\n'));
      chmodSync(launcher, 0o755);
    }
  }
}

/** Folders under `root`, relative to it, that hold shared libraries: lib/<machine>/ and the folders right inside it. */
function libraryFolders(root: string): string[] {
  const found: string[] = [];
  for (const lib of ['usr/lib', 'lib']) {
    for (const machine of foldersIn(path.join(root, lib)).filter((name) => name.includes('-linux-gnu'))) {
      const base = path.join(lib, machine);
      found.push(base, ...foldersIn(path.join(root, base)).map((name) => path.join(base, name)));
    }
  }
  return found.filter((folder) => readdirSync(path.join(root, folder)).some((name) => /^lib.*\.so/.test(name)));
}

function foldersIn(folder: string): string[] {
  return existsSync(folder) ? readdirSync(folder, { withFileTypes: true }).filter((d) => d.isDirectory()).map((d) => d.name) : [];
}

function fontsConf(root: string, cache: string): string {
  return `<?xml version="1.0"?>
<!DOCTYPE fontconfig SYSTEM "urn:fontconfig:fonts.dtd">
<fontconfig>
  <dir>/usr/share/fonts</dir>
  <dir>${root}/usr/share/fonts</dir>
  <cachedir>${cache}</cachedir>
  <alias><family>sans-serif</family><prefer><family>DejaVu Sans</family></prefer></alias>
  <alias><family>monospace</family><prefer><family>DejaVu Sans Mono</family></prefer></alias>
</fontconfig>
`;
}

function run(command: string, args: string[]): void {
  const done = spawnSync(command, args, { encoding: 'utf8', env: { ...process.env, LC_ALL: 'C' } });
  if (done.status === 0) return;
  const words = (done.stderr || done.error?.message || '').trim().split('\n').slice(-3).join('; ');
  throw new Error(`${command} ${args.find((arg) => /^[a-z]+$/.test(arg)) ?? ''} failed: ${words}`);
}
