import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';

/** A random secret (48 hexadecimal digits) that only this user can read: made at the first call, the same ever after. */
export function keptSecret(file: string): string {
  if (existsSync(file)) {
    const secret = readFileSync(file, 'utf8').trim();
    if (secret) return secret;
  }
  const secret = randomBytes(24).toString('hex');
  // Renamed into place, so that a half-written secret is never read back.
  writeFileSync(`${file}.new`, `${secret}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return secret;
}
