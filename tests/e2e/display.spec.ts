/** The same arch in metres, millimetres, feet and inches, with a point or a comma; the job never notices. */
import { expect, test } from '@playwright/test';
import { readFile } from 'node:fs/promises';
import { beginArch, field, figure, handle, openApp } from './board.ts';

test.beforeEach(({ page }) => openApp(page));

test('figures follow the units chosen, the job stays as it is, and the choice outlives the page', async ({ page }) => {
  await beginArch(page, 'Segmental');
  await page.getByRole('button', { name: 'Display' }).click();
  await page.getByLabel('Lengths').selectOption('feet, inches');
  await expect(field(page, 'Span')).toHaveValue('9′ 10.1102″');
  await expect(handle(page, /^Rise/)).toHaveAttribute('aria-valuetext', /″/);
  await page.getByLabel('Lengths').selectOption('millimetres');
  await page.getByLabel('Decimal mark').selectOption('comma 1,5');
  await expect(field(page, 'Span')).toHaveValue(figure('3 000 mm'));
  await expect(page.getByText('not in a file yet', { exact: true })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.getByLabel('Lengths')).toBeHidden();

  await field(page, 'Span').fill('3250');
  await page.keyboard.press('Enter');
  await expect(field(page, 'Span')).toHaveValue(figure('3 250 mm'));
  const download = page.waitForEvent('download');
  await page.keyboard.press('Control+e');
  const drawing = await readFile(await (await download).path(), 'utf8');
  expect(drawing).toContain('>3250<');
  expect(drawing).toContain('>mm, kN<');

  page.on('dialog', (dialog) => void dialog.accept());
  await page.reload();
  await expect(field(page, 'Breadth')).toHaveValue(/mm$/);
  await expect(field(page, 'Friction')).toHaveValue('0,6');
});
