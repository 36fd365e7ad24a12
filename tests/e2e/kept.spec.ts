/** Work that outlives its page: crashes, closed tabs, other tabs, files opened before, earlier saves, dropped files. */
import { expect, test, type Page } from '@playwright/test';
import { writeJob } from '../../core/job/write.ts';
import { freshJob } from '../../core/job/fresh.ts';
import { beginArch, field, figure, handle, openApp } from './board.ts';

/** The browser's own store of files stands for the disk: its handles are those that a dialog would give. */
async function openWithFiles(page: Page): Promise<void> {
  await page.addInitScript(() => {
    const picked = async (name: string, create: boolean): Promise<FileSystemFileHandle> =>
      (await navigator.storage.getDirectory()).getFileHandle(name, { create });
    Object.assign(window, {
      showOpenFilePicker: async () => [await picked('mill.skewback', false)],
      showSaveFilePicker: () => picked('mill.skewback', true),
    });
  });
  await page.goto('/');
  await expect(handle(page, /^Rise/)).toBeVisible();
}

async function typeSpan(page: Page, span: string): Promise<void> {
  await field(page, 'Span').fill(span);
  await page.keyboard.press('Enter');
  await expect(field(page, 'Span')).toHaveValue(figure(`${span} m`));
}

const drafts = (page: Page): Promise<number> =>
  page.evaluate(
    () =>
      new Promise<number>((resolve, reject) => {
        const opening = indexedDB.open('skewback');
        opening.onerror = () => reject(new Error('no database'));
        opening.onsuccess = () => {
          const counting = opening.result.transaction('drafts').objectStore('drafts').count();
          counting.onsuccess = () => {
            opening.result.close();
            resolve(counting.result);
          };
        };
      }),
  );

const kept = (page: Page, count: number): Promise<void> =>
  expect.poll(() => drafts(page), { timeout: 5_000, intervals: [100] }).toBe(count);

test('a page that is killed loses at most five seconds, and its work is offered to the next', async ({
  page,
  context,
}) => {
  await openApp(page);
  await beginArch(page, 'Segmental');
  await typeSpan(page, '3.7');
  await kept(page, 1);
  const gone = page.waitForEvent('crash');
  const devtools = await context.newCDPSession(page);
  void devtools.send('Page.crash').catch(() => undefined);
  await gone;

  const next = await context.newPage();
  await openApp(next);
  const found = next.getByRole('region', { name: 'Work that was not saved' });
  await expect(found).toContainText('never in a file, kept today');
  await found.getByRole('button', { name: 'Open New job' }).click();
  await expect(field(next, 'Span')).toHaveValue(figure('3.7 m'));
  await expect(next.getByText('not in a file yet, changed')).toBeVisible();
  await expect(found).toBeHidden();

  const download = next.waitForEvent('download');
  await next.keyboard.press('Control+s');
  await download;
  await kept(next, 0);
});

test('a closed tab leaves its work to be thrown away; a living one keeps its own', async ({ page, context }) => {
  await openApp(page);
  await beginArch(page, 'Pointed');
  await typeSpan(page, '2.9');
  await kept(page, 1);
  const beside = await context.newPage();
  await openApp(beside);
  await expect(field(beside, 'Span')).toHaveValue(/m$/);
  await expect(beside.getByRole('region', { name: 'Work that was not saved' })).toBeHidden();
  await page.close();

  await beside.reload();
  const found = beside.getByRole('region', { name: 'Work that was not saved' });
  await found.getByRole('button', { name: 'Throw away New job' }).click();
  await expect(found).toBeHidden();
  await kept(beside, 0);
});

test('a file opened in two tabs is told, and the second to save is asked', async ({ page, context }) => {
  await openWithFiles(page);
  await beginArch(page, 'Segmental');
  await typeSpan(page, '3.3');
  await page.keyboard.press('Control+s');
  await expect(page.getByText('mill.skewback', { exact: true })).toBeVisible();

  const second = await context.newPage();
  await openWithFiles(second);
  await second.keyboard.press('Control+o');
  await expect(field(second, 'Span')).toHaveValue(figure('3.3 m'));
  for (const tab of [page, second]) await expect(tab.getByText('is also open in another tab')).toBeVisible();

  await typeSpan(page, '3.4');
  await page.keyboard.press('Control+s');
  await expect(page.getByText('mill.skewback', { exact: true })).toBeVisible();
  await typeSpan(second, '3.9');
  await second.keyboard.press('Control+s');
  const question = second.getByRole('dialog', { name: 'mill.skewback was changed elsewhere' });
  await question.getByRole('button', { name: 'Keep working' }).click();
  await expect(second.getByText('mill.skewback, changed', { exact: true })).toBeVisible();
  await second.keyboard.press('Control+s');
  await question.getByRole('button', { name: 'Write over it' }).click();
  await expect(second.getByText('mill.skewback', { exact: true })).toBeVisible();

  await second.close();
  await expect(page.getByText('is also open in another tab')).toBeHidden();
});

test('a file opened before is opened again from the list, and an earlier save is gone back to', async ({ page }) => {
  await openWithFiles(page);
  await beginArch(page, 'Segmental');
  for (const span of ['3.1', '3.2']) {
    await typeSpan(page, span);
    await page.keyboard.press('Control+s');
    await expect(page.getByText('mill.skewback', { exact: true })).toBeVisible();
  }
  const menu = page.getByRole('button', { name: 'Files opened before and earlier saves' });
  await menu.click();
  await page.getByRole('list', { name: 'Earlier saves' }).getByRole('button').nth(1).click();
  await expect(field(page, 'Span')).toHaveValue(figure('3.1 m'));
  await page.keyboard.press('Control+z');
  await expect(field(page, 'Span')).toHaveValue(figure('3.2 m'));

  await page.reload();
  await expect(page.getByText('not in a file yet', { exact: true })).toBeVisible();
  await menu.click();
  await page.getByRole('list', { name: 'Opened before' }).getByRole('button', { name: 'mill.skewback' }).click();
  await expect(field(page, 'Span')).toHaveValue(figure('3.2 m'));
});

test('a file dropped onto the window is opened', async ({ page }) => {
  await openApp(page);
  const transfer = await page.evaluateHandle(
    (text) => {
      const made = new DataTransfer();
      made.items.add(new File([text], 'dropped.json', { type: 'application/json' }));
      return made;
    },
    writeJob({ ...freshJob('catenary'), title: 'Dropped mill' }),
  );
  await page.dispatchEvent('main', 'dragover', { dataTransfer: transfer });
  await expect(page.getByText('Let go to open this file.')).toBeVisible();
  await page.dispatchEvent('main', 'drop', { dataTransfer: transfer });
  await expect(page.getByLabel('Title of the job')).toHaveValue('Dropped mill');
  await expect(page.getByText('Let go to open this file.')).toBeHidden();
});
