/** The command line as a script uses it: spawned, its output and exit status read. */
import { spawn } from 'node:child_process';
import fs from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import type { Assessment } from '../../../core/assess/assessment.ts';
import { writeJobFile } from '../../../core/job/archive.ts';
import { readJob } from '../../../core/job/read.ts';

const project = fileURLToPath(new URL('../../..', import.meta.url));

interface Ran {
  readonly status: number | null;
  readonly answers: string;
  /** Lines of standard error. */
  readonly problems: readonly string[];
}

let folder: string;
beforeEach(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-cli-'));
});
afterEach(() => fs.rm(folder, { recursive: true, force: true }));

/** `npm run assess`, as npm runs it: in the project's folder, started from `folder`. */
function assess(words: readonly string[], input: string | Uint8Array = ''): Promise<Ran> {
  return new Promise((ended, failed) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'app/cli/main.ts', ...words], {
      cwd: project,
      env: { ...process.env, npm_lifecycle_event: 'assess', INIT_CWD: folder },
    });
    const heard = { out: '', err: '' };
    child.stdout.on('data', (chunk: Buffer) => (heard.out += chunk.toString()));
    child.stderr.on('data', (chunk: Buffer) => (heard.err += chunk.toString()));
    child.on('error', failed);
    child.on('close', (status) =>
      ended({ status, answers: heard.out, problems: heard.err.split('\n').filter((line) => line !== '') }),
    );
    child.stdin.on('error', () => undefined);
    child.stdin.end(input);
  });
}

/** A semicircular door of 3 m that stands on a ring of 0.4 m and not on one of 0.1 m. */
function door(thickness = 0.4, changes: object = {}): string {
  return barn({ id: 'a1', name: 'Barn' }, thickness, changes);
}

function barn(arch: object, thickness = 0.4, changes: object = {}): string {
  const scheme = {
    id: 's1',
    name: 'As found',
    profile: { shape: 'semicircular', span: 3 },
    ring: { thickness, voussoirs: 15 },
    breadth: 0.5,
    ...changes,
  };
  const job = {
    format: 'skewback.job',
    version: 1,
    title: 'Barn door',
    arches: [{ ...arch, schemes: [scheme] }],
  };
  return JSON.stringify(job);
}

async function file(name: string, content: string | Uint8Array): Promise<string> {
  await fs.writeFile(join(folder, name), content);
  return name;
}

const assessments = (ran: Ran): Assessment[] =>
  ran.answers
    .split('\n')
    .filter((line) => line !== '')
    .map((line) => JSON.parse(line) as Assessment);

describe('assessing', () => {
  test('says in plain words what was found, with the cautions', async () => {
    const ran = await assess([await file('door.json', door())]);
    expect(ran).toMatchObject({ status: 0, problems: [] });
    expect(ran.answers).toContain('Barn / As found');
    expect(ran.answers).toContain('Stands in compression alone');
    expect(ran.answers).toMatch(/assumed +masonry\.unitWeight/);
    expect(ran.answers).toContain('does not replace it');
  });

  test('--json prints one assessment a line and nothing else, for archives and bare files alike', async () => {
    const job = readJob(door());
    if (!job.ok) throw new Error('the example is no job');
    const names = [await file('a.json', door()), await file('b.skewback', writeJobFile(job.job))];
    const ran = await assess([...names, '--json', '--out', 'drawings']);
    expect(ran).toMatchObject({ status: 0, problems: [] });
    const [a, b] = assessments(ran);
    expect(a).toMatchObject({ format: 'skewback.assessment', version: 1, title: 'Barn door' });
    expect(b).toEqual(a);
    expect(await fs.readdir(join(folder, 'drawings'))).toHaveLength(2);
  });

  test('- reads standard input', async () => {
    const ran = await assess(['-', '--json'], door());
    expect(ran.status).toBe(0);
    expect(assessments(ran)[0]?.schemes[0]?.thrust.stands).toBe(true);
  });

  test('--strict tells by exit status 1 that a check fails, and 0 that none does', async () => {
    const [thin, thick] = [await file('thin.json', door(0.1)), await file('thick.json', door())];
    expect((await assess([thin])).status).toBe(0);
    expect((await assess([thin, '--strict'])).status).toBe(1);
    expect((await assess([thick, '--strict'])).status).toBe(0);
    expect((await assess([thick, thin, '--strict', '--json'])).status).toBe(1);
  });
});

