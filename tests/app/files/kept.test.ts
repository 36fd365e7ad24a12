import fs from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { draftStore } from '../../../app/files/drafts.ts';
import { recentPaths } from '../../../app/files/recent.ts';
import { references } from '../../../app/files/references.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const minute = (k: number): Date => new Date(Date.UTC(2026, 4, 14, 9, k));

let parent: string;
let folder: string;
beforeEach(async () => {
  parent = await fs.mkdtemp(join(tmpdir(), 'skewback-kept-'));
  folder = join(parent, 'not made yet');
});
afterEach(() => fs.rm(parent, { recursive: true, force: true }));

describe('recent files', () => {
  test('the latest comes first, each once, a dozen at most', async () => {
    const recent = recentPaths(folder);
    expect(await recent.list()).toEqual([]);
    for (let k = 0; k < 15; k++) await recent.note(`/jobs/${k}.skewback`, minute(k));
    await recent.note('/jobs/9.skewback', minute(20));
    const paths = (await recent.list()).map((one) => one.path);
    expect(paths.slice(0, 3)).toEqual(['/jobs/9.skewback', '/jobs/14.skewback', '/jobs/13.skewback']);
    expect(paths).toHaveLength(12);
    expect(new Set(paths).size).toBe(12);
  });

  test('quick changes do not undo each other', async () => {
    const recent = recentPaths(folder);
    await Promise.all([recent.note('/a', minute(1)), recent.note('/b', minute(2)), recent.forget('/a')]);
    expect(await recent.list()).toEqual([{ path: '/b', openedAt: minute(2).toISOString() }]);
  });

  test.each(['', 'not json', '{}', '[1, {"path": 3}, {"path": ""}]'])(
    'a list spoilt to %j is empty, and mends',
    async (text) => {
      await fs.mkdir(folder);
      await fs.writeFile(join(folder, 'recent.json'), text);
      const recent = recentPaths(folder);
      expect(await recent.list()).toEqual([]);
      await recent.note('/a', minute(1));
      expect(await recent.list()).toHaveLength(1);
    },
  );
});

describe('drafts', () => {
  const note = { id: 'b3-1', title: 'North\ndoor', path: '/jobs/north.skewback' };

  test('a draft comes back as it was kept, line feeds and all', async () => {
    const store = draftStore(folder);
    expect(await store.keep(note, bytes('PK\n\n\0'), minute(1))).toEqual({ kind: 'done', value: null });
    const [draft] = await draftStore(folder).list();
    expect(draft).toMatchObject({ ...note, keptAt: minute(1).toISOString() });
    expect(Buffer.from(draft!.bytes).toString()).toBe('PK\n\n\0');
  });

  test('keeping again replaces; the latest comes first; discarding takes away', async () => {
    const store = draftStore(folder);
    await store.keep(note, bytes('1'), minute(1));
    await store.keep({ ...note, id: 'other', path: null }, bytes('2'), minute(2));
    await store.keep(note, bytes('3'), minute(3));
    expect((await store.list()).map((draft) => [draft.id, Buffer.from(draft.bytes).toString()])).toEqual([
      ['b3-1', '3'],
      ['other', '2'],
    ]);
    await store.discard('b3-1');
    await store.discard('never kept');
    expect((await store.list()).map((draft) => draft.id)).toEqual(['other']);
  });

  test.each(['../outside', '', 'a/b', 'x'.repeat(65), 'a.b'])('the name %j is refused', async (id) => {
    const store = draftStore(folder);
    expect(await store.keep({ ...note, id }, bytes('1'), minute(1))).toMatchObject({ kind: 'failed' });
    expect(await fs.readdir(parent)).toEqual([]);
  });

  test.each(['', 'no line feed', 'null\n', '{"title":"t"}\nbytes', 'not json\n'])(
    'a draft spoilt to %j is left out',
    async (text) => {
      const store = draftStore(folder);
      await store.keep(note, bytes('1'), minute(1));
      await fs.writeFile(join(folder, 'spoilt.draft'), text);
      expect((await store.list()).map((draft) => draft.id)).toEqual(['b3-1']);
    },
  );
});

test('the page can name only files that were given to it', () => {
  const given = references();
  const north = given.refer('/jobs/north.skewback');
  expect(north).toMatchObject({ name: 'north.skewback', folder: '/jobs' });
  expect(given.refer('/jobs/north.skewback').id).toBe(north.id);
  expect(given.pathOf(north.id)).toBe('/jobs/north.skewback');
  expect(given.pathOf('/etc/passwd')).toBeNull();
  expect(references().pathOf(north.id)).toBeNull();
});
