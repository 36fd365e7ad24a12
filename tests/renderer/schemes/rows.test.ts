import { describe, expect, test } from 'vitest';
import { setThickness } from '../../../core/job/edits.ts';
import type { Arch } from '../../../core/job/schema.ts';
import { changeRows, findingRows } from '../../../renderer/schemes/rows.ts';
import { outcomeOf } from '../../../renderer/session/assessed.ts';
import { schemeFrom } from '../../support/assessed.ts';

const found = schemeFrom({ profile: { shape: 'semicircular', span: 3 }, ring: { thickness: 0.3, voussoirs: 20 } });
const arch: Arch = {
  id: 'a1',
  schemes: [
    found,
    { ...setThickness(found, 0.5), id: 's2' },
    { ...found, id: 's3' },
    { ...setThickness(found, 0.1), id: 's4' },
  ],
};
const findings = findingRows(arch.schemes.map((scheme) => outcomeOf(arch, scheme)));
const row = (id: string) => findings.find((one) => one.id === id)!;

describe('the table of schemes', () => {
  test('marks what was changed against the arch as found, and shows its value elsewhere', () => {
    const [thickness, ...others] = changeRows(arch);
    expect(others).toEqual([]);
    expect(thickness?.name).toBe('Thickness');
    expect(thickness?.cells.map(({ changed }) => changed)).toEqual([false, true, false, true]);
    expect(thickness?.cells.map(({ text }) => text.replace(/\s/gu, ' '))).toEqual(['0.3 m', '0.5 m', '0.3 m', '0.1 m']);
  });

  test('gives each check its status, and no check as passed that was not', () => {
    expect(row('ring.compression-only').cells.map(({ status }) => status)).toEqual([
      'narrow',
      'holds',
      'narrow',
      'fails',
    ]);
    expect(row('ring.crushing').cells.every(({ status }) => status !== 'holds')).toBe(true);
  });

  test('tells how far a figure is from that of the first, where it differs', () => {
    const { cells } = row('safety');
    expect(cells[1]!.change).toMatch(/^\+\d+ %$/);
    expect(cells[2]!.change).toBe('');
    expect(cells[3]!.text).toBe('does not stand');
  });
});
