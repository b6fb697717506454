import { readFileSync, readdirSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/** The arguments a process was started with, or [] when it is gone (or a zombie). Reads Linux's /proc. */
export function commandLine(pid: number): string[] {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').filter(Boolean);
  } catch {
    return [];
  }
}

/** When a process began, in clock ticks since boot, or null when it is gone. Together with the pid it names one process for good. */
export function startTicks(pid: number): string | null {
  const stat = readStat(pid);
  return stat ? (stat.fields[19] ?? null) : null;
}

/** Whether a process still runs. A zombie, killed but not yet waited for by its parent, does not. */
export function isRunning(pid: number): boolean {
  const stat = readStat(pid);
  return stat !== null && stat.fields[0] !== 'Z' && stat.fields[0] !== 'X';
}

/** Every running process whose arguments satisfy `matches`. */
export function processesWhere(matches: (args: string[]) => boolean): number[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .map(Number)
    .filter((pid) => matches(commandLine(pid)));
}

/** Waits until `condition` holds; false when `withinMs` ran out first. */
export async function eventually(condition: () => boolean | Promise<boolean>, withinMs: number, everyMs = 50): Promise<boolean> {
  const end = Date.now() + withinMs;
  for (;;) {
    if (await condition()) return true;
    if (Date.now() >= end) return false;
    await pause(everyMs);
  }
}

/** Asks a process to stop (SIGTERM) and waits; after `graceMs` it is stopped outright (SIGKILL). */
export async function endProcess(pid: number, graceMs: number): Promise<void> {
  const gone = () => !isRunning(pid);
  send(pid, 'SIGTERM');
  if (await eventually(gone, graceMs)) return;
  send(pid, 'SIGKILL');
  await eventually(gone, 10_000);
}

function send(pid: number, signal: NodeJS.Signals): void {
  try {
    process.kill(pid, signal);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
  }
}

/** State is field 0, start time field 19 (fields 3 and 22 of proc(5), counted after the name, which may hold spaces). */
function readStat(pid: number): { fields: string[] } | null {
  try {
    const text = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return { fields: text.slice(text.lastIndexOf(')') + 2).trim().split(' ') };
  } catch {
    return null;
  }
}
