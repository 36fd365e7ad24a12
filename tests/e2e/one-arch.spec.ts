/** One arch from a new page to a file and back, as a person does it the first time. */
import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Download, type Page } from '@playwright/test';
import { readFile } from 'node:fs/promises';
import { readJobFile } from '../../core/job/archive.ts';
import { writeJob } from '../../core/job/write.ts';
import { beginArch, dragBy, field, figure, handle, headline, middleOf, openApp } from './board.ts';

test.beforeEach(({ page }) => openApp(page));

test('new arch, crown dragged, span typed, undone twice, saved and opened again: the same file', async ({ page }) => {
  await beginArch(page, 'Segmental');
  const first = await headline(page).textContent();
  await expect(field(page, 'Rise')).toHaveValue(figure('0.75 m'));

  await dragBy(page, handle(page, /^Rise/), 0, -60);
  await expect(headline(page)).not.toHaveText(first ?? '');
  await expect(field(page, 'Rise')).not.toHaveValue(figure('0.75 m'));
  const dragged = await headline(page).textContent();

  await field(page, 'Span').fill(`8' 3 1/2"`);
  await expect(page.getByText(figure('= 2.5273 m'))).toBeVisible();
  await page.keyboard.press('Enter');
  await expect(field(page, 'Span')).toHaveValue(figure('2.5273 m'));
  await expect(headline(page)).not.toHaveText(dragged ?? '');

  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(headline(page)).toHaveText(dragged ?? '');
  await page.keyboard.press('Control+z');
  await expect(headline(page)).toHaveText(first ?? '');
  await expect(field(page, 'Rise')).toHaveValue(figure('0.75 m'));

  const saved = await savedFile(page);
  await expect(page.getByText('new-job.skewback', { exact: true })).toBeVisible();
  await beginArch(page, 'Pointed');
  await openFile(page, saved.path);
  await expect(headline(page)).toHaveText(first ?? '');

  const again = await savedFile(page);
  expect(again.text).toBe(saved.text);
});

test('Esc during a drag puts the arch back and makes no step', async ({ page }) => {
  await beginArch(page, 'Segmental');
  const first = await headline(page).textContent();
  const { x, y } = await middleOf(handle(page, /^Rise/));
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x, y - 60, { steps: 4 });
  await expect(headline(page)).not.toHaveText(first ?? '');
  await page.keyboard.press('Escape');
  await expect(headline(page)).toHaveText(first ?? '');
  await page.mouse.up();
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
});

test('a figure on the board is clicked and typed where it stands; what cannot be is explained and not taken', async ({
  page,
}) => {
  await beginArch(page, 'Segmental');
  const left = await middleOf(handle(page, /left springing/));
  const right = await middleOf(handle(page, /right springing/));
  await page.mouse.click((left.x + right.x) / 2, left.y + 33);
  const entry = page.getByRole('region', { name: 'Drawing board' }).getByLabel('Span', { exact: true });
  await expect(entry).toBeFocused();
  await entry.fill('four paces');
  await entry.press('Enter');
  await expect(page.getByText('four is no unit known here.')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
  await entry.fill('1.2 + 2,85');
  await entry.press('Enter');
  await expect(entry).toBeHidden();
  await expect(field(page, 'Span')).toHaveValue(figure('4.05 m'));
});

test('a rise that a segmental arch cannot have is refused with its limit', async ({ page }) => {
  await beginArch(page, 'Segmental');
  await field(page, 'Rise').fill('2');
  await page.keyboard.press('Enter');
  await expect(page.getByText(figure('At most 1.500 m is possible here.'))).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(field(page, 'Rise')).toHaveValue(figure('0.75 m'));
});

test('the keyboard alone moves a handle, types at it and undoes it', async ({ page }) => {
  await beginArch(page, 'Segmental');
  await handle(page, /^Rise/).focus();
  await page.keyboard.press('ArrowUp');
  await expect(field(page, 'Rise')).toHaveValue(figure('0.76 m'));
  await page.keyboard.press('Shift+ArrowUp');
  await expect(handle(page, /^Rise/)).toHaveAttribute('aria-valuetext', /^0.86/);
  await page.keyboard.press('Enter');
  await page.keyboard.type('90 cm');
  await page.keyboard.press('Enter');
  await expect(field(page, 'Rise')).toHaveValue(figure('0.9 m'));
  await page.keyboard.press('Control+z');
  await expect(field(page, 'Rise')).toHaveValue(figure('0.86 m'));
  await page.keyboard.press('Control+Shift+z');
  await expect(field(page, 'Rise')).toHaveValue(figure('0.9 m'));
});

test('a finding shows its joint on the board', async ({ page }) => {
  const joint = page.getByRole('button', { name: /^joint \d+$/ }).first();
  await joint.click();
  await expect(joint).toHaveAttribute('aria-pressed', 'true');
});

test('a file that is no job is refused in place, and the open one stays', async ({ page }) => {
  const title = await page.getByLabel('Title of the job').inputValue();
  const chooser = page.waitForEvent('filechooser');
  await page.keyboard.press('Control+o');
  await (
    await chooser
  ).setFiles({ name: 'notes.json', mimeType: 'application/json', buffer: Buffer.from('{"format":"notes"}') });
  await expect(page.getByRole('alert')).toContainText('notes.json could not be opened.');
  await expect(page.getByLabel('Title of the job')).toHaveValue(title);
});

test('the drawing is exported as a sheet', async ({ page }) => {
  const download = page.waitForEvent('download');
  await page.keyboard.press('Control+e');
  const text = await textOf(await download);
  expect(text).toContain('<svg');
  expect(text).toContain('Harrowmere');
});

for (const colorScheme of ['light', 'dark'] as const) {
  for (const width of [1280, 820]) {
    test(`axe finds nothing serious, ${colorScheme} at ${width}`, async ({ page }) => {
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      await page.setViewportSize({ width, height: 1000 });
      if (width < 1100) await page.getByRole('button', { name: 'Measures' }).click();
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);
    });
  }
}

async function savedFile(page: Page): Promise<{ path: string; text: string }> {
  const download = page.waitForEvent('download');
  await page.keyboard.press('Control+s');
  const file = await download;
  const path = await file.path();
  const reading = readJobFile(await readFile(path));
  if (!reading.ok) throw new Error('the saved file cannot be read');
  return { path, text: writeJob(reading.job) };
}

async function openFile(page: Page, path: string): Promise<void> {
  const chooser = page.waitForEvent('filechooser');
  await page.keyboard.press('Control+o');
  await (
    await chooser
  ).setFiles({ name: 'new-job.skewback', mimeType: 'application/x-skewback', buffer: await readFile(path) });
}

async function textOf(download: Download): Promise<string> {
  return readFile(await download.path(), 'utf8');
}
