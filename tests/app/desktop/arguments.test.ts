import { resolve } from 'node:path';
import { expect, test } from 'vitest';
import { filesNamed } from '../../../app/desktop/arguments.ts';

const HOME = resolve('/home/mason');

test('the packed program is followed by the files', () => {
  expect(filesNamed(['skewback', 'north.skewback', '/jobs/south.skewback'], HOME, true)).toEqual([
    resolve(HOME, 'north.skewback'),
    resolve('/jobs/south.skewback'),
  ]);
});

test('from sources the project’s folder stands first and is no file', () => {
  expect(filesNamed(['electron', '/project', '--no-sandbox', 'north.skewback'], HOME, false)).toEqual([
    resolve(HOME, 'north.skewback'),
  ]);
});

test('switches are no files', () => {
  expect(filesNamed(['skewback', '--user-data-dir=/a', '-v', ''], HOME, true)).toEqual([]);
});
