/** Floors and house rules that the linter and the compiler hold, each seen to fire. */
import { ESLint } from 'eslint';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import ts from 'typescript';
import tseslint from 'typescript-eslint';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';

const project = fileURLToPath(new URL('../..', import.meta.url));

describe('the linter', () => {
  // The files are not on disk, so the rules that ask the compiler about them rest.
  const linter = new ESLint({
    cwd: project,
    overrideConfig: [
      { ...tseslint.configs.disableTypeChecked },
      { languageOptions: { parserOptions: { projectService: false } } },
    ],
  });

  async function rulesBroken(filePath: string, text: string): Promise<(string | null)[]> {
    const [result] = await linter.lintText(text, { filePath: join(project, filePath) });
    return result!.messages.map(({ ruleId }) => ruleId);
  }

  const component = (line: string): string => `<script lang="ts">\n  ${line}\n  export type B = A;\n</script>\n`;
  const IMPORTS = '@typescript-eslint/no-restricted-imports';

  test.each([
    ['renderer/panels/Probe.svelte', "import type A from 'konva';"],
    ['renderer/panels/Probe.svelte', "import type { A } from 'konva/lib/Stage';"],
    ['renderer/board/Probe.svelte', "import type { A } from 'electron';"],
    ['renderer/panels/Probe.svelte', "import type { A } from 'node:fs';"],
    ['renderer/panels/Probe.svelte', "import type { A } from '../../app/preload/channels.ts';"],
    ['renderer/host/Probe.svelte', "import { A } from '../../app/host.ts';"],
  ])('in a component, %s may not say %s', async (path, line) => {
    expect(await rulesBroken(path, component(line))).toContain(IMPORTS);
  });

  test.each([
    ['renderer/board/Probe.svelte', "import type A from 'konva';"],
    ['renderer/host/Probe.svelte', "import type { A } from '../../app/host.ts';"],
    ['renderer/panels/Probe.svelte', "import type { A } from '../../core/assess/assessment.ts';"],
  ])('in a component, %s may say %s', async (path, line) => {
    expect(await rulesBroken(path, component(line))).not.toContain(IMPORTS);
  });

  test.each([
    ['core/job/probe.ts', 'export const a = console;', 'no-restricted-globals'],
    ['core/job/probe.ts', 'export const a = document;', 'no-restricted-globals'],
    ['renderer/panels/probe.ts', 'export type A = Electron.BrowserWindow;', 'no-restricted-syntax'],
    ['core/job/probe.ts', "export type A = import('konva').default;", '@typescript-eslint/consistent-type-imports'],
    ['core/job/probe.ts', 'export const a: any = 1;', '@typescript-eslint/no-explicit-any'],
    ['core/job/probe.ts', '// @ts-ignore\nexport const a = 1;', '@typescript-eslint/ban-ts-comment'],
    ['core/job/probe.ts', '// hack: mend later\nexport const a = 1;', 'no-warning-comments'],
    ['core/job/probe.ts', '// eslint-disable-next-line no-var\nexport var a = 1;', 'no-var'],
    [
      'tests/core/probe.test.ts',
      "import { test } from 'vitest';\ntest.only('a', () => undefined);",
      'no-restricted-syntax',
    ],
    ['core/job/probe.ts', 'export const a = 1;\n'.repeat(400), 'max-lines'],
  ])('%s may not say %j', async (path, text, rule) => {
    expect(await rulesBroken(path, text)).toContain(rule);
  });
});

describe('the core is compiled without page and without Node', () => {
  let folder: string;
  beforeAll(() => {
    folder = mkdtempSync(join(project, 'node_modules', '.probe-'));
  });
  afterAll(() => rmSync(folder, { recursive: true, force: true }));

  function complaints(text: string): number {
    const file = join(folder, 'probe.ts');
    writeFileSync(file, text);
    const read = ts.readConfigFile(join(project, 'core', 'tsconfig.json'), (path) => ts.sys.readFile(path));
    const { options } = ts.parseJsonConfigFileContent(read.config, ts.sys, join(project, 'core'));
    const program = ts.createProgram([file], options);
    return program.getSemanticDiagnostics(program.getSourceFile(file)).length;
  }

  test('what computes compiles', () => {
    expect(complaints('export const a = new Map([[1, Math.hypot(3, 4)]]).get(1);')).toBe(0);
  });

  test.each(['document', 'window', 'process', 'Buffer', 'console', 'setTimeout', 'fetch', 'performance'])(
    'the global %s does not',
    (name) => {
      expect(complaints(`export const a = ${name};`)).toBe(1);
    },
  );

  test('a type of the page does not', () => {
    expect(complaints('export type A = HTMLElement;')).toBe(1);
  });
});
