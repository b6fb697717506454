import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { Problem } from './problem.ts';
import type { Tools } from './system-tools.ts';

/** What is remembered beside the database's files from one start to the next. */
export interface DatabaseNotes {
  /** Release series that made the files, such as "10.11". */
  series: string;
  /** Port of 127.0.0.1 it listened on last, or null before the first start. */
  port: number | null;
}

/** The places inside `home` that belong to the database. */
export function databasePaths(home: string) {
  return {
    files: path.join(home, 'mariadb'),
    notes: path.join(home, 'mariadb.json'),
    password: path.join(home, 'mariadb-password'),
    log: path.join(home, 'mariadb.log'),
    pid: path.join(home, 'mariadb.pid'),
    init: path.join(home, 'mariadb-init.sql'),
    socket: path.join(home, 'mariadb.sock'),
  };
}

/** Makes the database's files when there are none; refuses files that are not whole or come from another series. */
export function prepareDatabaseFolder(home: string, tools: Tools, say: (line: string) => void): DatabaseNotes {
  const at = databasePaths(home);
  mkdirSync(home, { recursive: true, mode: 0o700 });
  const series = serverSeries(tools);
  sweepUnfinished(home);
  if (!existsSync(at.files) || readdirSync(at.files).length === 0) {
    say('Creating the database …');
    install(at.files, tools);
    writeNotes(home, { series, port: null });
  }
  refuseUnfit(at.files, readNotes(home), series);
  return { series, port: readNotes(home)?.port ?? null };
}

export function writeNotes(home: string, notes: DatabaseNotes): void {
  const { notes: file } = databasePaths(home);
  writeFileSync(`${file}.new`, `${JSON.stringify(notes)}\n`);
  renameSync(`${file}.new`, file);
}

/** A socket path short enough for the kernel (107 bytes): in `home`, or in a temporary folder of its own. */
export function socketPath(home: string): string {
  const { socket } = databasePaths(home);
  return Buffer.byteLength(socket) <= 100 ? socket : path.join(mkdtempSync(path.join(os.tmpdir(), 'combwright-')), 'db.sock');
}

function readNotes(home: string): DatabaseNotes | null {
  try {
    return JSON.parse(readFileSync(databasePaths(home).notes, 'utf8')) as DatabaseNotes;
  } catch {
    return null;
  }
}

/** Installed aside and renamed, so that an interrupted installation never looks like a database. */
function install(files: string, tools: Tools): void {
  const fresh = `${files}.new-${process.pid}`;
  const done = spawnSync(
    tools.path('mariadb-install-db'),
    [
      '--no-defaults', `--datadir=${fresh}`, '--auth-root-authentication-method=socket', '--skip-test-db', '--skip-name-resolve',
      ...(process.getuid?.() === 0 ? ['--user=root'] : []),
    ],
    { encoding: 'utf8', env: { ...process.env, PATH: tools.searchPath } },
  );
  if (done.status !== 0) {
    rmSync(fresh, { recursive: true, force: true });
    const words = `${done.stdout ?? ''}${done.stderr ?? ''}${done.error?.message ?? ''}`.trim().split('\n').slice(-6).join('\n');
    throw new Problem(`The database could not be created in ${files}:\n${words}`);
  }
  rmSync(files, { recursive: true, force: true });
  renameSync(fresh, files);
}

function sweepUnfinished(home: string): void {
  for (const name of readdirSync(home)) {
    if (name.startsWith('mariadb.new-')) rmSync(path.join(home, name), { recursive: true, force: true });
  }
}

function refuseUnfit(files: string, notes: DatabaseNotes | null, series: string): void {
  const lacking = ['ibdata1', 'mysql', 'aria_log_control'].filter((name) => !existsSync(path.join(files, name)));
  if (lacking.length > 0) {
    throw new Problem(
      `${files} is not a whole MariaDB data folder (it lacks ${lacking.join(', ')}), so it was left untouched.\n` +
        'Restore it from a backup, or move it away to begin with an empty database.',
    );
  }
  if (notes && notes.series !== series) {
    throw new Problem(
      `${files} was made by MariaDB ${notes.series}, but this machine has ${series}; it was left untouched.\n` +
        `Install MariaDB ${notes.series}, or restore a backup into an empty data folder (DATA_DIR).`,
    );
  }
}

function serverSeries(tools: Tools): string {
  const { stdout } = spawnSync(tools.path('mariadbd'), ['--no-defaults', '--version'], { encoding: 'utf8' });
  const series = /Ver (\d+\.\d+)\./.exec(stdout ?? '')?.[1];
  if (!series) throw new Problem(`${tools.path('mariadbd')} does not tell its version: ${stdout}`);
  return series;
}
