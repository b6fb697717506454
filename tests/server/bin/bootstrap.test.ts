import { spawnSync } from 'node:child_process';
import { chmodSync, copyFileSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

const clone = path.resolve(import.meta.dirname, '../../..');
let copy = '';

/** A clone with one package and a program `probe`; its npm only notes that it was called and writes what the real one would. */
beforeEach(() => {
  copy = mkdtempSync(path.join(os.tmpdir(), 'combwright-test-'));
  for (const folder of ['server/bin', 'deep/inside', 'path']) mkdirSync(path.join(copy, folder), { recursive: true });
  copyFileSync(path.join(clone, 'server/bin/bootstrap.mjs'), path.join(copy, 'server/bin/bootstrap.mjs'));
  writeFileSync(path.join(copy, 'package.json'), '{"type":"module"}');
  writeFileSync(path.join(copy, 'server/bin/probe.ts'), 'const code: number = Number(process.argv[2]); console.log("probed in", process.cwd()); process.exit(code);');
  lock('1.0.0');
  const npm = path.join(copy, 'path/npm');
  writeFileSync(npm, [
    '#!/bin/sh',
    'echo "npm $1" >> calls',
    'rm -rf node_modules && mkdir node_modules',
    `ln -s '${clone}/node_modules/tsx' node_modules/tsx`,
    'cp package-lock.json node_modules/.package-lock.json',
  ].join('\n'));
  chmodSync(npm, 0o755);
});

afterEach(() => rmSync(copy, { recursive: true, force: true }));

function lock(version: string): void {
  writeFileSync(path.join(copy, 'package-lock.json'), JSON.stringify({
    packages: { '': {}, 'node_modules/plank': { version }, 'node_modules/other-system': { version: '1.0.0', optional: true } },
  }));
}

function probe(code = 0, cwd = '.') {
  // As if called by hand, not by npm.
  const env: NodeJS.ProcessEnv = { ...process.env, npm_execpath: '', npm_lifecycle_event: '' };
  const done = spawnSync(process.execPath, [path.join(copy, 'server/bin/bootstrap.mjs'), 'probe', String(code)], {
    cwd: path.join(copy, cwd),
    encoding: 'utf8',
    env: { ...env, PATH: `${path.join(copy, 'path')}${path.delimiter}${env.PATH}` },
  });
  return { ...done, calls: existsSync(path.join(copy, 'calls')) ? readFileSync(path.join(copy, 'calls'), 'utf8').trim().split('\n').length : 0 };
}

describe('the first program of a clone', () => {
  it('installs the packages once, and again only when the lock file asks for others', () => {
    expect(probe().calls).toBe(1);
    expect(probe().calls).toBe(1);
    lock('1.0.1');
    expect(probe().calls).toBe(2);
  });

  it('installs again what an interrupted installation left', () => {
    probe();
    rmSync(path.join(copy, 'node_modules/.combwright-lock'));
    rmSync(path.join(copy, 'node_modules/.package-lock.json'));
    expect(probe().calls).toBe(2);
  });

  it('leaves alone what npm itself has installed from this lock file', () => {
    probe();
    rmSync(path.join(copy, 'node_modules/.combwright-lock'));
    writeFileSync(path.join(copy, 'node_modules/.package-lock.json'), JSON.stringify({ packages: { 'node_modules/plank': { version: '1.0.0' } } }));
    expect(probe().calls).toBe(1);
  });

  it('runs from anywhere in the clone, at its root, and exits as the program did', () => {
    const done = probe(7, 'deep/inside');
    expect(done.stdout).toContain(`probed in ${copy}`);
    expect(done.status).toBe(7);
  });
});
