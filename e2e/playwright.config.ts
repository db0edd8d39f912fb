import { resolve } from 'node:path';
import { defineConfig } from '@playwright/test';

const port = Number(process.env.PREVIEW_PORT ?? 4173);

export default defineConfig({
  testDir: '.',
  testMatch: '**/*.e2e.ts',
  outputDir: '../test-results',
  timeout: 60_000,
  workers: 2,
  retries: 0,
  use: {
    baseURL: `http://localhost:${port}`,
    viewport: { width: 1440, height: 900 },
    launchOptions: {
      executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
  webServer: {
    command: `npx vite preview --port ${port} --strictPort`,
    cwd: resolve(import.meta.dirname, '..'),
    port,
    reuseExistingServer: true,
  },
});
