import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { MIGRATIONS, OLDEST_VERSION, migrated } from '../../../core/job/migrations.ts';
import type { Migration } from '../../../core/job/migrations.ts';
import { JOB_VERSION } from '../../../core/job/schema.ts';

describe('the table of migrations', () => {
  it('leads step by step to the present version', () => {
    expect(MIGRATIONS.map(({ from }) => from)).toEqual(
      Array.from({ length: JOB_VERSION - OLDEST_VERSION }, (_, index) => OLDEST_VERSION + index),
    );
    expect(OLDEST_VERSION + MIGRATIONS.length).toBe(JOB_VERSION);
  });

  it('reaches back to version 1, the first that was written', () => {
    expect(OLDEST_VERSION).toBe(1);
  });

  it('has a test for every entry, in tests/core/job/migrations/from-N.test.ts', () => {
    const untested = MIGRATIONS.filter(({ from }) => !existsSync(testOf(from)));
    expect(untested).toEqual([]);
  });
});

function testOf(from: number): string {
  return fileURLToPath(new URL(`migrations/from-${from}.test.ts`, import.meta.url));
}

describe('a document brought up to date', () => {
  const table: Migration[] = [
    { from: 1, changed: 'Depth is called breadth.', up: ({ depth, ...others }) => ({ ...others, breadth: depth }) },
    {
      from: 2,
      changed: 'Breadth is in metres.',
      up: (older) => ({ ...older, breadth: Number(older['breadth']) / 1_000 }),
    },
  ];

  it('takes every step from its own version on', () => {
    expect(migrated({ version: 1, depth: 600, kept: 'yes' }, 1, table)).toEqual({
      version: 3,
      breadth: 0.6,
      kept: 'yes',
    });
    expect(migrated({ version: 2, breadth: 600 }, 2, table)).toEqual({ version: 3, breadth: 0.6 });
  });

  it('is itself when it is of the present version', () => {
    const document = { version: 3, breadth: 0.6 };
    expect(migrated(document, 3, table)).toBe(document);
  });
});
