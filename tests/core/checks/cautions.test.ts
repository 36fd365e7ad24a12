import { describe, expect, it } from 'vitest';
import { raisedCautions, standingCautions } from '../../../core/checks/cautions.ts';
import type { CrackReading } from '../../../core/checks/crack-reading.ts';
import { resolveScheme } from '../../../core/job/defaults.ts';
import type { Crack, Scheme } from '../../../core/job/schema.ts';

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

const scheme = (changes: Partial<Scheme>) =>
  resolveScheme({
    id: 's1',
    profile: { shape: 'semicircular', span: 3.2 },
    ring: { thickness: 0.4, voussoirs: 20 },
    breadth: 0.6,
    ...changes,
  }).resolved;
const seen = (...marks: Partial<Crack>[]) =>
  scheme({ cracks: marks.map((mark, i) => ({ id: `c${i}`, face: 'intrados', seenOn: '2026-05-14', ...mark })) });
const reading = (kind: 'spreading' | 'closing', verdict: CrackReading['verdict']): CrackReading => ({
  verdict,
  because: '',
  ranking: [{ pattern: { kind, x: null, openings: [] }, alike: [], score: 0.9, explains: 3, unseen: 0 }],
});

describe('cautions of what was seen and entered', () => {
  it('say to keep clear when three joints or more stand open', () => {
    expect(ids({ ...quiet, scheme: seen({ joint: 0 }, { joint: 10 }) })).toEqual([]);
    const [caution] = raisedCautions({ ...quiet, scheme: seen({ joint: 0 }, { joint: 10 }, { joint: 20 }) });
    expect(caution).toMatchObject({ id: 'hinges-seen', text: expect.stringMatching(/3 joints.*Keep clear/) });
  });

  it('count marks at one joint once, however they are placed', () => {
    expect(ids({ ...quiet, scheme: seen({ joint: 0 }, { joint: 10 }, { along: 0.5 }, { joint: 10 }) })).toEqual([]);
  });

  it('ask for dates, and speak of a spread where the marks do', () => {
    const undated = seen({ joint: 10, seenOn: ' ' }, { joint: 3 });
    expect(ids({ ...quiet, scheme: undated })).toEqual(['cracks-undated']);
    expect(ids({ ...quiet, scheme: undated, cracks: reading('spreading', 'clear') })).toEqual(['spread-undated']);
    expect(ids({ ...quiet, scheme: undated, cracks: reading('closing', 'clear') })).toEqual(['cracks-undated']);
    expect(ids({ ...quiet, scheme: undated, cracks: reading('spreading', 'none-fits') })).toEqual(['cracks-undated']);
    expect(ids({ ...quiet, scheme: seen({ joint: 10 }), cracks: reading('spreading', 'clear') })).toEqual([]);
  });

  it.each<[string, Partial<Scheme>]>([
    ['backing-counted', { backing: { level: 0.5, counts: 'masonry' } }],
    ['rings-together', { ring: { thickness: 0.4, voussoirs: 20, courses: 3 } }],
    ['side-pressure', { above: { kind: 'fill', height: 0.5, sidePressure: 0.3 } }],
  ])('name what the result relies on and the face does not show: %s', (id, changes) => {
    expect(ids({ ...quiet, scheme: scheme(changes) })).toEqual([id]);
  });

  it('say nothing of backing that is weight only', () => {
    expect(ids({ ...quiet, scheme: scheme({ backing: { level: 0.5, counts: 'weight' } }) })).toEqual([]);
  });
});
