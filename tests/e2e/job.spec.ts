/** Several arches in one job, and what is said of their site. */
import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { beginArch, field, figure, openApp } from './board.ts';

test('an arch is added, named, left and removed; undo brings it back', async ({ page }) => {
  await openApp(page);
  await beginArch(page, 'Segmental');
  const job = page.getByRole('button', { name: 'Job', exact: true });
  await job.click();
  await page.getByRole('button', { name: 'Add an arch' }).click();
  await expect(page.getByRole('dialog')).toContainText(/3\.00\sm wide, 1\.05\sm high/);
  await page
    .getByRole('dialog')
    .getByRole('button', { name: /^Elliptical/ })
    .click();
  await expect(field(page, 'Rise')).toHaveValue(figure('1.05 m'));

  await job.click();
  await page.getByLabel('Name of arch 2').fill('Cart door');
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: 'Show Arch 1' }).click();
  await expect(field(page, 'Rise')).toHaveValue(figure('0.75 m'));
  await page.getByRole('button', { name: 'Remove Cart door' }).click();
  await expect(page.getByLabel('Name of arch 2')).toBeHidden();
  await page.keyboard.press('Escape');
  await page.keyboard.press('Control+z');
  await job.click();
  await expect(page.getByLabel('Name of arch 2')).toHaveValue('Cart door');
});

test('what is said of the site is one step', async ({ page }) => {
  await openApp(page);
  await page.getByRole('button', { name: 'Job', exact: true }).click();
  await page.getByLabel('Surveyed by').fill('A. Thorne');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('button', { name: 'Undo' })).toHaveAttribute('title', /Undo surveyed by/);
});

for (const name of ['Job', 'Display', 'Files opened before and earlier saves'])
  test(`axe finds nothing in the bar with its panel open: ${name}`, async ({ page }) => {
    await openApp(page);
    await page.getByRole('button', { name, exact: true }).click();
    const { violations } = await new AxeBuilder({ page }).include('header').analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
  });
