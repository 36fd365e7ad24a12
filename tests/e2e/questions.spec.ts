/** What is asked of an arch beyond its findings: thrust, movement, spread, an axle, cracks. */
import AxeBuilder from '@axe-core/playwright';
import { expect, test, type Page } from '@playwright/test';
import { readFile } from 'node:fs/promises';
import { dragBy, figure, handle, middleOf, openApp } from './board.ts';

test.beforeEach(({ page }) => openApp(page));

const leaf = (page: Page, name: string) => page.getByRole('tab', { name, exact: true }).click();
const panel = (page: Page) => page.getByRole('tabpanel');
const undo = (page: Page) => page.getByRole('button', { name: 'Undo' });

test('an arch that does not stand leads from its finding to its fall', async ({ page }) => {
  await openSample(page, 'harrowmere-chapel-west-bay');
  await page.getByRole('button', { name: 'See how it falls' }).click();
  await expect(page.getByRole('tab', { name: 'Movement' })).toHaveAttribute('aria-selected', 'true');
  await expect(page.getByRole('tab', { name: 'Movement' })).toBeFocused();
});

async function openSample(page: Page, name: string): Promise<void> {
  const buffer = await readFile(`assets/samples/${name}.json`);
  const chooser = page.waitForEvent('filechooser');
  await page.keyboard.press('Control+o');
  await (await chooser).setFiles({ name: `${name}.json`, mimeType: 'application/json', buffer });
  await expect(page.getByText(`${name}.json`)).toBeVisible();
}

test('a thrust is chosen with the slider, and a joint inspected by press and by key', async ({ page }) => {
  await leaf(page, 'Thrust');
  const slider = panel(page).getByRole('slider', { name: 'Chosen thrust' });
  await slider.press('Home');
  await expect(slider).toHaveAttribute('aria-valuetext', figure('21.6 kN'));
  await slider.press('End');
  await expect(slider).toHaveAttribute('aria-valuetext', figure('78.4 kN'));
  const joint = panel(page).getByLabel('Joint', { exact: true });
  const right = await middleOf(handle(page, /right springing/));
  await page.mouse.click(right.x + 10, right.y - 8);
  await expect(joint).toHaveValue('17');
  await page.getByRole('slider', { name: 'Joint inspected' }).focus();
  await page.keyboard.press('ArrowLeft');
  await expect(joint).toHaveValue('16');
  await expect(page.getByTestId('joint')).toContainText('kN');
  await expect(undo(page)).toBeDisabled();
});

test('a line drawn by hand says where it leaves the ring and by how much', async ({ page }) => {
  await leaf(page, 'Thrust');
  await page.getByText('Line by hand').click();
  await expect(panel(page).getByText('The line stays within the ring at every joint.')).toBeVisible();
  await dragBy(page, handle(page, /^Line by hand, at the crown/), 0, 70);
  await expect(
    panel(page).getByText(/^The line leaves the ring at joint \d+ by \d+ mm beyond the intrados/),
  ).toBeVisible();
});

test('a support that spreads opens three joints, in millimetres that follow the amount', async ({ page }) => {
  await leaf(page, 'Movement');
  const rows = page.getByTestId('openings').getByRole('row');
  await expect(rows).toHaveCount(4);
  const before = await rows.nth(2).textContent();
  await panel(page).getByLabel('By', { exact: true }).fill('20 mm');
  await page.keyboard.press('Enter');
  await expect(rows.nth(2)).not.toHaveText(before ?? '');
  await panel(page).getByLabel('What it does').selectOption('turns-out');
  await expect(panel(page).getByLabel('By', { exact: true })).toHaveValue(/°/);
});

test('the fall of an arch that does not stand is played, stopped and wound by hand', async ({ page }) => {
  await openSample(page, 'harrowmere-chapel-west-bay');
  await leaf(page, 'Movement');
  const film = page.getByRole('slider', { name: /^Movement/ });
  await film.press('Home');
  await page.getByRole('button', { name: 'Play', exact: true }).click();
  await expect.poll(() => film.inputValue().then(Number)).toBeGreaterThan(0.1);
  await page.getByRole('button', { name: 'Stop', exact: true }).click();
  const stopped = await film.inputValue();
  await page.waitForTimeout(200);
  expect(await film.inputValue()).toBe(stopped);
  await film.press('End');
  await expect(film).toHaveValue('1');
});

