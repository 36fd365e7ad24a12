import { svelte } from '@sveltejs/vite-plugin-svelte';
import { playwright } from '@vitest/browser-playwright';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';
import { CHROMIUM, CHROMIUM_FLAGS } from './tests/run/chromium.ts';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));
const configFile = here('svelte.config.js');

/**
 * Two kinds of test: `*.test.ts` runs in Node, `*.browser.test.ts` in a real Chromium (components, Konva stages).
 * End-to-end specs (`tests/e2e/*.spec.ts`) are Playwright's.
 */
export default defineConfig({
  test: {
    allowOnly: false,
    projects: [
      {
        // The client's Svelte, so that runes behave in Node as they do on screen.
        plugins: [svelte({ configFile, dynamicCompileOptions: () => ({ generate: 'client' }) })],
        ssr: { resolve: { conditions: ['browser', 'module', 'import', 'default'] }, noExternal: ['svelte'] },
        test: {
          name: 'unit',
          environment: 'node',
          // Forked processes, not threads: some tests change their user or their limits.
          pool: 'forks',
          include: ['tests/**/*.test.ts'],
          exclude: ['tests/**/*.browser.test.ts'],
          testTimeout: 20_000,
        },
      },
      {
        plugins: [svelte({ configFile })],
        optimizeDeps: {
          include: [
            'svelte',
            'svelte/reactivity',
            'konva/lib/Layer.js',
            'konva/lib/Shape.js',
            'konva/lib/Stage.js',
            'vitest-browser-svelte',
            'browser-fs-access',
            'mathjs',
            'valibot',
          ],
        },
        test: {
          name: 'browser',
          include: ['tests/**/*.browser.test.ts'],
          testTimeout: 20_000,
          browser: {
            enabled: true,
            headless: true,
            screenshotFailures: false,
            provider: playwright({ launchOptions: { executablePath: CHROMIUM, args: CHROMIUM_FLAGS } }),
            instances: [{ browser: 'chromium' }],
          },
        },
      },
    ],
  },
});
