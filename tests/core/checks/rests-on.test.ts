import { describe, expect, test } from 'vitest';
import { restsOn } from '../../../core/checks/rests-on.ts';
import { resolveScheme } from '../../../core/job/defaults.ts';
import { schemeFrom } from '../../support/assessed.ts';

const { assumed } = resolveScheme(
  schemeFrom({ profile: { shape: 'semicircular', span: 3 }, ring: { thickness: 0.4 } }),
);
const fields = (check: string): string[] => restsOn(check, assumed).map(({ field }) => field);

describe('what a check rests on', () => {
  test('begins with what it alone asks for', () => {
    expect(fields('ring.sliding')[0]).toBe('masonry.friction');
    expect(fields('ring.crushing')[0]).toBe('masonry.strength');
    expect(fields('ring.compression-only')[0]).toBe('asked.geometricSafety');
  });

  test('leaves out what only another check asks for', () => {
    expect(fields('ring.sliding')).not.toContain('masonry.strength');
    expect(fields('ring.crushing')).not.toContain('asked.geometricSafety');
  });

  test('has the joints and the weights under every check', () => {
    for (const check of ['ring.compression-only', 'ring.sliding', 'ring.crushing']) {
      expect(fields(check)).toEqual(expect.arrayContaining(['ring.voussoirs', 'masonry.unitWeight', 'above.kind']));
    }
  });

  test('takes no field for another that only begins alike', () => {
    const other = [{ field: 'ringing', value: 1, because: '' }];
    expect(restsOn('ring.sliding', other)).toEqual([]);
  });
});
