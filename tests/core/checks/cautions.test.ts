import { describe, expect, it } from 'vitest';
import { raisedCautions, standingCautions } from '../../../core/checks/cautions.ts';

const quiet = { stands: true, geometricSafety: 3.4, assumed: [] };
const assumed = (field: string) => ({ field, value: null, because: '' });
const ids = (facts: Parameters<typeof raisedCautions>[0]) => raisedCautions(facts).map(({ id }) => id);

it('always says whose judgement it serves and to keep clear of what moves', () => {
  expect(standingCautions.join(' ')).toMatch(/licensed or chartered engineer/);
  expect(standingCautions.join(' ')).toMatch(/Do not stand under, prop or take material/);
});

describe('cautions that an arch raises by itself', () => {
  it('are none for a stout ring with everything given', () => {
    expect(raisedCautions(quiet)).toEqual([]);
  });

  it('speak of the middle third from a geometric safety under three', () => {
    expect(ids({ ...quiet, geometricSafety: 2.99 })).toEqual(['outside-middle-third']);
    expect(ids({ ...quiet, geometricSafety: 3 })).toEqual([]);
  });

  it('say to keep clear where no line fits', () => {
    const [caution] = raisedCautions({ ...quiet, stands: false, geometricSafety: null });
    expect(caution).toMatchObject({ id: 'does-not-stand', text: expect.stringContaining('keep clear') });
  });

  it('name what of the material is not measured', () => {
    const [caution] = raisedCautions({
      ...quiet,
      assumed: [assumed('masonry.unitWeight'), assumed('masonry.friction'), assumed('supports')],
    });
    expect(caution).toMatchObject({
      id: 'default-material',
      text: expect.stringContaining('no unit weight or friction is given'),
    });
  });

  it('ask for the joints to be counted', () => {
    expect(ids({ ...quiet, assumed: [assumed('ring.voussoirs')] })).toEqual(['joints-not-counted']);
  });
});
