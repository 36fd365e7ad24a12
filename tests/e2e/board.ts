/** The gestures that the specs are made of. */
import { expect, type Locator, type Page } from '@playwright/test';

/** Opens the page in a browser that can only choose files and download them, so that dialogs of the system stay away. */
export async function openApp(page: Page): Promise<void> {
  await page.addInitScript(() => {
    for (const name of ['showOpenFilePicker', 'showSaveFilePicker', 'showDirectoryPicker'])
      Reflect.deleteProperty(window, name);
  });
  // Asking for choosers from the start: one that is opened while the asking is still on its way is never told.
  page.on('filechooser', () => undefined);
  await page.goto('/');
  await expect(handle(page, /^Rise/)).toBeVisible();
}

export const headline = (page: Page): Locator => page.getByTestId('headline');

export const handle = (page: Page, name: RegExp): Locator => page.getByRole('slider', { name });

/** A figure of the panel of measures. */
export const field = (page: Page, name: string): Locator =>
  page.getByRole('complementary', { name: 'Measured and assumed' }).getByLabel(name, { exact: true });

/** A figure as it is written, whatever space stands between it and its unit. */
export const figure = (text: string): RegExp =>
  new RegExp(`^${text.replace(/[.+=]/g, '[$&]').replaceAll(' ', String.raw`\s`)}$`);

/** Draws a handle by so many pixels, down and to the right positive. */
export async function dragBy(page: Page, dragged: Locator, dx: number, dy: number): Promise<void> {
  const { x, y } = await middleOf(dragged);
  await page.mouse.move(x, y);
  await page.mouse.down();
  for (let step = 1; step <= 8; step++) await page.mouse.move(x + (dx * step) / 8, y + (dy * step) / 8);
  await page.mouse.up();
}

export async function middleOf(locator: Locator): Promise<{ x: number; y: number }> {
  const box = await locator.boundingBox();
  if (box === null) throw new Error('there is nothing to take hold of');
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 };
}

/** Begins a new arch of a shape, from a document that has nothing unsaved. */
export async function beginArch(page: Page, shape: string): Promise<void> {
  await page.keyboard.press('Alt+n');
  await page
    .getByRole('dialog')
    .getByRole('button', { name: new RegExp(`^${shape}`) })
    .click();
  await expect(page.getByLabel('Title of the job')).toHaveValue('New job');
}
