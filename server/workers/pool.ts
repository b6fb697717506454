import { createRequire } from 'node:module';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { Piscina } from 'piscina';
import { ProblemError } from '../http/problems.ts';

/** Work that would hold up other requests, by name: `tasks/<name>.ts` exports it as default. */
export interface WorkerPool {
  /**
   * Runs a task in a thread of its own. Input and result are copied between threads, so both must be plain data.
   * When `signal` fires the task is dropped or its thread ended, and the promise rejects with ProblemError `gone`.
   * Throws ProblemError `unavailable` where too much work is waiting already; what the task throws passes through.
   */
  run<Input, Result>(task: string, input: Input, options?: { signal?: AbortSignal }): Promise<Result>;
  close(): Promise<void>;
}

const tasks = path.join(import.meta.dirname, 'tasks');

/** The pool; threads start when there is work and end after a while without. */
export function createPool({ maxThreads = 2, maxQueue = 32 } = {}): WorkerPool {
  const loader = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
  const pool = new Piscina({
    // Said in full, since a thread would inherit the flags of whatever started this process.
    execArgv: ['--import', loader],
    filename: path.join(tasks, 'straighten.ts'),
    minThreads: 0,
    maxThreads,
    maxQueue,
    idleTimeout: 30_000,
    recordTiming: false,
  });
  return {
    async run(task, input, { signal } = {}) {
      if (!/^[a-z][a-z-]*$/.test(task)) throw new RangeError(`"${task}" is not a task's name.`);
      if (pool.queueSize >= maxQueue) throw new ProblemError('unavailable', 'Much work is waiting just now. Please try again in a minute.');
      try {
        return await pool.run(input, { filename: path.join(tasks, `${task}.ts`), ...(signal ? { signal } : {}) });
      } catch (error) {
        // Whoever called it off has gone: nothing failed, and nobody waits for an answer.
        if (signal?.aborted) throw new ProblemError('gone', 'This work was called off.');
        throw error;
      }
    },
    close: () => pool.destroy(),
  };
}
