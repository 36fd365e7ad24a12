/**
 * A rule that cannot fire is worth nothing. Each rule of `.dependency-cruiser.cjs` has a small house here that breaks it,
 * with type-only imports wherever a floor could leak through one.
 */
import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

const project = fileURLToPath(new URL('../..', import.meta.url));
const config = join(project, '.dependency-cruiser.cjs');

interface Violation {
  readonly rule: string;
  readonly from: string;
  readonly to: string;
}

/** Import lines by file. Every package and file that they name is made, empty, unless its name says `absent`. */
type House = Readonly<Record<string, readonly string[]>>;

const typeImport = (from: string): string => `import type { A } from '${from}'; export type B = A;`;
const valueImport = (from: string): string => `import { a } from '${from}'; export const b = a;`;

/** What must not be, as `[rule, file, import, what it resolves to]`. */
const BROKEN: readonly (readonly [rule: string, file: string, line: string, to: string])[] = [
  ['no-cycles', 'core/quantity/one.ts', typeImport('./two.ts'), 'core/quantity/two.ts'],
  ['resolves', 'core/job/astray.ts', typeImport('./absent.ts'), './absent.ts'],
  ['core-ground-floor', 'core/job/up.ts', typeImport('../geometry/a.ts'), 'core/geometry/a.ts'],
  ['core-ground-floor', 'core/quantity/up.ts', typeImport('../assess/a.ts'), 'core/assess/a.ts'],
  ['core-geometry-floor', 'core/geometry/up.ts', typeImport('../loading/a.ts'), 'core/loading/a.ts'],
  ['core-geometry-floor', 'core/geometry/aside.ts', typeImport('../survey/a.ts'), 'core/survey/a.ts'],
  ['core-loading-floor', 'core/loading/up.ts', typeImport('../statics/a.ts'), 'core/statics/a.ts'],
  ['core-statics-floor', 'core/statics/up.ts', typeImport('../checks/a.ts'), 'core/checks/a.ts'],
  ['core-statics-floor', 'core/statics/far.ts', typeImport('../assess/a.ts'), 'core/assess/a.ts'],
  ['core-checks-floor', 'core/checks/up.ts', typeImport('../assess/a.ts'), 'core/assess/a.ts'],
  ['core-assess-floor', 'core/assess/up.ts', typeImport('../drawing/a.ts'), 'core/drawing/a.ts'],
  ['core-survey-floor', 'core/survey/up.ts', typeImport('../statics/a.ts'), 'core/statics/a.ts'],
  ['core-drawing-floor', 'core/drawing/up.ts', typeImport('../export/a.ts'), 'core/export/a.ts'],
  ['core-export-floor', 'core/export/aside.ts', typeImport('../attic/a.ts'), 'core/attic/a.ts'],
  ['core-rooms', 'core/drawing/attic.ts', typeImport('../attic/a.ts'), 'core/attic/a.ts'],
  ['core-rooms', 'renderer/panels/attic.ts', typeImport('../../core/attic/a.ts'), 'core/attic/a.ts'],
  ['core-stands-alone', 'core/assess/page.ts', typeImport('../../renderer/session/a.ts'), 'renderer/session/a.ts'],
  ['core-stands-alone', 'core/job/host.ts', typeImport('../../app/host.ts'), 'app/host.ts'],
  ['core-no-node', 'core/job/node.ts', typeImport('node:fs'), 'fs'],
  ['core-no-node', 'core/export/node.ts', typeImport('path'), 'path'],
  ['core-packages', 'core/drawing/konva.ts', typeImport('konva'), 'node_modules/konva/index.d.ts'],
  ['core-packages', 'core/job/svelte.ts', typeImport('svelte'), 'node_modules/svelte/index.d.ts'],
  ['core-packages', 'core/job/idb.ts', valueImport('idb'), 'node_modules/idb/index.d.ts'],
  ['core-packages', 'core/job/electron.ts', typeImport('electron'), 'node_modules/electron/index.d.ts'],
  ['renderer-host-contract', 'renderer/host/far.ts', typeImport('../../app/files/a.ts'), 'app/files/a.ts'],
  ['contract-types-only', 'renderer/host/value.ts', valueImport('../../app/host.ts'), 'app/host.ts'],
  ['contract-stands-alone', 'app/host.ts', typeImport('../core/job/a.ts'), 'core/job/a.ts'],
  ['renderer-no-node', 'renderer/host/node.ts', typeImport('node:os'), 'os'],
  ['session-under-screen', 'renderer/session/up.ts', typeImport('../panels/a.ts'), 'renderer/panels/a.ts'],
  ['konva-on-board', 'renderer/panels/konva.ts', typeImport('konva'), 'node_modules/konva/index.d.ts'],
  ['electron-in-shell', 'app/files/electron.ts', typeImport('electron'), 'node_modules/electron/index.d.ts'],
  ['electron-in-shell', 'renderer/host/electron.ts', typeImport('electron'), 'node_modules/electron/index.d.ts'],
  ['app-over-core', 'app/cli/page.ts', typeImport('../../renderer/session/a.ts'), 'renderer/session/a.ts'],
  ['files-under-shells', 'app/files/up.ts', typeImport('../desktop/a.ts'), 'app/desktop/a.ts'],
  ['tests-outside', 'core/job/tested.ts', typeImport('../../tests/a.ts'), 'tests/a.ts'],
];

