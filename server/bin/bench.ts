import { readdirSync } from 'node:fs';
import path from 'node:path';

/** Measures what the design gives a figure for. `npm run bench -- NAME …` runs only the benches named. */
const folder = path.join(import.meta.dirname, 'bench');
const wanted = process.argv.slice(2);
const names = readdirSync(folder).filter((n) => n.endsWith('.ts')).map((n) => n.replace(/\.ts$/, '')).filter((n) => wanted.length === 0 || wanted.includes(n));

let failed = 0;
for (const name of names) {
  process.stdout.write(`\n${name}\n`);
  try {
    const bench = (await import(path.join(folder, `${name}.ts`))) as { run(): Promise<string[]> };
    for (const line of await bench.run()) process.stdout.write(`  ${line}\n`);
  } catch (error) {
    failed += 1;
    process.stdout.write(`  failed: ${(error as Error).message}\n`);
  }
}
process.exit(failed > 0 ? 1 : 0);
