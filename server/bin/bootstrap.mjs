/**
 * The first thing that runs in a fresh clone, before any package exists: plain JavaScript, Node's own modules only.
 * It checks Node, installs the packages when the lock file asks for it, then hands over to server/bin/<verb>.ts,
 * passes signals on and exits as that program did.
 */
import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const stampFile = path.join(root, 'node_modules', '.combwright-lock');

function fail(message) {
  console.error(message);
  process.exit(1);
}

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    fail(`Combwright needs Node 20.19 or later; this is ${process.versions.node}. Install a newer Node and try again.`);
  }
}

function lockHash() {
  return createHash('sha256').update(readFileSync(path.join(root, 'package-lock.json'))).digest('hex');
}

function readOr(file, otherwise) {
  return existsSync(file) ? readFileSync(file, 'utf8') : otherwise;
}

/** Whether what npm says it installed (its hidden lock file) is what package-lock.json asks for. */
function installedMatchesLock() {
  const hidden = path.join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(hidden)) return false;
  const wanted = JSON.parse(readFileSync(path.join(root, 'package-lock.json'), 'utf8')).packages ?? {};
  const present = JSON.parse(readFileSync(hidden, 'utf8')).packages ?? {};
  const same = ([place, entry]) => {
    const found = present[place];
    // Packages for other systems are optional and rightly absent.
    return found ? found.version === entry.version : Boolean(entry.optional || entry.devOptional);
  };
  return (
    Object.entries(wanted).filter(([place]) => place !== '').every(same) &&
    Object.keys(present).every((place) => place in wanted)
  );
}

function installPackages() {
  const hash = lockHash();
  if (readOr(stampFile, '').trim() === hash) return;
  if (!installedMatchesLock()) {
    console.log('Installing packages (npm ci) …');
    // Production mode would leave out what builds and tests the app.
    const args = ['ci', '--include=dev', '--no-audit', '--no-fund'];
    const npm = process.env.npm_execpath;
    const done = npm && /\.c?js$/.test(npm)
      ? spawnSync(process.execPath, [npm, ...args], { cwd: root, stdio: 'inherit' })
      : spawnSync('npm', args, { cwd: root, stdio: 'inherit' });
    if (done.status !== 0) fail(`The packages could not be installed${done.error ? `: ${done.error.message}` : ''}. Run "npm ci" in ${root} to see why.`);
  }
  writeFileSync(stampFile, `${hash}\n`);
}

function programFor(verb) {
  const bin = path.join(root, 'server', 'bin');
  const verbs = readdirSync(bin).filter((name) => name.endsWith('.ts')).map((name) => name.slice(0, -3));
  if (!verbs.includes(verb)) fail(`Say what to do: ${verbs.join(', ')} (not "${verb ?? ''}").`);
  return path.join('server', 'bin', `${verb}.ts`);
}

function handOver(program, args) {
  // The channel tells the program when this process is gone, even after kill -9.
  const child = spawn(process.execPath, ['--import', 'tsx', program, ...args], {
    cwd: root,
    stdio: ['inherit', 'inherit', 'inherit', 'ipc'],
  });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => child.kill(signal));
  watchNpm(child);
  child.on('error', (error) => fail(`${program} could not be started: ${error.message}`));
  child.on('exit', (code, signal) => process.exit(signal ? 128 + (os.constants.signals[signal] ?? 0) : (code ?? 1)));
}

/** npm killed outright passes nothing on, and its shell does not pass signals on: without this the work would run on unseen. */
function watchNpm(child) {
  if (!process.env.npm_lifecycle_event) return;
  const started = launchers();
  const timer = setInterval(() => {
    if (launchers() === started) return;
    clearInterval(timer);
    child.kill('SIGTERM');
  }, 300);
  timer.unref();
}

/** The process that started this one and, where that is only npm's shell, npm itself. */
function launchers() {
  try {
    const stat = readFileSync(`/proc/${process.ppid}/stat`, 'utf8');
    const [name, rest] = [stat.slice(stat.indexOf('(') + 1, stat.lastIndexOf(')')), stat.slice(stat.lastIndexOf(')') + 2)];
    return /^(ba|da)?sh$/.test(name) ? `${process.ppid} of ${rest.split(' ')[1]}` : `${process.ppid}`;
  } catch {
    return `${process.ppid}`;
  }
}

checkNode();
const program = programFor(process.argv[2]);
installPackages();
handOver(program, process.argv.slice(3));
