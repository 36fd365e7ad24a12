/** Verdicts from figures: each status, its figures and its words. */
import { describe, expect, test } from 'vitest';
import { jointsInWords } from '../../../core/checks/check.ts';
import { compressionOnly, type CompressionState } from '../../../core/checks/compression-only.ts';
import { headline } from '../../../core/checks/headline.ts';
import { crushing, sliding } from '../../../core/checks/joint-limits.ts';

describe('ring in compression alone', () => {
  const state: CompressionState = {
    stands: true,
    thickness: 0.4,
    share: 0.4,
    endlessThrust: false,
    altered: false,
    joints: [0, 6, 10],
    askedSafety: 2,
  };

  test('holds with at least the safety asked for', () => {
    const check = compressionOnly(state);
    expect(check).toMatchObject({ status: 'holds', limit: 0.4, utilisation: 0.4, unit: 'm', joints: [0, 6, 10] });
    expect(check.demand).toBeCloseTo(0.16, 12);
    expect(check.where).toBe('joints 0, 6 and 10');
    expect(check.because).toMatch(/geometric safety 2\.50, at least the 2(\.00)? asked for/);
  });

  test('holds just so at the safety asked for, and is narrow below it', () => {
    expect(compressionOnly({ ...state, share: 0.5 }).status).toBe('holds');
    expect(compressionOnly({ ...state, share: 0.51 }).status).toBe('narrow');
    expect(compressionOnly({ ...state, share: 0.51 }).because).toContain('less than');
  });

  test('fails where no line fits, with the thickness that would do', () => {
    const check = compressionOnly({ ...state, stands: false, share: 1.25 });
    expect(check).toMatchObject({ status: 'fails', utilisation: 1.25 });
    expect(check.because).toContain('0.500 m thick');
    expect(compressionOnly({ ...state, stands: false, share: null }).because).toContain('however thick');
  });

  test('a line down the very middle has all in hand', () => {
    expect(compressionOnly({ ...state, share: 0 })).toMatchObject({ status: 'holds', demand: 0, utilisation: 0 });
  });

  test('says when only endless thrust comes so near the middle', () => {
    expect(compressionOnly({ ...state, endlessThrust: true }).because).toContain('any thrust');
  });
});

describe('sliding and crushing', () => {
  test('sliding holds, fails, or is unknown', () => {
    const needed = { coefficient: 0.3, joints: [3] };
    expect(sliding(0.6, needed)).toMatchObject({ status: 'holds', demand: 0.3, limit: 0.6, utilisation: 0.5 });
    const fails = sliding(0.25, needed);
    expect(fails).toMatchObject({ status: 'fails', where: 'joint 3' });
    expect(fails.because).toContain('not guaranteed for real friction');
    expect(sliding(null, needed)).toMatchObject({ status: 'unknown', demand: 0.3, limit: null, utilisation: null });
    expect(sliding(0.6, null)).toMatchObject({ status: 'unknown', demand: null, limit: 0.6 });
  });

  test('crushing holds, fails, or is unknown', () => {
    const needed = { strength: 1.5, joint: 4 };
    expect(crushing(6, needed, true)).toMatchObject({
      status: 'holds',
      demand: 1.5,
      limit: 6,
      utilisation: 0.25,
      unit: 'MPa',
    });
    expect(crushing(1, needed, true)).toMatchObject({ status: 'fails', where: 'joint 4', utilisation: 1.5 });
    expect(crushing(null, needed, true)).toMatchObject({ status: 'unknown', utilisation: null });
    expect(crushing(6, null, false)).toMatchObject({ status: 'unknown', demand: null });
    expect(crushing(6, null, true).because).toContain('next to nothing');
  });

  test('unknown is never a pass', () => {
    for (const check of [
      sliding(null, null),
      crushing(null, null, false),
      crushing(null, { strength: 1, joint: 0 }, true),
    ]) {
      expect(check.status).toBe('unknown');
      expect(check.because).not.toBe('');
    }
  });
});

describe('the finding in a sentence', () => {
  const standing = { stands: true, geometricSafety: 1.9, least: 10.1, greatest: 24, alike: true };

  test('a ring that stands', () => {
    expect(headline(standing)).toMatch(/1\.90? times .* 10\.1 to 24\.0 kN on each side/);
  });

  test('thrust without limit, and thrust of one size', () => {
    expect(headline({ ...standing, greatest: null })).toContain('at least 10.1 kN');
    expect(headline({ ...standing, greatest: 10.1 })).not.toContain(' to ');
  });

  test('where sideways forces make the springings differ, the side is named', () => {
    expect(headline({ ...standing, alike: false })).toContain('on the left side');
  });

  test('a ring that falls makes no claim of thrust', () => {
    expect(headline({ ...standing, stands: false })).not.toContain('kN');
  });
});

test('joints in words', () => {
  expect([[], [4], [4, 10], [4, 10, 16]].map(jointsInWords)).toEqual([
    '',
    'joint 4',
    'joints 4 and 10',
    'joints 4, 10 and 16',
  ]);
});
