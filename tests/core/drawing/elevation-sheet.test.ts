import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { standingCautions } from '../../../core/checks/cautions.ts';
import { elevationSheet } from '../../../core/drawing/elevation-sheet.ts';
import { scaleBar } from '../../../core/drawing/scale-bar.ts';
import { SCALES } from '../../../core/drawing/papers.ts';
import type { SceneItem } from '../../../core/drawing/scene.ts';
import type { Sheet } from '../../../core/drawing/sheet.ts';
import { anyArch, assessed, northDoor, SHEET_TITLE, thinRing } from './arches.ts';
import { faultsOf, letteringOf } from './overlaps.ts';

const itemsOf = (sheet: Sheet): SceneItem[] =>
  sheet.views.flatMap(({ scene }) => scene.layers.flatMap(({ items }) => [...items]));
const wordsOf = (sheet: Sheet): string =>
  letteringOf(sheet)
    .map(({ text }) => text)
    .join(' ');

describe('lettering of a sheet', () => {
  it('never lies on other lettering nor leaves the frame, whatever the arch and its loads', () => {
    fc.assert(
      fc.property(anyArch, fc.constantFrom(undefined, 'A4' as const, 'A2' as const), (arch, paper) => {
        expect(faultsOf(elevationSheet(arch, SHEET_TITLE, paper === undefined ? {} : { paper }))).toEqual([]);
      }),
      { numRuns: 150, seed: 20260514 },
    );
  });

  it('keeps to its places with texts as long as a file may have', () => {
    const long = 'Very long name '.repeat(1300);
    const arch = assessed({
      profile: { shape: 'semicircular', span: 3.2 },
      ring: { thickness: 0.42 },
      masonry: { name: long },
      loads: [
        { id: 'l1', name: long, kind: 'point', x: 0.4, force: 12 },
        { id: 'l2', name: '橋'.repeat(20_000), kind: 'strip', from: -1, to: 0.5, intensity: 8 },
      ],
    });
    const title = {
      ...SHEET_TITLE,
      title: long,
      subtitle: 'x'.repeat(20_000),
      owner: long,
      number: long,
      surveyedOn: long,
    };
    expect(faultsOf(elevationSheet(arch, title))).toEqual([]);
  });
});

describe('what every sheet says', () => {
  it.each([
    ['standing', northDoor()],
    ['falling', thinRing()],
  ])('prints every standing caution, the finding and the checks: %s', (_, arch) => {
    const words = wordsOf(elevationSheet(arch, SHEET_TITLE));
    for (const caution of standingCautions) expect(words).toContain(caution.slice(0, 40));
    for (const { title, status } of arch.result.checks) expect(words).toMatch(new RegExp(`${status} ${title}`));
    expect(words).toContain(arch.result.thrust.stands ? 'Stands in compression alone' : 'Does not stand');
    expect(words).toContain('Harrowmere Mill, undercroft');
  });

  it('lists what fails first', () => {
    const words = wordsOf(elevationSheet(thinRing(), SHEET_TITLE));
    expect(words.indexOf('fails')).toBeLessThan(words.indexOf('unknown'));
  });

  it('lists what was assumed', () => {
    expect(wordsOf(elevationSheet(thinRing(), SHEET_TITLE))).toContain('No friction is given; 0.6 is taken');
    const count = thinRing().result.assumed.length;
    expect(wordsOf(elevationSheet(thinRing(), SHEET_TITLE, { paper: 'A4' }))).toContain(`Assumed, not given: ${count}`);
  });

  it('explains in the legend what is drawn and nothing else', () => {
    const standing = wordsOf(elevationSheet(northDoor(), SHEET_TITLE));
    const falling = wordsOf(elevationSheet(thinRing(), SHEET_TITLE));
    expect(standing).toContain('Line of least thrust');
    expect(standing).not.toContain('Hinge of the mechanism');
    expect(falling).toContain('Hinge of the mechanism');
    expect(falling).not.toContain('Line of least thrust');
  });

  it('says where another font may stand in', () => {
    const note = 'another font may stand in';
    expect(wordsOf(elevationSheet(northDoor(), SHEET_TITLE))).not.toContain(note);
    expect(wordsOf(elevationSheet(northDoor(), { ...SHEET_TITLE, title: 'جسر 橋' }))).toContain(note);
  });
});

describe('scale', () => {
  it('is the largest standard one that fits the paper', () => {
    const arch = northDoor();
    const on = (paper: 'A4' | 'A3' | 'A2') =>
      elevationSheet(arch, SHEET_TITLE, { paper }).views[0]?.scene.millimetresPerUnit;
    expect([on('A4'), on('A3'), on('A2')]).toEqual([20, 50, 50]);
    expect(wordsOf(elevationSheet(arch, SHEET_TITLE, { paper: 'A3' }))).toContain('Elevation 1:20');
  });

  it('has a bar of exactly the length that it states, at every scale', () => {
    for (const { millimetresPerMetre } of SCALES) {
      const bar = scaleBar(millimetresPerMetre, 24, 60);
      const boxes = bar.items.filter((item) => item.kind === 'path' && item.closed);
      const xs = boxes.flatMap((item) =>
        item.kind === 'path' ? [item.start.x, ...item.edges.map(({ to }) => to.x)] : [],
      );
      const last = bar.items.findLast((item) => item.kind === 'text');
      const [value, unit] = (last?.kind === 'text' ? last.text : '').split(' ');
      const stated = Number(value?.replaceAll('\u2009', '')) / (unit === 'mm' ? 1000 : 1);
      expect(stated).toBeCloseTo(bar.metres, 12);
      expect(Math.max(...xs) - Math.min(...xs)).toBeCloseTo(stated * millimetresPerMetre, 9);
      expect(bar.length).toBeGreaterThan(35);
      expect(bar.length).toBeLessThanOrEqual(100 + 1e-9);
    }
  });

  it('is drawn on A3 unless told otherwise, and says on what', () => {
    expect(elevationSheet(northDoor(), SHEET_TITLE).paper).toEqual({ name: 'A3', width: 420, height: 297 });
    expect(wordsOf(elevationSheet(northDoor(), SHEET_TITLE, { paper: 'A4' }))).toContain('1:50 on A4');
  });
});

it('is the same sheet every time', () => {
  expect(elevationSheet(northDoor(), SHEET_TITLE)).toEqual(elevationSheet(northDoor(), SHEET_TITLE));
});

it('has lettering of ISO 3098 heights only', () => {
  const heights = itemsOf(elevationSheet(northDoor(), SHEET_TITLE)).flatMap((item) =>
    item.kind === 'text' ? [item.height] : [],
  );
  expect(new Set(heights)).toEqual(new Set([1.8, 2.5, 3.5]));
});
