import { spawn, type ChildProcess } from 'node:child_process';
import { rmSync } from 'node:fs';
import { writePidFile } from './pid-file.ts';
import { isPortFree } from './ports.ts';
import { Problem } from './problem.ts';
import { endProcess, eventually, isRunning } from './processes.ts';

export const serverScript = 'server/main.ts';

/** Throws Problem when another program listens on the port. */
export async function requirePort(port: number): Promise<void> {
  if (await isPortFree(port)) return;
  throw new Problem(
    `Port ${port} is in use by another program. End that program, or choose another port: PORT=${port + 1} npm start`,
  );
}

/** The app's own server as a child of this process, its id kept in a file so that a later start can end it. */
export class AppServer {
  private child: ChildProcess | null = null;
  private stopping = false;

  constructor(
    private readonly wishes: { clone: string; pidFile: string; port: number; env: NodeJS.ProcessEnv; onEnd: (how: string) => void },
  ) {}

  /** Starts it and waits until it answers; throws Problem when it ends or stays silent instead. */
  async start(): Promise<void> {
    const { clone, pidFile, port, env, onEnd } = this.wishes;
    this.stopping = false;
    const child = spawn(process.execPath, ['--import', 'tsx', serverScript], { cwd: clone, env, stdio: ['ignore', 'inherit', 'inherit'] });
    this.child = child;
    if (child.pid !== undefined) writePidFile(pidFile, child.pid);
    let ended = false;
    let ready = false;
    child.once('exit', (code, signal) => {
      ended = true;
      if (ready && !this.stopping) onEnd(signal ?? `code ${code}`);
    });
    ready = await eventually(async () => ended || this.stopping || (await isHealthy(port)), 120_000, 100);
    if (this.stopping) return;
    if (ended) throw new Problem('The server ended before it answered; what it said stands above.');
    if (!ready) throw new Problem(`The server does not answer at http://127.0.0.1:${port}/api/health.`);
  }

  /** Stops it by its id and waits until it is gone. */
  async stop(): Promise<void> {
    this.stopping = true;
    const pid = this.child?.pid;
    if (pid === undefined) return;
    if (isRunning(pid)) await endProcess(pid, 20_000);
    rmSync(this.wishes.pidFile, { force: true });
  }
}

async function isHealthy(port: number): Promise<boolean> {
  try {
    return (await fetch(`http://127.0.0.1:${port}/api/health`, { signal: AbortSignal.timeout(2000) })).ok;
  } catch {
    return false;
  }
}
