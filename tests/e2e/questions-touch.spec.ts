/** The questions under a finger, on a tablet: the drawer gives way to the board when it is wanted. */
import { expect, test } from '@playwright/test';
import { handle, middleOf, openApp } from './board.ts';

test.use({ viewport: { width: 820, height: 1180 }, hasTouch: true });
test.beforeEach(({ page }) => openApp(page));

test('cracks are marked with a finger on the free board, and read in the drawer', async ({ page }) => {
  const open = page.getByRole('button', { name: 'Findings', exact: true });
  await open.tap();
  await page.getByRole('tab', { name: 'Cracks' }).tap();
  await page.getByRole('button', { name: 'Mark on the board' }).tap();
  await expect(page.getByRole('tab', { name: 'Cracks' })).toBeHidden();
  const left = await middleOf(handle(page, /left springing/));
  const right = await middleOf(handle(page, /right springing/));
  await page.touchscreen.tap(left.x - 20, left.y - 15);
  await page.touchscreen.tap(right.x + 20, right.y - 15);
  await page.getByRole('button', { name: 'Done', exact: true }).tap();
  await open.tap();
  await expect(page.getByRole('group', { name: /^Mark \d/ })).toHaveCount(2);
  await page.getByRole('button', { name: /^Best/ }).tap();
  await expect(page.getByRole('button', { name: /^Best/ })).toHaveAttribute('aria-pressed', 'true');
});

test('what can be pressed in the drawer is as large as a fingertip', async ({ page }) => {
  await page.getByRole('button', { name: 'Findings', exact: true }).tap();
  for (const view of ['Thrust', 'Movement', 'Axle', 'Cracks']) {
    await page.getByRole('tab', { name: view }).tap();
    if (view === 'Cracks') await page.getByRole('button', { name: 'Add a mark here in the list' }).tap();
    const small = await page
      .getByRole('tabpanel')
      .locator('button, input:not([type=radio]), select, summary, label:has(input[type=radio])')
      .evaluateAll((found) =>
        found
          .map((element) => ({ words: element.textContent, height: element.getBoundingClientRect().height }))
          .filter(({ height }) => height > 0 && height < 43.5),
      );
    expect(small, view).toEqual([]);
  }
});
