import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { builtFiles } from '../../../app/page/offline.ts';

test('every file of the build is listed by path and fingerprint, but not the worker that lists them', () => {
  const folder = mkdtempSync(join(tmpdir(), 'skewback-offline-'));
  mkdirSync(join(folder, 'assets'));
  for (const name of ['offline.js', 'index.html', join('assets', 'a-12345678.js')])
    writeFileSync(join(folder, name), 'abc');
  // SHA-256 of "abc": FIPS 180-2, appendix B.1.
  const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';
  expect(builtFiles(folder)).toEqual({ 'assets/a-12345678.js': abc, 'index.html': abc });
  rmSync(folder, { recursive: true });
});