/** What may be: the floors as they are meant. */
const SOUND: House = {
  'core/job/fine.ts': [typeImport('../quantity/a.ts'), valueImport('valibot')],
  'core/loading/fine.ts': [typeImport('../geometry/a.ts'), typeImport('../job/a.ts')],
  'core/assess/fine.ts': [valueImport('../checks/a.ts'), valueImport('../statics/a.ts')],
  'core/survey/fine.ts': [valueImport('../geometry/a.ts')],
  'core/export/fine.ts': [valueImport('../drawing/a.ts'), valueImport('../assess/a.ts')],
  'renderer/host/fine.ts': [typeImport('../../app/host.ts'), typeImport('../../core/job/a.ts')],
  'renderer/board/fine.ts': [valueImport('konva'), typeImport('../session/a.ts')],
  'app/desktop/fine.ts': [valueImport('electron'), valueImport('node:fs'), valueImport('../files/a.ts')],
  'app/cli/fine.ts': [valueImport('../../core/assess/a.ts'), valueImport('../files/a.ts')],
};

const PACKAGES = ['konva', 'electron', 'svelte', 'idb', 'valibot'];
const ROOMS = [
  ...['job', 'quantity', 'geometry', 'loading', 'statics', 'checks', 'assess'].map((room) => `core/${room}/a.ts`),
  ...['survey', 'drawing', 'export', 'attic'].map((room) => `core/${room}/a.ts`),
  ...['session', 'panels'].map((room) => `renderer/${room}/a.ts`),
  ...['app/files/a.ts', 'app/desktop/a.ts', 'app/host.ts', 'tests/a.ts'],
];

function build(folder: string, house: House): void {
  const write = (path: string, text: string): void => {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), text);
  };
  const empty = 'export type A = string; export const a = 1;\n';
  for (const path of ROOMS) write(path, empty);
  for (const name of PACKAGES) {
    write(`node_modules/${name}/package.json`, JSON.stringify({ name, version: '1.0.0', types: 'index.d.ts' }));
    write(`node_modules/${name}/index.d.ts`, 'export type A = string; export declare const a = 1;\n');
  }
  write(
    'package.json',
    JSON.stringify({ name: 'house', dependencies: Object.fromEntries(PACKAGES.map((name) => [name, '1.0.0'])) }),
  );
  write('tsconfig.json', JSON.stringify({ compilerOptions: { module: 'ESNext', moduleResolution: 'bundler' } }));
  for (const [path, lines] of Object.entries(house)) write(path, `${lines.join('\n')}\n`);
}

function violations(folder: string): Violation[] {
  const bin = join(project, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs');
  const run = spawnSync(process.execPath, [bin, '--config', config, '-T', 'json', 'app', 'core', 'renderer'], {
    cwd: folder,
    encoding: 'utf8',
  });
  const report = JSON.parse(run.stdout) as {
    summary: { violations: readonly { rule: { name: string }; from: string; to: string }[] };
  };
  return report.summary.violations.map(({ rule, from, to }) => ({ rule: rule.name, from, to }));
}

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'skewback-floors-'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('the floors', () => {
  let found: Violation[];
  beforeAll(() => {
    // The other half of the cycle.
    const house: Record<string, string[]> = { 'core/quantity/two.ts': [typeImport('./one.ts')] };
    for (const [, file, line] of BROKEN) (house[file] ??= []).push(line);
    build(join(folder, 'broken'), house);
    found = violations(join(folder, 'broken'));
  });

  test.each(BROKEN)('%s fires on %s', (rule, from, _line, to) => {
    expect(found).toContainEqual({ rule, from, to });
  });

  test('every rule has a house that breaks it', () => {
    const { forbidden } = createRequire(import.meta.url)(config) as { forbidden: readonly { name: string }[] };
    expect(new Set(BROKEN.map(([rule]) => rule))).toEqual(new Set(forbidden.map(({ name }) => name)));
  });

  test('none fires on a sound house', () => {
    build(join(folder, 'sound'), SOUND);
    expect(violations(join(folder, 'sound'))).toEqual([]);
  });
});
