import { linkSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { commandLine, endProcess, isRunning, startTicks } from './processes.ts';

/** Notes that process `pid` holds this place: its id and when it began, so that a reused id is never mistaken for it. */
export function writePidFile(file: string, pid: number): void {
  writeFileSync(file, pidLine(pid));
}

/** The process a pid file names, if it still runs and was started with `script` among its arguments; else null. */
export function holderOf(file: string, script: string): number | null {
  const text = read(file);
  const [pid, ticks] = (text ?? '').trim().split(' ');
  if (!pid || !ticks) return null;
  const id = Number(pid);
  const same = isRunning(id) && startTicks(id) === ticks && commandLine(id).some((arg) => arg.endsWith(script));
  return same ? id : null;
}

/** Ends by id the process that a pid file names, if it is still ours, and removes the file. Returns its id or null. */
export async function endHolder(file: string, script: string, graceMs: number): Promise<number | null> {
  const before = read(file);
  const pid = holderOf(file, script);
  if (pid !== null) await endProcess(pid, graceMs);
  if (before !== null && read(file) === before) rmSync(file, { force: true });
  return pid;
}

/**
 * Makes this process the only holder of `file`; an earlier holder is ended first and named to `onTakeOver`.
 * Linking a finished file is atomic, so of two that try at once one wins and the other sees it.
 */
export async function claim(file: string, script: string, graceMs: number, onTakeOver: (pid: number) => void): Promise<void> {
  const own = `${file}.${process.pid}`;
  writeFileSync(own, pidLine(process.pid));
  try {
    for (;;) {
      try {
        linkSync(own, file);
        return;
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
      }
      const holder = holderOf(file, script);
      if (holder !== null) onTakeOver(holder);
      await endHolder(file, script, graceMs);
    }
  } finally {
    rmSync(own, { force: true });
  }
}

/** Gives a claim up, if it is still this process's. */
export function release(file: string): void {
  if (read(file) === pidLine(process.pid)) rmSync(file, { force: true });
}

function pidLine(pid: number): string {
  return `${pid} ${startTicks(pid) ?? '0'}\n`;
}

function read(file: string): string | null {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return null;
  }
}
