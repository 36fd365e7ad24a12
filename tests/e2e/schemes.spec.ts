/** An arch as found and a proposal beside it: copied, changed, held against one another, switched and undone. */
import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Locator, type Page } from '@playwright/test';
import { field, figure, handle, headline, openApp } from './board.ts';

test.beforeEach(({ page }) => openApp(page));

const strip = (page: Page): Locator => page.getByRole('navigation', { name: 'Schemes' });
const card = (page: Page, name: string): Locator => strip(page).getByRole('button', { name: new RegExp(`^${name},`) });

async function thicken(page: Page, thickness: string): Promise<void> {
  await field(page, 'Thickness').fill(thickness);
  await page.keyboard.press('Enter');
  await expect(field(page, 'Thickness')).toHaveValue(figure(`${thickness} m`));
  await handle(page, /^Rise/).focus();
}

test('duplicate, change, compare, lay over, switch by key, undo', async ({ page }) => {
  const first = await headline(page).textContent();
  await page.getByRole('button', { name: 'Duplicate' }).click();
  await expect(card(page, 'Proposal 1')).toHaveAttribute('aria-current', 'true');
  await expect(headline(page)).toHaveText(first ?? '');
  await thicken(page, '0.45');
  await expect(headline(page)).not.toHaveText(first ?? '');

  await page.getByRole('button', { name: 'Compare' }).click();
  const table = page.getByRole('dialog');
  const row = table.getByRole('row', { name: /^Thickness/ });
  await expect(row.getByRole('cell', { name: /^changed:/ })).toHaveText(/0\.45/);
  await expect(row.getByRole('cell').first()).toHaveText(/^\s*0\.34\sm$/);
  await expect(table.getByRole('row', { name: /^Rise/ })).toHaveCount(0);
  await page.keyboard.press('Escape');
  await expect(table).toBeHidden();

  await strip(page).getByRole('button', { name: 'Lay As found over the board' }).click();
  const legend = page.getByRole('list', { name: 'Legend' });
  await expect(legend.getByText('As found: line of least thrust')).toBeVisible();

  await page.keyboard.press('1');
  await expect(card(page, 'As found')).toHaveAttribute('aria-current', 'true');
  await expect(headline(page)).toHaveText(first ?? '');
  await expect(legend.getByText('Proposal 1: line of least thrust')).toBeVisible();
  await page.keyboard.press('Alt+PageDown');
  await expect(card(page, 'Proposal 1')).toHaveAttribute('aria-current', 'true');

  await page.keyboard.press('1');
  await page.keyboard.press('Control+z');
  await expect(card(page, 'Proposal 1')).toHaveAttribute('aria-current', 'true');
  await expect(field(page, 'Thickness')).toHaveValue(figure('0.34 m'));
  await page.keyboard.press('Control+z');
  await expect(card(page, 'Proposal 1')).toHaveCount(0);
  await expect(legend.getByText(/^Proposal 1/)).toHaveCount(0);
});

test('by keyboard alone: copied, renamed in place, deleted, brought back', async ({ page }) => {
  await page.keyboard.press('Alt+p');
  await page.keyboard.press('F2');
  await expect(page.getByLabel('Name of the scheme')).toBeFocused();
  await page.keyboard.type('Lighter floor');
  await page.keyboard.press('Enter');
  await expect(card(page, 'Lighter floor')).toBeFocused();
  await page.keyboard.press('F2');
  await page.keyboard.type('nothing');
  await page.keyboard.press('Escape');
  await expect(card(page, 'Lighter floor')).toBeVisible();

  await page.getByRole('button', { name: 'Delete' }).press('Enter');
  await expect(card(page, 'Lighter floor')).toHaveCount(0);
  await page.keyboard.press('Control+z');
  await expect(card(page, 'Lighter floor')).toHaveAttribute('aria-current', 'true');
});

for (const colorScheme of ['light', 'dark'] as const) {
  test(`axe finds nothing in the table of schemes, ${colorScheme}`, async ({ page }) => {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
    await page.keyboard.press('Alt+p');
    await thicken(page, '0.45');
    await strip(page).getByRole('button', { name: 'Lay As found over the board' }).click();
    expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
    await page.keyboard.press('Alt+c');
    await expect(page.getByRole('dialog')).toBeVisible();
    expect((await new AxeBuilder({ page }).include('dialog').analyze()).violations).toEqual([]);
  });
}
