import tailwindcss from '@tailwindcss/vite';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const apiOrigin = process.env.API_ORIGIN ?? 'http://127.0.0.1:4310';

export default defineConfig({
  plugins: [react(), tailwindcss()],
  publicDir: false,
  // The server puts a fresh nonce in the place of this at every page it serves.
  html: { cspNonce: '%CSP_NONCE%' },
  build: { outDir: 'dist', emptyOutDir: true, chunkSizeWarningLimit: 700 },
  server: { proxy: { '/api': apiOrigin } },
  test: {
    include: ['tests/**/*.test.ts', 'tests/**/*.test.tsx'],
    globalSetup: ['tests/support/global-setup.ts'],
    setupFiles: ['tests/support/each-file.ts'],
    testTimeout: 20_000,
    hookTimeout: 60_000,
    pool: 'forks',
    maxWorkers: 2,
  },
});
