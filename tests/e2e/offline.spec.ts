/** The page without its server, and beside a newer build. */
import { expect, test, type Page } from '@playwright/test';
import { cp, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { servePage } from '../../app/web/server.ts';
import { field, figure } from './board.ts';

const built = fileURLToPath(new URL('../../dist/renderer', import.meta.url));

async function visit(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
    if (navigator.serviceWorker.controller === null)
      await new Promise((taken) => navigator.serviceWorker.addEventListener('controllerchange', taken, { once: true }));
  });
}

test('a page visited once opens and reads entries with its server stopped', async ({ page }) => {
  const serving = await servePage(built, 0);
  await visit(page, serving.address);
  await serving.close();
  await page.reload();
  await field(page, 'Span').fill(`8' 3 1/2"`);
  await page.keyboard.press('Enter');
  await expect(field(page, 'Span')).toHaveValue(figure('2.5273 m'));
});

test('a page that reaches its server gets the newest build, whatever was kept', async ({ page }) => {
  const folder = await mkdtemp(join(tmpdir(), 'skewback-build-'));
  await cp(built, folder, { recursive: true });
  const serving = await servePage(folder, 0);
  try {
    await visit(page, serving.address);
    const index = join(folder, 'index.html');
    await writeFile(
      index,
      (await readFile(index, 'utf8')).replace('<html lang="en-GB"', '<html lang="en-GB" data-newer'),
    );
    await page.reload();
    await expect(page.locator('html')).toHaveAttribute('data-newer');
  } finally {
    await serving.close();
    await rm(folder, { recursive: true });
  }
});

test('the page can be installed and opens its own kind of file', async ({ page }) => {
  await page.goto('/');
  const address = await page.locator('link[rel=manifest]').getAttribute('href');
  const response = await page.request.get(new URL(address ?? '', page.url()).href);
  expect(response.headers()['content-type']).toContain('application/manifest+json');
  const manifest = (await response.json()) as { icons: { src: string }[]; file_handlers: unknown[] };
  expect(manifest.file_handlers).toHaveLength(1);
  const icon = await page.request.get(new URL(manifest.icons[0]!.src, response.url()).href);
  expect(icon.headers()['content-type']).toBe('image/svg+xml');
});
