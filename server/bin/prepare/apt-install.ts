import { spawnSync } from 'node:child_process';
import type { ToolGroup } from './tool-list.ts';

/** Installs the groups' packages with apt, when this user is root or sudo asks no password. Does nothing otherwise. */
export function installOnSystem(groups: ToolGroup[], say: (line: string) => void): void {
  const lead = rootLead();
  if (!lead || !exists('apt-get')) return;
  const packages = groups.flatMap((group) => group.packages);
  say(`Installing ${packages.join(', ')} with apt-get …`);
  const install = ['apt-get', 'install', '-y', '-q', '--no-install-recommends', ...packages];
  if (run([...lead, ...install], false)) return;
  // The lists may be missing or name packages that the mirror no longer has.
  run([...lead, 'apt-get', 'update', '-q'], true);
  run([...lead, ...install], true);
}

/** What to put before a command to run it as root: nothing for root, sudo where it asks no password, else null. */
function rootLead(): string[] | null {
  const quiet = ['env', 'DEBIAN_FRONTEND=noninteractive'];
  if (process.getuid?.() === 0) return quiet;
  return exists('sudo') && run(['sudo', '-n', 'true'], false) ? ['sudo', '-n', ...quiet] : null;
}

/** Whether a program of this name is on PATH. */
export function exists(program: string): boolean {
  return spawnSync('sh', ['-c', `command -v ${program}`], { stdio: 'ignore' }).status === 0;
}

/** Runs a command; its complaints are shown only when `loud`. True when it succeeded. */
function run([command, ...args]: string[], loud: boolean): boolean {
  const done = spawnSync(command ?? '', args, { stdio: ['ignore', 'ignore', loud ? 'inherit' : 'ignore'] });
  return done.status === 0;
}
