/** What is laid over the elevation to show one answer, and the small figures beside it. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { movementPatterns } from '../../../core/assess/further.ts';
import { axleEnvelope, spreadLeft } from '../../../core/assess/long-questions.ts';
import { lineAtShare, lineThrough, movement, type JointReport } from '../../../core/assess/questions.ts';
import { axleFigure } from '../../../core/drawing/axle-figure.ts';
import { elevationSheet } from '../../../core/drawing/elevation-sheet.ts';
import { elevation } from '../../../core/drawing/elevation.ts';
import { mechanismFrame, motionsOfOpenings, movedRing, patternFrame } from '../../../core/drawing/moved-ring.ts';
import type { LayerName, PathItem, Scene, TextItem } from '../../../core/drawing/scene.ts';
import { spreadFigure } from '../../../core/drawing/spread-figure.ts';
import { stressBlockFigure } from '../../../core/drawing/stress-figure.ts';
import { anySurveyedArch, fordBridge, northDoor, SHEET_TITLE, thinRing } from './arches.ts';
import { faultsOf, letteringOf, overlapsIn } from './overlaps.ts';

const AT_1_20 = { millimetresPerMetre: 50 };
const layerNames = (scene: Scene) => scene.layers.map(({ name }) => name);
const itemsIn = (scene: Scene, layer: LayerName) => scene.layers.find(({ name }) => name === layer)?.items ?? [];
const pathsOf = (scene: Scene, layer: LayerName, role: string): PathItem[] =>
  itemsIn(scene, layer).filter((item): item is PathItem => item.kind === 'path' && item.role === role);
const words = (scene: Scene): string =>
  scene.layers
    .flatMap(({ items }) => items.filter((item): item is TextItem => item.kind === 'text').map(({ text }) => text))
    .join(' ');

const through = (arch: ReturnType<typeof northDoor>, share: number) =>
  lineThrough(arch.built, [
    { joint: 0, share: 0.5 },
    { joint: Math.floor(arch.ring.blocks.length / 2), share },
    { joint: arch.ring.blocks.length, share: 0.5 },
  ]);

describe('a chosen line', () => {
  it('is one solid line through its points, in its own layer', () => {
    const arch = northDoor();
    const { line } = lineAtShare(arch.built, 0.4)!;
    const scene = elevation(arch, { ...AT_1_20, chosen: { line, label: 'chosen, 28 kN' } });
    const [path] = pathsOf(scene, 'thrust-chosen', 'thrust-chosen');
    expect([path!.start, ...path!.edges.map(({ to }) => to)]).toEqual(line);
    expect(pathsOf(scene, 'thrust-chosen', 'thrust-outside')).toEqual([]);
    expect(words(scene)).toContain('chosen, 28 kN');
  });

  it('is marked at every joint where it has left the ring, and lettered by how much where it is furthest', () => {
    const arch = northDoor();
    const { line, outside } = through(arch, 0.5)!;
    expect(outside.length).toBeGreaterThan(1);
    const scene = elevation(arch, { ...AT_1_20, chosen: { line, label: '' } });
    const marks = pathsOf(scene, 'thrust-chosen', 'thrust-outside').filter(({ closed }) => !closed);
    expect(marks.map(({ about }) => about)).toEqual(outside.map(({ joint }) => ({ kind: 'joint', joint })));
    marks.forEach((mark, i) => {
      const { joint, side, by } = outside[i]!;
      expect(mark.start).toEqual(arch.built.joints[joint]![side]);
      expect(Math.hypot(mark.edges[0]!.to.x - mark.start.x, mark.edges[0]!.to.y - mark.start.y)).toBeCloseTo(by, 9);
    });
    const furthest = Math.max(...outside.map(({ by }) => by));
    expect(words(scene)).toContain(`${Math.round(furthest * 1000)} mm outside`);
  });
});

describe('a moved ring', () => {
  const arch = fordBridge();
  const answer = movement(arch.built, { side: 'right', dx: 0, dy: -0.01, turn: 0 });
  const openings = answer.kind === 'opens' ? answer.openings : [];
  const ring = movedRing(arch, motionsOfOpenings(arch, openings, 'right'), 20);
  const scene = elevation(arch, { millimetresPerMetre: 25, moved: { ring, label: 'right springing sunk 10 mm' } });

  it('shows its stones, the gaps with their widths and where it was, and none of the states of the ring as it stands', () => {
    expect(pathsOf(scene, 'voussoirs', 'moved-stone').map(({ start }) => start)).toEqual(
      ring.outlines.map(({ start }) => start),
    );
    expect(pathsOf(scene, 'openings', 'opening-gap')).toHaveLength(openings.length);
    expect(pathsOf(scene, 'as-it-was', 'as-it-was')).toHaveLength(1);
    for (const layer of ['thrust-least', 'thrust-greatest', 'thrust-band', 'reactions', 'dimensions', 'mechanism'])
      expect(layerNames(scene)).not.toContain(layer);
    expect(words(scene)).toContain('right springing sunk 10 mm, drawn 20 times as large');
  });

  it('moves the support that moved and leaves the other', () => {
    expect(ring.placements[0]).toMatchObject({ dx: expect.closeTo(0, 9), dy: expect.closeTo(0, 9) });
    const { intrados } = arch.ring.joints.at(-1)!;
    const [, right] = pathsOf(scene, 'supports', 'support');
    expect(right!.start.y).toBeLessThan(intrados.y - 0.15);
  });

  it('gives no widths where the size of the movement is not known', () => {
    const fall = elevation(thinRing(), { ...AT_1_20, moved: { ring: mechanismFrame(thinRing(), 1)!, label: 'falls' } });
    expect(words(fall)).toContain('falls, not to scale');
    expect(words(fall)).not.toContain(' mm');
  });

  it('can show each movement that may have cracked it', () => {
    for (const pattern of movementPatterns(arch.built)) {
      const frame = patternFrame(arch, pattern, 1)!;
      expect(frame.openings.length).toBeGreaterThanOrEqual(2);
      const still = pattern.kind.startsWith('right-') ? frame.placements[0] : frame.placements.at(-1);
      expect(still).toMatchObject({ dx: expect.closeTo(0, 9), dy: expect.closeTo(0, 9), sin: expect.closeTo(0, 9) });
    }
  });
});

it('goes onto a sheet with its legend, in place of what it hides', () => {
  const fall = { ring: mechanismFrame(thinRing(), 1)!, label: 'begins to fall' };
  const sheet = elevationSheet(thinRing(), SHEET_TITLE, { overlays: { moved: fall } });
  const lettered = letteringOf(sheet).map(({ text }) => text);
  expect(lettered).toEqual(
    expect.arrayContaining([
      'begins to fall, not to scale',
      'Ring before the movement',
      'Joint that opens, in contact at the dot',
    ]),
  );
  expect(lettered).not.toContain('Hinge of the mechanism');
  expect(faultsOf(sheet)).toEqual([]);
  const { line } = lineAtShare(fordBridge().built, 0.5)!;
  const chosen = elevationSheet(fordBridge(), SHEET_TITLE, {
    overlays: { chosen: { line, label: 'half way' } },
    paper: 'A4',
  });
  expect(letteringOf(chosen).map(({ text }) => text)).toEqual(
    expect.arrayContaining(['half way', 'Chosen line of thrust']),
  );
  expect(faultsOf(chosen)).toEqual([]);
});

it('leaves off the layers that are hidden, and changes nothing else', () => {
  const all = elevation(northDoor(), AT_1_20);
  const some = elevation(northDoor(), { ...AT_1_20, hide: ['thrust-band', 'dimensions'] });
  expect(some.layers).toEqual(all.layers.filter(({ name }) => name !== 'thrust-band' && name !== 'dimensions'));
});

it('keeps lettering apart under every overlay', () => {
  fc.assert(
    fc.property(anySurveyedArch, fc.double({ min: 0, max: 1, noNaN: true }), (arch, share) => {
      const scale = {
        millimetresPerMetre: 120 / (arch.ring.joints.at(-1)!.intrados.x - arch.ring.joints[0]!.intrados.x),
      };
      const report = through(arch, share);
      if (report !== null)
        expect(
          overlapsIn(elevation(arch, { ...scale, chosen: { line: report.line, label: 'drawn by hand' } })),
        ).toEqual([]);
      const answer = movement(arch.built, { side: 'left', dx: -0.02, dy: 0, turn: 0 });
      if (answer.kind !== 'opens') return;
      const ring = movedRing(arch, motionsOfOpenings(arch, answer.openings), 3);
      expect(overlapsIn(elevation(arch, { ...scale, moved: { ring, label: 'spread by 20 mm' } }))).toEqual([]);
    }),
    { numRuns: 40, seed: 20260514 },
  );
});

describe('the stress on a joint', () => {
  const arch = northDoor();
  const reports = [0, 0.3, 1].flatMap((share) => lineAtShare(arch.built, share)!.joints);
  const inside = reports.filter(({ stress }) => stress !== null);

  it('hangs a block under its compressed part only, as deep at each end as the stress there', () => {
    for (const report of inside) {
      const scene = stressBlockFigure(report, { strength: 5.8 });
      const { compressed, intradosStress, extradosStress } = report.stress!;
      const [block] = pathsOf(scene, 'stress', 'stress-block');
      const [a, b, c, d] = [block!.start, ...block!.edges.map(({ to }) => to)];
      const [joint] = pathsOf(scene, 'joints', 'ring-edge');
      const width = joint!.edges[0]!.to.x - joint!.start.x;
      expect((d!.x - a.x) / width).toBeCloseTo(compressed / report.length, 9);
      expect(b!.y * extradosStress).toBeCloseTo(c!.y * intradosStress, 6);
    }
  });

  it('points the resultant at the place where it crosses', () => {
    for (const report of inside) {
      const scene = stressBlockFigure(report, { strength: null });
      const [head] = pathsOf(scene, 'reactions', 'reaction-head');
      const [joint] = pathsOf(scene, 'joints', 'ring-edge');
      expect(head!.start.x / (joint!.edges[0]!.to.x - joint!.start.x)).toBeCloseTo(report.share!, 9);
    }
  });

  it('sets the greater stress against the strength, and says so when a joint cannot carry at all', () => {
    const report: JointReport = {
      joint: 3,
      at: { x: 0, y: 0 },
      share: 0.25,
      length: 0.4,
      normal: 48,
      shear: -6,
      friction: 0.125,
      // e = 0.1 m of t = 0.4 m: pressed over 3 (0.2 − 0.1) = 0.3 m, 2 × 48 / (0.6 × 0.3) = 533 kN/m²
      stress: { eccentricity: 0.1, compressed: 0.3, intradosStress: 1600 / 3, extradosStress: 0 },
    };
    const scene = stressBlockFigure(report, { strength: 5.8 });
    for (const text of ['533 kPa of 5 800', 'e 0.10 m', 'open at the extrados', 'Joint 3'])
      expect(words(scene).replace(/\s/g, ' ')).toContain(text);
    const gone = stressBlockFigure({ ...report, share: 1.1, stress: null }, { strength: 5.8 });
    expect(words(gone)).toContain('passes 0.04 m outside');
    expect(pathsOf(gone, 'stress', 'stress-block')).toEqual([]);
    const along = stressBlockFigure({ ...report, share: null, at: null, stress: null }, { strength: 5.8 });
    expect(words(along)).toContain('runs along the joint');
  });

  it('keeps its lettering apart on every joint of every line', () => {
    const wild = [0, 0.5, 1].flatMap((share) => through(arch, share)?.joints ?? []);
    for (const report of [...reports, ...wild])
      expect(overlapsIn(stressBlockFigure(report, { strength: 5.8 }))).toEqual([]);
  });
});

describe('the spread left', () => {
  const curve = [0, 0.1, 0.2, 0.3].map((spread) => ({ spread, horizontal: 20 + 100 * spread }));

  it('draws thrust against spread to the place where the ring falls', () => {
    const scene = spreadFigure({ collapse: 0.3, furthest: 0.5, curve });
    const [line] = pathsOf(scene, 'curve', 'curve');
    expect(line!.edges).toHaveLength(3);
    expect(words(scene)).toContain('falls at 300 mm, 50.0 kN');
    expect(words(scene)).toContain('now 20.0 kN');
    const [mark] = pathsOf(scene, 'curve', 'curve-limit');
    expect(mark!.start.x).toBeCloseTo(line!.edges.at(-1)!.to.x, 9);
  });

  it('says that it still stands where no spread that was tried brings it down', () => {
    expect(words(spreadFigure({ collapse: null, furthest: 0.3, curve }))).toContain('still stands at 300 mm');
  });

  it('marks the spread of a slider on the curve, between two of its points', () => {
    const scene = spreadFigure({ collapse: 0.3, furthest: 0.5, curve }, undefined, 0.15);
    const [dot] = pathsOf(scene, 'curve', 'load-head');
    const [line] = pathsOf(scene, 'curve', 'curve');
    const [a, b] = [line!.edges[0]!.to, line!.edges[1]!.to];
    expect(dot!.edges[0]!.to.x + 0.9).toBeCloseTo((a.x + b.x) / 2, 6);
    expect(dot!.start.y).toBeCloseTo((a.y + b.y) / 2, 6);
  });

  it('is lettered without overlaps for a real ring', () => {
    const { collapse, places } = spreadLeft(northDoor().built, { x: -1, y: 0 }, 1.6, () => true)!;
    const real = places.map(({ moved, horizontal }) => ({ spread: moved, horizontal }));
    expect(overlapsIn(spreadFigure({ collapse, furthest: 1.6, curve: real }))).toEqual([]);
  });
});

describe('an axle crossing', () => {
  it('marks the least factor at its place and cuts what is far over it', () => {
    const places = [-2, -1, 0, 1, 2].map((x, i) => ({ x, factor: [9, 3, 500, 2.5, null][i]!, hinges: [] }));
    const scene = axleFigure({ places, worst: places[3]! });
    expect(words(scene)).toContain('least 2.50 at x = 1.00 m');
    expect(pathsOf(scene, 'curve', 'curve')).toHaveLength(2);
    expect(overlapsIn(scene)).toEqual([]);
  });

  it('says so where no place has a limit', () => {
    const places = [-1, 0, 1].map((x) => ({ x, factor: null, hinges: [] }));
    expect(words(axleFigure({ places, worst: null }))).toContain('no place has a limit');
  });

  it('is lettered without overlaps for a real bridge', () => {
    const envelope = axleEnvelope(fordBridge().built, { force: 60, patch: 0.3, dispersal: 0.5 }, 60, () => true)!;
    expect(overlapsIn(axleFigure(envelope))).toEqual([]);
    expect(axleFigure(envelope)).toEqual(axleFigure(envelope));
  });
});
