/** `npm start`: prepares what is missing, starts the database and the app, and stops both, in that order's reverse. */
import { spawn } from 'node:child_process';
import { mkdirSync, watch } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { AppServer, requirePort, serverScript } from './prepare/app-server.ts';
import { build, isBuilt } from './prepare/build.ts';
import { startMariadb, type Database } from './prepare/mariadb.ts';
import { claim, endHolder, release } from './prepare/pid-file.ts';
import { Problem } from './prepare/problem.ts';
import { endProcess, isRunning } from './prepare/processes.ts';
import { prepareTools } from './prepare/system-tools.ts';
import { databaseTools } from './prepare/tool-list.ts';

const clone = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const dataDir = path.resolve(clone, process.env.DATA_DIR || '.data');
const startFile = path.join(dataDir, 'start.pid');
const serverFile = path.join(dataDir, 'server.pid');
const watching = process.argv.includes('--watch');
const say = (line: string) => console.log(line);

/** Settles once someone asks to stop (resolves) or something breaks (rejects). */
const end = deferred();
let asked = false;
function askToStop(): void {
  asked = true;
  end.resolve();
}

async function main(): Promise<void> {
  const port = wishedPort();
  makeDataFolder();
  await claim(startFile, 'server/bin/start.ts', 90_000, (pid) => say(`Combwright already runs on ${dataDir} (process ${pid}): stopping it and taking its place …`));
  try {
    const left = await endHolder(serverFile, serverScript, 20_000);
    if (left !== null) say(`Stopped a server that an interrupted run had left (process ${left}).`);
    await requirePort(port);
    await runUntilEnd(port);
  } finally {
    release(startFile);
  }
}

async function runUntilEnd(port: number): Promise<void> {
  const database = process.env.DATABASE_URL ? null : await ownDatabase();
  try {
    if (asked) return;
    if (!isBuilt(clone)) {
      say('Building the page …');
      if (!build(clone)) throw new Problem('The page could not be built; the reason stands above.');
    }
    if (!asked) await serve(port, database);
  } finally {
    await database?.stop();
  }
}

async function serve(port: number, database: Database | null): Promise<void> {
  const server = new AppServer({
    clone,
    pidFile: serverFile,
    port,
    env: {
      ...process.env,
      PORT: String(port),
      DATA_DIR: dataDir,
      DATABASE_URL: database?.url ?? process.env.DATABASE_URL,
    },
    onEnd: (how) => end.reject(new Problem(`The server ended unexpectedly (${how}). Run npm start again: nothing that was saved is lost.`)),
  });
  void end.promise.catch(() => {}).then(() => server.stop());
  const stopOthers = watching ? developing(server, port) : () => Promise.resolve();
  try {
    await server.start();
    if (!asked) say(`Combwright is ready: http://127.0.0.1:${port}  (data in ${dataDir}; Ctrl-C stops it)`);
    await end.promise;
    say('Stopping …');
  } finally {
    await stopOthers();
    await server.stop();
  }
}

/** The database of our own, kept running: one that was killed is started again on the same port. */
async function ownDatabase(): Promise<Database> {
  const wishes = { home: dataDir, tools: await prepareTools([databaseTools]), keeping: 'durable' as const };
  let current = await startMariadb(wishes);
  const port = current.port;
  if (current.reused) say(`Using the database server that already runs on this data (process ${current.pid}).`);
  let healing: Promise<void> | null = null;
  const timer = setInterval(() => {
    if (healing || isRunning(current.pid)) return;
    healing = heal().catch(end.reject).finally(() => (healing = null));
  }, 500);
  async function heal(): Promise<void> {
    say('The database server ended unexpectedly: starting it again …');
    current = await startMariadb(wishes);
    if (current.port !== port) throw new Problem(`The database's port ${port} was taken meanwhile. Run npm start again.`);
    say('The database is back.');
  }
  return {
    ...current,
    async stop() {
      clearInterval(timer);
      await healing;
      await current.stop();
    },
  };
}

/** While developing: the page from Vite's own server, and the app's server restarted when its sources change. */
function developing(server: AppServer, port: number): () => Promise<void> {
  const vite = spawn(process.execPath, ['node_modules/vite/bin/vite.js', '--host', '127.0.0.1'], {
    cwd: clone,
    env: { ...process.env, API_ORIGIN: `http://127.0.0.1:${port}` },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  let timer: NodeJS.Timeout | undefined;
  let work = Promise.resolve();
  const restart = () => {
    work = work.then(async () => {
      if (asked) return;
      await server.stop();
      await server.start();
    }).catch((error: Error) => say(`${error.message} It is tried again at the next change.`));
  };
  const watchers = ['server', 'shared'].map((folder) =>
    watch(path.join(clone, folder), { recursive: true }, () => {
      clearTimeout(timer);
      timer = setTimeout(restart, 200);
    }),
  );
  return async () => {
    clearTimeout(timer);
    for (const watcher of watchers) watcher.close();
    await work;
    if (vite.pid !== undefined) await endProcess(vite.pid, 5000);
  };
}

function wishedPort(): number {
  const text = process.env.PORT || '4310';
  const port = Number(text);
  if (Number.isInteger(port) && port >= 1 && port <= 65_535) return port;
  throw new Problem(`PORT must be a whole number from 1 to 65535, not "${text}".`);
}

function makeDataFolder(): void {
  try {
    mkdirSync(dataDir, { recursive: true, mode: 0o700 });
  } catch (error) {
    throw new Problem(`The data folder ${dataDir} cannot be made (${(error as Error).message}). Choose another with DATA_DIR.`);
  }
}

function deferred() {
  let resolve!: () => void;
  let reject!: (reason: unknown) => void;
  const promise = new Promise<void>((yes, no) => {
    resolve = yes;
    reject = no;
  });
  return { promise, resolve, reject };
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, askToStop);
// The program that started this one is gone, perhaps killed: do not run on unseen.
process.on('disconnect', askToStop);
// A terminal that was closed must not keep the database from being stopped.
process.stdout.on('error', () => {});
process.stderr.on('error', () => {});
end.promise.catch(() => {});

main().then(
  () => process.exit(0),
  (error: unknown) => {
    // Asked to stop while still starting: what was cut short then is no failure.
    if (asked && error instanceof Problem) process.exit(0);
    console.error(error instanceof Problem ? error.message : error);
    process.exit(1);
  },
);
