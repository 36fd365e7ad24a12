import fs from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { answers, fileName, openPath, type Answers, type Desk, type Dialogs } from '../../../app/desktop/answers.ts';
import { draftStore } from '../../../app/files/drafts.ts';
import { recentPaths } from '../../../app/files/recent.ts';
import { references } from '../../../app/files/references.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const text = (given: Uint8Array): string => new TextDecoder().decode(given);

let folder: string;
/** What the person does in the next dialogs; null closes one. */
let choice: { path: string | null; replace: boolean };
let asked: string[];
let told: string[];

function desk(): Desk {
  const dialogs: Dialogs = {
    chooseFileToOpen: () => Promise.resolve(choice.path),
    choosePlaceToSave: (name, ending) => {
      asked.push(`${name} (${ending})`);
      return Promise.resolve(choice.path);
    },
    chooseFolder: () => Promise.resolve(choice.path),
    mayReplace: (names) => {
      asked.push(`replace ${names.join(', ')}`);
      return Promise.resolve(choice.replace);
    },
  };
  return {
    references: references(),
    recent: recentPaths(join(folder, 'user')),
    drafts: draftStore(join(folder, 'user', 'drafts')),
    dialogs,
    window: {
      setDirty: (dirty) => void told.push(`dirty ${dirty}`),
      setTitle: (title) => void told.push(`title ${title}`),
      close: () => void told.push('close'),
      print: () => Promise.resolve({ kind: 'cancelled' }),
      pageListens: () => void told.push('listens'),
    },
    now: () => new Date(Date.UTC(2026, 4, 14)),
  };
}

let page: Answers;
beforeEach(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-desk-'));
  choice = { path: null, replace: false };
  asked = [];
  told = [];
  page = answers(desk());
});
afterEach(() => fs.rm(folder, { recursive: true, force: true }));

async function opened(name = 'north.skewback', content = 'job') {
  const path = join(folder, name);
  await fs.writeFile(path, content);
  choice.path = path;
  const outcome = await page['file:open']();
  if (outcome.kind !== 'done') throw new Error('was not opened');
  return outcome.value;
}

describe('opening and saving from the desktop', () => {
  test('a chosen file comes with its bytes and a reference, and saves back', async () => {
    const { file, bytes: content } = await opened();
    expect(text(content)).toBe('job');
    expect(file).toMatchObject({ name: 'north.skewback', folder });
    expect(await page['file:save'](file.id, bytes('changed'))).toEqual({ kind: 'done', value: file });
    expect(await fs.readFile(join(folder, 'north.skewback'), 'utf8')).toBe('changed');
  });

  test('closing a dialog is no failure', async () => {
    expect(await page['file:open']()).toEqual({ kind: 'cancelled' });
    expect(await page['file:save-as']('new', bytes('1'))).toEqual({ kind: 'cancelled' });
    expect(await page['file:export']({ name: 'a.svg', mime: 'image/svg+xml', bytes: bytes('1') })).toEqual({
      kind: 'cancelled',
    });
    expect(await page['file:export-all']([])).toEqual({ kind: 'cancelled' });
  });

  test('a file that the person did not choose is not written, whatever the page says', async () => {
    const outcome = await page['file:save'](join(folder, 'north.skewback'), bytes('x'));
    expect(outcome).toMatchObject({ kind: 'failed' });
    expect(await page['recent:open']('/etc/passwd')).toMatchObject({ kind: 'failed' });
    expect(await fs.readdir(folder)).toEqual([]);
  });

  test('what cannot be read or written is said in a sentence with the file’s name', async () => {
    choice.path = join(folder, 'gone.skewback');
    const reason = 'gone.skewback cannot be read: there is no such file or folder.';
    expect(await page['file:open']()).toEqual({ kind: 'failed', reason });
    const { file } = await opened();
    await fs.rm(join(folder, 'north.skewback'));
    await fs.mkdir(join(folder, 'north.skewback'));
    expect(await page['file:save'](file.id, bytes('x'))).toEqual({
      kind: 'failed',
      reason: 'north.skewback cannot be written: it is not a file.',
    });
  });

  test('save as offers a name that any system takes', async () => {
    choice.path = join(folder, 'south.skewback');
    const outcome = await page['file:save-as']('../South: door?.skewback', bytes('1'));
    expect(asked).toEqual(['South door.skewback (skewback)']);
    expect(outcome).toMatchObject({ kind: 'done', value: { name: 'south.skewback' } });
  });

  test('what was opened and saved is found again, and can be forgotten', async () => {
    await opened('a.skewback');
    await opened('b.skewback');
    const listed = await page['recent:list']();
    expect(listed.map(({ file }) => file.name)).toEqual(['b.skewback', 'a.skewback']);
    expect(await page['recent:open'](listed[1]!.file.id)).toMatchObject({ kind: 'done' });
    await page['recent:forget'](listed[1]!.file.id);
    expect((await page['recent:list']()).map(({ file }) => file.name)).toEqual(['b.skewback']);
  });

  test('a file given on the command line is opened and remembered in the same way', async () => {
    await fs.writeFile(join(folder, 'c.skewback'), 'job');
    const one = desk();
    expect(await openPath(one, join(folder, 'c.skewback'))).toMatchObject({ kind: 'done' });
    expect(await one.recent.list()).toHaveLength(1);
  });
});

