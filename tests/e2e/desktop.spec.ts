/** The real desktop program, where Electron's binary and a screen are on this machine. */
import { _electron, expect, test } from '@playwright/test';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { electronBinary, hasScreen } from '../../app/electron-binary.ts';

const project = fileURLToPath(new URL('../..', import.meta.url));
const binary = electronBinary(process.env['ELECTRON_OVERRIDE_DIST_PATH']);

test('the desktop opens its page in a sandbox and offers the contract', async () => {
  test.skip(binary === null, 'Electron’s program is not on this machine; its main process is tested in Node.');
  test.skip(!hasScreen(process.platform, process.env), 'There is no screen for a window here.');
  const userData = await mkdtemp(join(tmpdir(), 'skewback-desktop-'));
  const asRoot = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  const program = await _electron.launch({
    executablePath: binary!,
    args: [project, ...asRoot, `--user-data-dir=${userData}`],
  });
  try {
    const page = await program.firstWindow();
    await expect(page).toHaveURL('app://skewback/');
    await expect(page.getByRole('main')).toBeVisible();
    expect(await page.evaluate(() => window.skewbackHost?.shell)).toBe('desktop');
    expect(await page.evaluate(() => 'require' in window || 'process' in window)).toBe(false);
  } finally {
    await program.close();
    await rm(userData, { recursive: true, force: true });
  }
});
