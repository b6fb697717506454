import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

/** How many checks of one step held and how many did not. */
export interface Tally {
  passed: number;
  failed: number;
}

/** One step of `npm test`: a program of the clone's own packages, and how its outcome is counted. */
export interface Step {
  title: string;
  /** Program and arguments, run with Node; the program is a path below node_modules. */
  command: string[];
  env?: NodeJS.ProcessEnv;
  count(exitCode: number, reports: string): Tally;
}

/** A step that counts as one check. */
const whole = (exitCode: number): Tally => (exitCode === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 });

/** Every step in order. `reports` is a folder for the runners' JSON. */
export function testSteps(reports: string): Step[] {
  return [
    { title: 'Types', command: ['typescript/bin/tsc', '-p', 'tsconfig.json', '--noEmit'], count: whole },
    { title: 'Types of shared/', command: ['typescript/bin/tsc', '-p', 'shared/tsconfig.json', '--noEmit'], count: whole },
    { title: 'Lint', command: ['eslint/bin/eslint.js', '.', '--max-warnings', '0'], count: whole },
    {
      title: 'Tests',
      command: ['vitest/vitest.mjs', 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${path.join(reports, 'vitest.json')}`],
      count: (exitCode, folder) => countVitest(readReport(path.join(folder, 'vitest.json')), exitCode),
    },
  ];
}

/** The journeys in the browser; they need the built page. */
export function journeyStep(reports: string): Step {
  return {
    title: 'Journeys',
    command: ['@playwright/test/cli.js', 'test', '--reporter=list,json'],
    env: { PLAYWRIGHT_JSON_OUTPUT_FILE: path.join(reports, 'playwright.json') },
    count: (exitCode, folder) => countPlaywright(readReport(path.join(folder, 'playwright.json')), exitCode),
  };
}

/** Counts Vitest's JSON report. A file that could not be loaded, or an error outside any test, counts as one failed. */
export function countVitest(report: unknown, exitCode: number): Tally {
  const { numPassedTests: passed = 0, numFailedTests: failed = 0, testResults = [] } = (report ?? {}) as {
    numPassedTests?: number;
    numFailedTests?: number;
    testResults?: { status: string; assertionResults: { status: string }[] }[];
  };
  const unloaded = testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
  ).length;
  return atLeastOneFailed({ passed, failed: failed + unloaded }, exitCode);
}

/** Counts Playwright's JSON report. A test that passed only when tried again counts as passed; an error outside any test as one failed. */
export function countPlaywright(report: unknown, exitCode: number): Tally {
  const { stats = {}, errors = [] } = (report ?? {}) as {
    stats?: { expected?: number; unexpected?: number; flaky?: number };
    errors?: unknown[];
  };
  const passed = (stats.expected ?? 0) + (stats.flaky ?? 0);
  return atLeastOneFailed({ passed, failed: (stats.unexpected ?? 0) + errors.length }, exitCode);
}

/** The runner's word that something is wrong is never lost, whatever its report says. */
function atLeastOneFailed(tally: Tally, exitCode: number): Tally {
  return exitCode !== 0 && tally.failed === 0 ? { ...tally, failed: 1 } : tally;
}

function readReport(file: string): unknown {
  if (!existsSync(file)) return null;
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return null;
  }
}

/** Runs a step, its output shown as it comes; `onStart` is given its process id. Resolves with its exit code. */
export function runStep(step: Step, clone: string, env: NodeJS.ProcessEnv, onStart: (pid: number | null) => void): Promise<number> {
  const [program = '', ...args] = step.command;
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [path.join(clone, 'node_modules', program), ...args], {
      cwd: clone,
      env: { ...env, ...step.env },
      stdio: ['ignore', 'inherit', 'inherit'],
    });
    onStart(child.pid ?? null);
    child.once('error', () => resolve(1));
    child.once('exit', (code) => {
      onStart(null);
      resolve(code ?? 1);
    });
  });
}