test('with reduced motion the fall can only be wound by hand', async ({ page }) => {
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await openSample(page, 'harrowmere-chapel-west-bay');
  await leaf(page, 'Movement');
  await expect(page.getByRole('slider', { name: /^Movement/ })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Play', exact: true })).toBeHidden();
});

test('the spread until it falls: found beside the page, looked through, and put away by an edit', async ({ page }) => {
  await leaf(page, 'Movement');
  await page.getByText('Until it falls').click();
  await page.getByRole('button', { name: 'Find how far it can spread' }).click();
  await expect(page.getByTestId('spread')).toContainText(/It falls when the springings are 551.mm further apart/);
  const slider = page.getByRole('slider', { name: 'Springings further apart by' });
  await slider.press('End');
  await expect(slider).toHaveAttribute('aria-valuetext', figure('551 mm'));
  await page.getByLabel('Thickness', { exact: true }).fill('0.3');
  await page.keyboard.press('Enter');
  await expect(page.getByTestId('spread')).toBeHidden();
  await undo(page).click();
  await expect(page.getByTestId('spread')).toBeVisible();
});

test('a long question can be given up', async ({ page }) => {
  await page.getByLabel('Voussoirs', { exact: true }).fill('3000');
  await page.keyboard.press('Enter');
  await leaf(page, 'Movement');
  await page.getByText('Until it falls').click();
  await page.getByRole('button', { name: 'Find how far it can spread' }).click();
  await page.getByRole('button', { name: 'Stop', exact: true }).click();
  await expect(page.getByRole('button', { name: 'Find how far it can spread' })).toBeVisible();
  await expect(page.getByTestId('spread')).toBeHidden();
});

test('an axle crosses, and is added as a load where the ring holds it least', async ({ page }) => {
  await openSample(page, 'harrowmere-ford-bridge');
  await leaf(page, 'Axle');
  await page.getByRole('button', { name: 'Let it cross' }).click();
  await expect(page.getByTestId('axle')).toContainText('times its weight');
  await page.getByRole('button', { name: 'Add the axle there as a load' }).click();
  await expect(page.getByRole('group', { name: 'Axle' })).toBeVisible();
  await undo(page).click();
  await expect(page.getByRole('group', { name: 'Axle' })).toBeHidden();
});

test('three cracks are marked on the board, read, shown and undone', async ({ page }) => {
  await leaf(page, 'Cracks');
  const crown = await middleOf(handle(page, /^Rise/));
  const left = await middleOf(handle(page, /left springing/));
  const right = await middleOf(handle(page, /right springing/));
  const back = await middleOf(handle(page, /^Thickness/));
  const thick = crown.y - back.y;
  await page.getByRole('button', { name: 'Mark on the board' }).click();
  // the springing joints lean outwards, at the extrados by about eight tenths of the thickness
  await page.mouse.click(left.x - thick * 0.72, left.y - thick * 0.52);
  await page.mouse.click(right.x + thick * 0.72, right.y - thick * 0.52);
  await page.mouse.click(crown.x + thick * 0.68, crown.y + 4);
  await expect(page.getByRole('group', { name: /^Mark \d/ })).toHaveCount(3);
  await page.getByRole('button', { name: 'Done', exact: true }).click();
  await expect(page.getByTestId('verdict')).toContainText('The marks speak for the springings having spread apart');
  await page.getByRole('button', { name: /^Best/ }).hover();
  await expect(page.getByRole('list', { name: 'Legend' })).toContainText('Ring before the movement');
  await expect(page.getByText('likeness, not probability')).toBeVisible();
  for (let i = 0; i < 3; i++) await undo(page).click();
  await expect(page.getByRole('group', { name: /^Mark \d/ })).toHaveCount(0);
});

test('a crack is put in the list by keyboard alone, with width and date', async ({ page }) => {
  await leaf(page, 'Cracks');
  await page.getByRole('button', { name: 'Add a mark here in the list' }).press('Enter');
  const mark = page.getByRole('group', { name: 'Mark 1' });
  await mark.getByLabel('Joint', { exact: true }).fill('10');
  await page.keyboard.press('Enter');
  await mark.getByLabel('Width').fill('3 mm');
  await page.keyboard.press('Enter');
  await expect(mark.getByLabel('Width')).toHaveValue(figure('0.003 m'));
  await mark.getByLabel('Seen on').fill('2026-05-14');
  await expect(page.getByTestId('verdict')).toContainText('One opening alone is marked');
  await mark.getByRole('button', { name: 'Remove mark 1' }).click();
  await expect(mark).toBeHidden();
});

test('a road is entered and compared, and the comparison says that it is no check', async ({ page }) => {
  await openSample(page, 'harrowmere-ford-bridge');
  await page.getByText('More: a road over the arch').click();
  await page.getByRole('button', { name: 'Road', exact: true }).click();
  await page.getByText('Comparisons (not checks)').click();
  await expect(panel(page)).toContainText('740 (d + h)²');
  await expect(panel(page)).toContainText('It is no check');
});

for (const colorScheme of ['light', 'dark'] as const) {
  for (const view of ['Thrust', 'Movement', 'Axle', 'Cracks']) {
    test(`axe finds nothing serious under ${view}, ${colorScheme}`, async ({ page }) => {
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      await leaf(page, view);
      if (view === 'Cracks') await page.getByRole('button', { name: 'Add a mark here in the list' }).click();
      const { violations } = await new AxeBuilder({ page }).include('main').include('[role=tabpanel]').analyze();
      expect(violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')).toEqual([]);
    });
  }
}
