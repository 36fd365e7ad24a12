import { defineConfig } from '@playwright/test';
import { createServer } from 'node:net';
import { CHROMIUM, CHROMIUM_FLAGS } from './tests/run/chromium.ts';

/** A port that nothing listens on now; the workers read this file again and must come to the same one. */
async function freePort(): Promise<string> {
  const server = createServer();
  await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
  const address = server.address();
  await new Promise((closed) => server.close(closed));
  return String(typeof address === 'object' && address !== null ? address.port : 0);
}

const port = (process.env['SKEWBACK_E2E_PORT'] ??= await freePort());
const baseURL = `http://127.0.0.1:${port}`;

export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results',
  forbidOnly: true,
  fullyParallel: true,
  workers: 2,
  timeout: 30_000,
  reporter: 'list',
  use: {
    baseURL,
    viewport: { width: 1440, height: 900 },
    locale: 'en-GB',
    launchOptions: { executablePath: CHROMIUM, args: CHROMIUM_FLAGS },
  },
  // Builds the page where it is missing or older than its sources, then serves it as a person would get it.
  webServer: {
    command: `node --import tsx app/start.ts --browser --port ${port}`,
    url: baseURL,
    reuseExistingServer: false,
    timeout: 120_000,
    stdout: 'ignore',
  },
});
