/** Keys, words and findings explained where they stand. */
import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import { field, headline, openApp } from './board.ts';

test.beforeEach(({ page }) => openApp(page));

test('the sheet of keys opens by ? and lists what the keys do; single keys can be switched off', async ({ page }) => {
  await page.keyboard.press('?');
  const sheet = page.getByRole('dialog', { name: 'Keys and words' });
  await expect(sheet.getByText('Duplicate as a proposal')).toBeVisible();
  await expect(sheet.getByText('Alt+P', { exact: true })).toBeVisible();
  await sheet.getByRole('checkbox').uncheck();
  await page.keyboard.press('Escape');
  await expect(sheet).toBeHidden();
  await page.keyboard.press('?');
  await expect(sheet).toBeHidden();
  await page.keyboard.press('F1');
  await expect(sheet).toBeVisible();
});

test('F1 in a figure explains its name with a picture', async ({ page }) => {
  await field(page, 'Rise').focus();
  await page.keyboard.press('F1');
  const sheet = page.getByRole('dialog', { name: 'Keys and words' });
  await expect(sheet.getByRole('tab', { name: 'Words' })).toHaveAttribute('aria-selected', 'true');
  await expect(sheet.getByText('Height of the intrados at the crown over the springing line.')).toBeInViewport();
  await page.keyboard.press('Escape');
  await expect(field(page, 'Rise')).toBeFocused();
});

test('a word in a finding is explained on pointing, by keyboard and by a press; Esc puts it away', async ({ page }) => {
  const word = page.getByRole('button', { name: 'geometric safety' });
  const card = page.getByRole('tooltip');
  await word.hover();
  await expect(card).toContainText('thinnest strip');
  await page.mouse.move(0, 0);
  await expect(card).toBeHidden();
  await page.getByRole('button', { name: 'line of thrust' }).first().focus();
  await page.keyboard.press('Tab');
  await expect(word).toBeFocused();
  await expect(card).toContainText('thinnest strip');
  await page.keyboard.press('Escape');
  await expect(card).toBeHidden();
  await word.click();
  await expect(card).toBeVisible();
});

test('a finding says what would change it most and what was assumed for it', async ({ page }) => {
  await expect(headline(page)).toBeVisible();
  await page.getByText('On what it rests').first().click();
  await expect(page.getByText(/^5 % (more|less) .* would (raise|lower) the safety from /).first()).toBeVisible();
  await expect(page.getByText('No margin is asked for')).toBeVisible();
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`axe finds nothing in the help, ${colorScheme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await page.keyboard.press('?');
    await expect(page.getByRole('dialog')).toBeVisible();
    expect((await new AxeBuilder({ page }).include('dialog').analyze()).violations).toEqual([]);
    await page.getByRole('tab', { name: 'Words' }).click();
    expect((await new AxeBuilder({ page }).include('dialog').analyze()).violations).toEqual([]);
  });
}
