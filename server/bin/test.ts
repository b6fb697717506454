/** `npm test`: every check there is, on a database of its own; the last line says how many held. */
import { rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from './prepare/build.ts';
import type { Database } from './prepare/mariadb.ts';
import { makeOwnedFolder } from './prepare/owned-folder.ts';
import { Problem } from './prepare/problem.ts';
import { endProcess } from './prepare/processes.ts';
import { prepareTools, type Tools } from './prepare/system-tools.ts';
import { journeyStep, runStep, testSteps, type Step, type Tally } from './prepare/test-runners.ts';
import { startThrowawayDatabase } from './prepare/throwaway-database.ts';
import { browserTools, databaseTools, pdfTools } from './prepare/tool-list.ts';

const clone = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');
const reports = makeOwnedFolder();
/** What a person set for their own server must not reach the tests. */
const notForTests = ['DATABASE_URL', 'DATA_DIR', 'PORT', 'APP_ORIGIN', 'JWT_SECRET', 'SMTP_URL', 'NODE_ENV', 'DEMO'];

let running: number | null = null;
let stopped = false;

async function main(): Promise<Tally> {
  const tools = await prepareTools([databaseTools, browserTools, pdfTools]);
  const database = await startThrowawayDatabase(tools);
  try {
    return await runAll(testEnvironment(tools, database));
  } finally {
    await database.stop();
  }
}

async function runAll(env: NodeJS.ProcessEnv): Promise<Tally> {
  const results: [string, Tally][] = [];
  const run = async (step: Step) => {
    if (stopped) return;
    console.log(`\n── ${step.title}`);
    const exitCode = await runStep(step, clone, env, (pid) => (running = pid));
    results.push([step.title, step.count(exitCode, reports)]);
  };
  for (const step of testSteps(reports)) await run(step);
  if (!stopped) {
    console.log('\n── Build');
    results.push(['Build', build(clone) ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 }]);
  }
  await run(journeyStep(reports));
  console.log('');
  for (const [title, tally] of results) console.log(`${title}: ${tally.passed} passed, ${tally.failed} failed`);
  return results.reduce((sum, [, tally]) => ({ passed: sum.passed + tally.passed, failed: sum.failed + tally.failed }), { passed: 0, failed: 0 });
}

function testEnvironment(tools: Tools, own: Database): NodeJS.ProcessEnv {
  const inherited = Object.entries(process.env).filter(([name]) => !notForTests.includes(name));
  return {
    ...Object.fromEntries(inherited),
    PATH: tools.searchPath,
    DATA_DIR: path.join(reports, 'data'),
    TEST_DATABASE_URL: own.serverUrl,
    COMBWRIGHT_CHROMIUM: tools.path('chromium'),
  };
}

/** Whoever asks to stop ends the step that runs; those after it are left out, and what was started is cleaned up. */
function stopEarly(): void {
  stopped = true;
  if (running !== null) void endProcess(running, 10_000);
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, stopEarly);
process.on('disconnect', stopEarly);
process.stdout.on('error', () => {});
process.stderr.on('error', () => {});

let tally: Tally = { passed: 0, failed: 1 };
try {
  tally = await main();
} catch (error) {
  console.error(error instanceof Problem ? error.message : error);
}
rmSync(reports, { recursive: true, force: true });
if (stopped) process.exit(130);
console.log(`${tally.passed} passed, ${tally.failed} failed`);
process.exit(tally.failed === 0 ? 0 : 1);
