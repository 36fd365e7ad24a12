/** The board under a finger, on a tablet. */
import { expect, test, type CDPSession } from '@playwright/test';
import { beginArch, field, figure, handle, headline, middleOf, openApp } from './board.ts';

test.use({ viewport: { width: 820, height: 1180 }, hasTouch: true });
test.beforeEach(({ page }) => openApp(page));

interface Finger {
  readonly x: number;
  readonly y: number;
}

const touch = (cdp: CDPSession, type: 'touchStart' | 'touchMove' | 'touchEnd', fingers: readonly Finger[]) =>
  cdp.send('Input.dispatchTouchEvent', { type, touchPoints: fingers.map(({ x, y }, id) => ({ x, y, id })) });

test('a finger near the crown draws it up', async ({ page, context }) => {
  await beginArch(page, 'Segmental');
  const first = await headline(page).textContent();
  const cdp = await context.newCDPSession(page);
  const { x, y } = await middleOf(handle(page, /^Rise/));
  await touch(cdp, 'touchStart', [{ x: x + 12, y: y + 6 }]);
  for (let up = 10; up <= 60; up += 10) await touch(cdp, 'touchMove', [{ x: x + 12, y: y + 6 - up }]);
  await touch(cdp, 'touchEnd', []);
  await expect(headline(page)).not.toHaveText(first ?? '');
  // by a press: a tap that follows a flick at once is taken by the browser as the end of the flick
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(headline(page)).toHaveText(first ?? '');
});

test('two fingers stretch the drawing and change nothing in it', async ({ page, context }) => {
  const cdp = await context.newCDPSession(page);
  const before = await middleOf(handle(page, /left springing/));
  const right = await middleOf(handle(page, /right springing/));
  const middle = { x: (before.x + right.x) / 2, y: before.y + 150 };
  const fingers = (apart: number): Finger[] => [
    { x: middle.x - apart, y: middle.y },
    { x: middle.x + apart, y: middle.y },
  ];
  await touch(cdp, 'touchStart', fingers(60));
  for (let apart = 65; apart <= 90; apart += 5) await touch(cdp, 'touchMove', fingers(apart));
  await touch(cdp, 'touchEnd', []);
  const after = await middleOf(handle(page, /left springing/));
  const right2 = await middleOf(handle(page, /right springing/));
  expect((right2.x - after.x) / (right.x - before.x)).toBeCloseTo(1.5, 1);
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled();
});

test('the panels are drawers over the board: opened, used and put away', async ({ page }) => {
  await expect(field(page, 'Span')).toBeHidden();
  await page.getByRole('button', { name: 'Measures' }).tap();
  await field(page, 'Span').fill('2,5');
  await page.keyboard.press('Enter');
  await expect(field(page, 'Span')).toHaveValue(figure('2.5 m'));
  const board = await page.getByRole('region', { name: 'Drawing board' }).boundingBox();
  expect(board?.width).toBe(820);
  await page.keyboard.press('Escape');
  await expect(field(page, 'Span')).toBeHidden();
  await expect(page.getByRole('button', { name: 'Measures' })).toBeFocused();
});
