/** What a survey adds to the elevation: courses, lost mortar, backing, layers, openings, axles, tapers and cracks. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { elevationSheet } from '../../../core/drawing/elevation-sheet.ts';
import { elevation } from '../../../core/drawing/elevation.ts';
import { legendEntries } from '../../../core/drawing/legend.ts';
import type { LayerName, PathItem, Scene, TextItem } from '../../../core/drawing/scene.ts';
import type { Point } from '../../../core/geometry/point.ts';
import { anySurveyedArch, assessed, fordBridge, SHEET_TITLE } from './arches.ts';
import { faultsOf } from './overlaps.ts';

const AT_1_40 = { millimetresPerMetre: 25 };
const itemsIn = (scene: Scene, layer: LayerName) => scene.layers.find(({ name }) => name === layer)?.items ?? [];
const pathsOf = (scene: Scene, layer: LayerName, role: string): PathItem[] =>
  itemsIn(scene, layer).filter((item): item is PathItem => item.kind === 'path' && item.role === role);
const wordsIn = (scene: Scene, layer: LayerName): string[] =>
  itemsIn(scene, layer)
    .filter((item): item is TextItem => item.kind === 'text')
    .map(({ text }) => text);
const pointsOf = ({ start, edges }: PathItem): Point[] => [start, ...edges.map(({ to }) => to)];
const gap = (a: Point, b: Point): number => Math.hypot(a.x - b.x, a.y - b.y);

/** A semicircle of 2 m span and 0.4 m thickness: every radius can be told by head. */
const plain = (changes: Partial<Parameters<typeof assessed>[0]> = {}) =>
  assessed({
    profile: { shape: 'semicircular', span: 2 },
    ring: { thickness: 0.4, voussoirs: 20 },
    above: { kind: 'fill', height: 0.6, unitWeight: 18 },
    ...changes,
  });

describe('courses', () => {
  it('lie at even shares of the thickness, round the centre of the ring: radii 1.1, 1.2 and 1.3 m of four', () => {
    const scene = elevation(plain({ ring: { thickness: 0.4, voussoirs: 20, courses: 4 } }), AT_1_40);
    const radii = pathsOf(scene, 'courses', 'course').map(({ edges }) =>
      edges.map((edge) => edge.kind === 'arc' && edge.radius),
    );
    expect(radii).toEqual([[expect.closeTo(1.1, 12)], [expect.closeTo(1.2, 12)], [expect.closeTo(1.3, 12)]]);
  });

  it('are not drawn for a ring of one, nor where they would run together', () => {
    expect(itemsIn(elevation(plain(), AT_1_40), 'courses')).toEqual([]);
    const thin = plain({ ring: { thickness: 0.4, voussoirs: 20, courses: 20 } });
    expect(itemsIn(elevation(thin, AT_1_40), 'courses')).toEqual([]);
    expect(itemsIn(elevation(thin, { millimetresPerMetre: 100 }), 'courses')).toHaveLength(19);
  });
});

describe('lost mortar', () => {
  const lostMortar = [{ face: 'extrados', depth: 0.1, joint: 7 } as const];
  const arch = plain({ ring: { thickness: 0.4, voussoirs: 20, lostMortar } });

  it('is an open slot at its face, as deep as was measured', () => {
    const slots = pathsOf(elevation(arch, AT_1_40), 'lost-mortar', 'lost-mortar');
    expect(slots.map(({ about }) => about)).toEqual([{ kind: 'joint', joint: 7 }]);
    const [a, b, c, d] = pointsOf(slots[0]!);
    expect(gap(a!, b!)).toBeCloseTo(0.1, 9);
    const mouth = { x: (a!.x + d!.x) / 2, y: (a!.y + d!.y) / 2 };
    expect(gap(mouth, arch.ring.joints[7]!.extrados)).toBeLessThan(1e-9);
    expect(Math.hypot((b!.x + c!.x) / 2, (b!.y + c!.y) / 2)).toBeCloseTo(1.3, 9);
  });

  it('moves the hinge in from the face to where the joint still bears, and the wedge opens to the very face', () => {
    const everywhere = plain({
      ring: { thickness: 0.4, voussoirs: 20, lostMortar: [{ face: 'intrados', depth: 0.05 }] },
    });
    const scene = elevation(everywhere, AT_1_40);
    const wedges = pathsOf(scene, 'hinges', 'hinge-least').filter(({ edges }) => edges[0]?.kind === 'line');
    const hinges = everywhere.result.thrust.least?.hinges ?? [];
    expect(wedges).toHaveLength(hinges.length);
    hinges.forEach(({ side }, i) => {
      const [contact, p, q] = pointsOf(wedges[i]!);
      const mouth = Math.hypot((p!.x + q!.x) / 2, (p!.y + q!.y) / 2);
      expect(Math.hypot(contact!.x, contact!.y)).toBeCloseTo(side === 'intrados' ? 1.05 : 1.4, 9);
      expect(mouth).toBeCloseTo(side === 'intrados' ? 1.4 : 1, 9);
    });
  });
});