describe('bad input', () => {
  test('each problem is one line: file, field path, what is wrong, what would be right', async () => {
    const ran = await assess([await file('bad.json', door(-0.4, { breadth: 'wide\nand deep' })), '--json']);
    expect(ran).toMatchObject({ status: 2, answers: '' });
    expect(ran.problems).toHaveLength(2);
    for (const field of ['ring.thickness', 'breadth']) {
      expect(ran.problems.filter((line) => line.startsWith(`bad.json: arches[0].schemes[0].${field}: `))).toHaveLength(
        1,
      );
    }
    for (const line of ran.problems) expect(line).toMatch(/^bad\.json: \S+: .+ \(found .+\); .+/);
  });

  test('one bad file among many is told of, and the others are assessed', async () => {
    const good = await file('good.json', door());
    const ran = await assess([good, await file('empty.json', ''), 'none.json', good, '--json', '--strict']);
    expect(ran.status).toBe(2);
    expect(assessments(ran)).toHaveLength(2);
    expect(ran.problems).toHaveLength(2);
    expect(ran.problems[0]).toMatch(/^empty\.json: /);
    expect(ran.problems[1]).toBe(
      'none.json: cannot be read: there is no such file or folder; give a .skewback file or a job.json',
    );
  });

  test.each([
    ['not JSON', '{"format": '],
    ['another format', '{"format": "other", "version": 1}'],
    ['a newer version', '{"format": "skewback.job", "version": 99}'],
    ['a picture', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0, 0, 0])],
    ['a broken archive', new Uint8Array([0x50, 0x4b, 3, 4, 0, 0, 0])],
    ['text for a number', door(0.4, { breadth: 'NaN' })],
    ['a load off the arch', door(0.4, { loads: [{ id: 'l1', kind: 'point', x: 40, force: 1 }] })],
    ['a thousand million voussoirs', door(0.4, { ring: { thickness: 0.4, voussoirs: 1e9 } })],
    ['a ring thicker than its radius', door(5)],
    ['a rise over half the span', door(0.4, { profile: { shape: 'segmental', span: 3, rise: 2 } })],
  ])('%s: exit status 2, nothing on standard output', async (_what, content) => {
    const ran = await assess([await file('bad.skewback', content), '--json']);
    expect(ran).toMatchObject({ status: 2, answers: '' });
    expect(ran.problems.length).toBeGreaterThan(0);
    for (const line of ran.problems) expect(line).toMatch(/^bad\.skewback: .+; .+/);
  });

  test('a file past 50 MB is refused at once', async () => {
    await file('large.json', '');
    await fs.truncate(join(folder, 'large.json'), 50 * 1024 * 1024);
    const ran = await assess(['large.json']);
    expect(ran.status).toBe(2);
    expect(ran.problems[0]).toContain('larger than 50 MB');
  });
});

describe('drawings', () => {
  test('--out makes the folder and writes a drawing of each scheme; same names do not clash', async () => {
    await fs.mkdir(join(folder, 'other'));
    const names = [await file('door.json', door()), await file('other/door.json', door(0.5))];
    const ran = await assess([...names, '--out', 'deep/er', '--formats', 'SVG']);
    expect(ran).toMatchObject({ status: 0, problems: [] });
    const written = await fs.readdir(join(folder, 'deep', 'er'));
    expect(written.sort()).toEqual(['door-barn-as-found-elevation-2.svg', 'door-barn-as-found-elevation.svg']);
    const [two, one] = await Promise.all(written.map((name) => fs.readFile(join(folder, 'deep', 'er', name), 'utf8')));
    expect(one).toMatch(/^<\?xml[^>]*>\s*<svg/);
    expect(one).not.toBe(two);
    expect(ran.answers).toContain(`written: ${join('deep', 'er', 'door-barn-as-found-elevation.svg')}`);
  });

  test('a name in a job leads nowhere outside the folder', async () => {
    const job = barn({ id: '../../a', name: '../../../etc/Barn' });
    const ran = await assess([await file('door.json', job), '--out', 'drawings']);
    expect(ran.status).toBe(0);
    expect(await fs.readdir(folder)).toEqual(['door.json', 'drawings']);
    expect(await fs.readdir(join(folder, 'drawings'))).toHaveLength(1);
  });

  test('a folder that cannot be written to is told of, and the assessment still comes', async () => {
    await file('drawings', 'a file in the way');
    const ran = await assess([await file('door.json', door()), '--out', 'drawings', '--json']);
    expect(ran.status).toBe(2);
    expect(assessments(ran)).toHaveLength(1);
    expect(ran.problems).toEqual([
      `${join('drawings', 'door-barn-as-found-elevation.svg')}: cannot be written: its folder cannot be made: there is already a file of that name; choose another folder for --out`,
    ]);
  });
});

describe('the words after the command', () => {
  test.each([
    [[], 'No file is given'],
    [['--json'], 'No file is given'],
    [['door.json', '--fast'], 'fast'],
    [['door.json', '--out'], 'out'],
    [['door.json', '--out', ''], '--out needs the name of a folder'],
    [['door.json', '--formats', 'svg'], '--out'],
    [['door.json', '--out', 'd', '--formats', 'svg,bmp'], 'there is no "bmp"; there is svg'],
    [['-', '-'], 'only once'],
  ])('%j is refused with the reason and the usage', async (words, reason) => {
    const ran = await assess(words);
    expect(ran).toMatchObject({ status: 2, answers: '' });
    expect(ran.problems[0]).toContain(reason);
    expect(ran.problems.join('\n')).toContain('Exit status: 0 assessed');
  });

  test('--help and --formats alone tell what there is', async () => {
    expect((await assess(['--help'])).answers).toContain('--strict');
    const ran = await assess(['--formats']);
    expect(ran).toMatchObject({ status: 0, problems: [] });
    expect(ran.answers.split('\n')).toContain('svg');
  });
});