describe('drawings', () => {
  const drawing = (name: string) => ({ name, mime: 'image/svg+xml', bytes: bytes(name) });

  test('one goes where the person says', async () => {
    choice.path = join(folder, 'elevation.svg');
    expect(await page['file:export'](drawing('elevation.svg'))).toEqual({ kind: 'done', value: choice.path });
    expect(asked).toEqual(['elevation.svg (svg)']);
    expect(await fs.readFile(choice.path, 'utf8')).toBe('elevation.svg');
  });

  test('several go into one folder, and never out of it', async () => {
    choice.path = folder;
    await page['file:export-all']([drawing('a.svg'), drawing('../b.svg'), drawing('/c.svg')]);
    expect((await fs.readdir(folder)).sort()).toEqual(['a.svg', 'b.svg', 'c.svg']);
  });

  test('what stands there is replaced only when the person says so', async () => {
    choice.path = folder;
    await fs.writeFile(join(folder, 'a.svg'), 'old');
    expect(await page['file:export-all']([drawing('a.svg'), drawing('b.svg')])).toEqual({ kind: 'cancelled' });
    expect(asked).toEqual(['replace a.svg']);
    expect(await fs.readdir(folder)).toEqual(['a.svg']);
    choice.replace = true;
    expect(await page['file:export-all']([drawing('a.svg'), drawing('b.svg')])).toMatchObject({ kind: 'done' });
    expect(await fs.readFile(join(folder, 'a.svg'), 'utf8')).toBe('a.svg');
  });
});

describe('drafts', () => {
  test('a draft outlives the run, and saves to its file in the next', async () => {
    const { file } = await opened();
    await page['draft:keep']({ id: 'd1', title: 'North', file }, bytes('edited'));
    page = answers(desk());
    const [draft] = await page['draft:list']();
    expect(draft).toMatchObject({ id: 'd1', title: 'North', file: { name: 'north.skewback' } });
    await page['file:save'](draft!.file!.id, draft!.bytes);
    expect(await fs.readFile(join(folder, 'north.skewback'), 'utf8')).toBe('edited');
    await page['draft:discard']('d1');
    expect(await page['draft:list']()).toEqual([]);
  });

  test('a draft that cannot be kept says why', async () => {
    const outcome = await page['draft:keep']({ id: '../d', title: '', file: null }, bytes('1'));
    expect(outcome).toMatchObject({
      kind: 'failed',
      reason: expect.stringContaining('A draft cannot be kept') as string,
    });
  });
});

test('the window is told what the page says of it', async () => {
  await page['window:dirty'](true);
  await page['window:title']('North door');
  await page['page:listens']();
  await page['window:close']();
  expect(told).toEqual(['dirty true', 'title North door', 'listens', 'close']);
});

test.each([
  ['north.svg', 'north.svg'],
  ['a/b\\c:d.svg', 'a b c d.svg'],
  ['...', 'unnamed'],
  ['', 'unnamed'],
  [`${'x'.repeat(300)}.svg`, `${'x'.repeat(180)}.svg`],
])('the name %j becomes %j', (suggested, name) => {
  expect(fileName(suggested)).toBe(name);
});