describe('backing', () => {
  const backed = (counts: 'weight' | 'masonry') => elevation(plain({ backing: { level: 0.8, counts } }), AT_1_40);

  it.each([
    ['weight', 'backing', 'backing-hatch', 'backing-bond'],
    ['masonry', 'backing-masonry', 'backing-bond', 'backing-hatch'],
  ] as const)('as %s fills both haunches up to its level, out to the plumb line', (counts, fill, shown, other) => {
    const scene = backed(counts);
    const figures = pathsOf(scene, 'backing', fill).map(pointsOf);
    expect(figures).toHaveLength(2);
    for (const points of figures) {
      expect(Math.max(...points.map(({ y }) => y))).toBeCloseTo(0.8, 9);
      expect(Math.max(...points.map(({ x }) => Math.abs(x)))).toBeCloseTo(1.4, 9);
      // where the back of radius 1.4 m reaches the level
      expect(Math.min(...points.map(({ x }) => Math.abs(x)))).toBeCloseTo(Math.sqrt(1.4 ** 2 - 0.8 ** 2), 6);
    }
    expect(pathsOf(scene, 'backing', shown).length).toBeGreaterThan(10);
    expect(pathsOf(scene, 'backing', other)).toEqual([]);
  });

  it('shows the joints that are taken on through it when it counts', () => {
    expect(pathsOf(backed('weight'), 'backing', 'joint-onward')).toEqual([]);
    const arch = plain({ backing: { level: 0.8, counts: 'masonry' } });
    for (const onward of pathsOf(elevation(arch, AT_1_40), 'backing', 'joint-onward')) {
      const joint = onward.about?.kind === 'joint' ? onward.about.joint : -1;
      expect(onward.start).toEqual(arch.ring.joints[joint]?.extrados);
      expect(pointsOf(onward)[1]).toEqual(arch.result.model.joints[joint]?.extrados);
    }
  });
});

describe('layers and openings', () => {
  const layers = [
    { name: 'sub-base', thickness: 0.3, unitWeight: 20 },
    { name: 'setts', thickness: 0.1, unitWeight: 24 },
  ];

  it('lie on the fill at their true thickness, named where there is room, and carry the loads', () => {
    const loads = [{ id: 'p', kind: 'point', x: 0, force: 5 } as const];
    const scene = elevation(plain({ above: { kind: 'fill', height: 0.6, layers }, loads }), AT_1_40);
    const levels = pathsOf(scene, 'above', 'above-edge')
      .filter(({ about }) => about?.kind === 'field' && about.path.startsWith('above.layers'))
      .map(({ start }) => start.y);
    expect(levels).toEqual([expect.closeTo(2.3, 9), expect.closeTo(2.4, 9)]);
    expect(wordsIn(scene, 'notes')).toEqual(expect.arrayContaining(['sub-base 0.30', 'setts 0.10']));
    expect(pathsOf(scene, 'loads', 'load-head')[0]?.start.y).toBeCloseTo(2.4, 9);
  });

  it('are drawn where they are, each opening with its diagonals', () => {
    const openings = [{ from: -0.2, to: 0.3, sill: 1.5, head: 1.9 }];
    const scene = elevation(plain({ above: { kind: 'wall', height: 0.6, openings } }), AT_1_40);
    const [opening] = pathsOf(scene, 'above', 'opening').map(pointsOf);
    expect(opening?.slice(0, 4)).toEqual([
      { x: -0.2, y: 1.5 },
      { x: expect.closeTo(0.3, 12), y: 1.5 },
      { x: expect.closeTo(0.3, 12), y: expect.closeTo(1.9, 12) },
      { x: -0.2, y: expect.closeTo(1.9, 12) },
    ]);
    expect(pathsOf(scene, 'above', 'opening-cross')).toHaveLength(2);
  });

  it('counts the openings above where a tall wall is broken off', () => {
    const openings = [{ from: -0.2, to: 0.3, sill: 20, head: 22 }];
    const scene = elevation(plain({ above: { kind: 'wall', height: 40, openings } }), { millimetresPerMetre: 50 });
    expect(pathsOf(scene, 'above', 'opening')).toEqual([]);
    expect(wordsIn(scene, 'notes').join()).toContain('1 opening higher up');
  });
});

