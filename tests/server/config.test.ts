import { mkdtempSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { ConfigError, readConfig } from '../../server/config.ts';

const usual = { DATABASE_URL: 'mysql://u:p@127.0.0.1:3306/cw', DATA_DIR: mkdtempSync(path.join(os.tmpdir(), 'cw-config-')) };

describe('the environment', () => {
  it('names every setting that does not fit, in one readable message', () => {
    expect(() => readConfig({ ...usual, PORT: 'eighty', DATABASE_URL: 'postgres://x' })).toThrowError(/PORT[\s\S]*DATABASE_URL|DATABASE_URL[\s\S]*PORT/);
  });

  it('takes no default secret in production, and seeds no demo there', () => {
    expect(() => readConfig({ ...usual, NODE_ENV: 'production' })).toThrowError(ConfigError);
    const config = readConfig({ ...usual, NODE_ENV: 'production', JWT_SECRET: 's'.repeat(40), SMTP_URL: 'smtp://mail.example', APP_ORIGIN: 'https://shop.example' });
    expect(config).toMatchObject({ production: true, demo: false });
  });

  it('refuses a short secret', () => {
    expect(() => readConfig({ ...usual, JWT_SECRET: 'short' })).toThrowError(/32/);
  });
});