describe('an axle', () => {
  it('spreads from its print by its slope until it meets the back: 0.5 to each side for each metre down', () => {
    const loads = [{ id: 'a', kind: 'axle', x: 0, force: 40, patch: 0.2, dispersal: 0.5 } as const];
    const scene = elevation(plain({ loads }), AT_1_40);
    const spreads = pathsOf(scene, 'loads', 'load-spread').map(pointsOf);
    expect(spreads).toHaveLength(2);
    for (const [top, foot, end] of spreads) {
      const side = Math.sign(top!.x);
      expect(top).toEqual({ x: expect.closeTo(side * 0.1, 9), y: expect.closeTo(2, 9) });
      // to the level of the back beneath the axle, then plumb to the back of radius 1.4 m
      expect(Math.abs(foot!.x)).toBeCloseTo(0.1 + 0.5 * (2 - foot!.y), 9);
      expect(Math.hypot(end!.x, end!.y)).toBeCloseTo(1.4, 6);
    }
    expect(pathsOf(scene, 'loads', 'wheel')).toHaveLength(1);
  });
});

describe('a tapering ring', () => {
  it('letters both thicknesses, each a field to be typed', () => {
    const scene = elevation(fordBridge(), AT_1_40);
    const figures = itemsIn(scene, 'dimensions').filter((item): item is TextItem => item.kind === 'text');
    const text = (path: string) =>
      figures.filter(({ about }) => about?.kind === 'field' && about.path === path).map((item) => item.text);
    expect(text('ring.thickness')).toEqual(['crown 0.46']);
    expect(text('ring.springingThickness')).toEqual(['springing 0.62']);
  });
});

describe('cracks seen', () => {
  it('run inwards from the face that gapes, with an open mark before it', () => {
    const arch = fordBridge();
    const scene = elevation(arch, AT_1_40);
    const marks = pathsOf(scene, 'cracks', 'crack');
    expect(marks).toHaveLength(6);
    const [line, mouth] = marks.filter(({ about }) => about?.kind === 'crack' && about.crack === 'c1');
    expect(gap(line!.start, arch.ring.joints[20]!.intrados)).toBeLessThan(1e-9);
    const reach = pointsOf(line!).at(-1)!;
    expect(gap(reach, arch.ring.joints[20]!.extrados)).toBeLessThan(0.4 * 0.46);
    for (const lip of [pointsOf(mouth!)[0]!, pointsOf(mouth!)[2]!]) {
      expect(gap(lip, arch.ring.joints[20]!.extrados)).toBeGreaterThan(0.46);
    }
  });

  it('letter width and date when given, and nothing of what is not known', () => {
    expect(wordsIn(elevation(fordBridge(), AT_1_40), 'cracks').sort()).toEqual([
      '3 mm, 2026-05-14',
      '6 mm, 2026-05-14',
    ]);
  });

  it('stand at the nearest joint when placed along the intrados', () => {
    const arch = fordBridge();
    const [line] = pathsOf(elevation(arch, AT_1_40), 'cracks', 'crack').filter(
      ({ about }) => about?.kind === 'crack' && about.crack === 'c3',
    );
    expect(gap(line!.start, arch.ring.joints[33]!.extrados)).toBeLessThan(1e-9);
  });
});

it('explains in the legend what of all this is drawn', () => {
  const words = (arch: ReturnType<typeof plain>) =>
    legendEntries(arch.resolved, arch.result).map((entry) => entry.words);
  expect(words(fordBridge())).toEqual(
    expect.arrayContaining([
      'Opening seen, at the face that gapes',
      'Mortar lost from the joint',
      'Backing, counted as masonry',
      'Spread of an axle load',
    ]),
  );
  expect(words(plain())).not.toEqual(expect.arrayContaining(['Mortar lost from the joint']));
  expect(words(plain({ backing: { level: 0.5, counts: 'weight' } }))).toContain('Backing, weight only');
});

it('keeps the lettering of a sheet apart, whatever was surveyed', () => {
  fc.assert(
    fc.property(anySurveyedArch, fc.constantFrom('A4' as const, 'A3' as const), (arch, paper) => {
      expect(faultsOf(elevationSheet(arch, SHEET_TITLE, { paper }))).toEqual([]);
    }),
    { numRuns: 80, seed: 20260514 },
  );
});

it('draws the same bridge the same every time, with every figure a number', () => {
  const scene = elevation(fordBridge(), AT_1_40);
  expect(elevation(fordBridge(), AT_1_40)).toEqual(scene);
  expect(JSON.stringify(scene)).not.toMatch(/null,"y"|NaN/);
});
