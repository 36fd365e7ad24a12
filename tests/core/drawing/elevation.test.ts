import { describe, expect, it } from 'vitest';
import type { AssessedScheme } from '../../../core/assess/assess.ts';
import { elevation } from '../../../core/drawing/elevation.ts';
import type { About, LayerName, PathItem, Scene, SceneItem, TextItem } from '../../../core/drawing/scene.ts';
import type { Edge } from '../../../core/geometry/curve.ts';
import type { Point } from '../../../core/geometry/point.ts';
import { assessed, northDoor, thinRing } from './arches.ts';

const AT_1_20 = { millimetresPerMetre: 50 };
const drawn = (scene: Scene, layer: LayerName): readonly SceneItem[] =>
  scene.layers.find(({ name }) => name === layer)?.items ?? [];
const paths = (scene: Scene, layer: LayerName, role?: string): PathItem[] =>
  drawn(scene, layer).filter(
    (item): item is PathItem => item.kind === 'path' && (role === undefined || item.role === role),
  );
const texts = (scene: Scene, layer?: LayerName): TextItem[] =>
  (layer === undefined ? scene.layers.flatMap(({ items }) => items) : drawn(scene, layer)).filter(
    (item): item is TextItem => item.kind === 'text',
  );
const about = (scene: Scene, wanted: About): SceneItem[] =>
  scene.layers.flatMap(({ items }) => items.filter((item) => JSON.stringify(item.about) === JSON.stringify(wanted)));
const words = (scene: Scene, layer?: LayerName): string[] => texts(scene, layer).map(({ text }) => text);

const onArc = (edge: Extract<Edge, { kind: 'arc' }>, share: number): Point => {
  const angle = edge.from + share * edge.turn;
  return { x: edge.centre.x + edge.radius * Math.cos(angle), y: edge.centre.y + edge.radius * Math.sin(angle) };
};

describe('stones', () => {
  it('has each voussoir with its true curves: radii 1.60 and 2.02 m round the middle of the springing line', () => {
    const stones = paths(elevation(northDoor(), AT_1_20), 'voussoirs');
    expect(stones).toHaveLength(21);
    for (const stone of stones) {
      const arcs = stone.edges.filter((edge) => edge.kind === 'arc');
      expect(arcs.map(({ radius }) => radius)).toEqual([expect.closeTo(1.6, 12), expect.closeTo(2.02, 12)]);
      for (const arc of arcs) {
        for (const share of [0, 0.5, 1])
          expect(Math.hypot(onArc(arc, share).x, onArc(arc, share).y)).toBeCloseTo(arc.radius, 12);
        expect(onArc(arc, 1)).toEqual({ x: expect.closeTo(arc.to.x, 12), y: expect.closeTo(arc.to.y, 12) });
      }
      expect(stone.edges.at(-1)?.to).toEqual(stone.start);
    }
  });

  it('draws each joint from intrados to extrados where the assessment has it', () => {
    const arch = northDoor();
    const joints = paths(elevation(arch, AT_1_20), 'joints', 'joint');
    expect(joints.map(({ start, edges }) => ({ intrados: start, extrados: edges[0]?.to }))).toEqual(
      arch.result.model.joints,
    );
    expect(joints.map((joint) => joint.about)).toEqual(
      arch.result.model.joints.map((_, joint) => ({ kind: 'joint', joint })),
    );
  });

  it('runs each face of a circular ring as one arc', () => {
    const faces = paths(elevation(northDoor(), AT_1_20), 'joints', 'ring-edge').filter(
      ({ edges }) => edges[0]?.kind === 'arc',
    );
    expect(faces.map(({ edges }) => edges.length)).toEqual([1, 1]);
    for (const { edges } of faces) expect(edges[0]).toMatchObject({ turn: expect.closeTo(-Math.PI, 10) });
  });

  it('leaves joints out where they would run together on paper, but never the springings', () => {
    const arch = assessed({ profile: { shape: 'semicircular', span: 3 }, ring: { thickness: 0.3, voussoirs: 5000 } });
    const scene = elevation(arch, AT_1_20);
    const joints = paths(scene, 'joints', 'joint');
    expect(joints.length).toBeLessThan(320);
    expect(joints[0]?.start).toEqual(arch.result.model.joints[0]?.intrados);
    expect(joints.at(-1)?.start).toEqual(arch.result.model.joints.at(-1)?.intrados);
  });

  it('breaks off a wall that would dwarf the arch, and still letters its height', () => {
    const arch = assessed({
      profile: { shape: 'semicircular', span: 2 },
      ring: { thickness: 0.3 },
      above: { kind: 'wall', height: 40 },
    });
    const scene = elevation(arch, AT_1_20);
    expect(scene.bounds?.top).toBeLessThan(4);
    expect(words(scene, 'dimensions')).toContain('40.00');
  });
});

describe('thrust', () => {
  it('runs both lines through the points of the assessment', () => {
    const arch = northDoor();
    const scene = elevation(arch, AT_1_20);
    for (const state of ['least', 'greatest'] as const) {
      const [line] = paths(scene, `thrust-${state}`);
      const points = [line?.start, ...(line?.edges.map(({ to }) => to) ?? [])];
      expect(points).toEqual(arch.result.thrust[state]?.line);
    }
    expect(paths(scene, 'thrust-band', 'thrust-band')).toHaveLength(1);
  });

  it('opens each hinge at the face opposite to its contact', () => {
    const arch = northDoor();
    const wedges = paths(elevation(arch, AT_1_20), 'hinges', 'hinge-least').filter(
      ({ edges }) => edges[0]?.kind === 'line',
    );
    const hinges = arch.result.thrust.least?.hinges ?? [];
    expect(wedges).toHaveLength(hinges.length);
    hinges.forEach(({ joint, side }, i) => {
      const at = arch.result.model.joints[joint]!;
      const open = at[side === 'extrados' ? 'intrados' : 'extrados'];
      const [a, b] = (wedges[i]?.edges ?? []).map(({ to }) => to);
      expect(wedges[i]?.start).toEqual(at[side]);
      expect({ x: (a!.x + b!.x) / 2, y: (a!.y + b!.y) / 2 }).toEqual({
        x: expect.closeTo(open.x, 9),
        y: expect.closeTo(open.y, 9),
      });
    });
  });

  it('shows what each support gives back, with its figures', () => {
    const arch = northDoor();
    const scene = elevation(arch, AT_1_20);
    expect(words(scene, 'reactions')).toEqual([
      'thrust 23.9 kN',
      'vertical 65.8 kN',
      'thrust 23.9 kN',
      'vertical 68.1 kN',
    ]);
    const [left] = paths(scene, 'reactions', 'reaction-head');
    expect(left?.start).toEqual({ x: arch.result.reactions?.left.x, y: arch.result.reactions?.left.y });
  });

  it('draws no line where none fits, but the hinges and the first movement', () => {
    const arch = thinRing();
    const scene = elevation(arch, AT_1_20);
    expect(scene.layers.map(({ name }) => name)).not.toEqual(expect.arrayContaining(['thrust-least']));
    expect(drawn(scene, 'thrust-band')).toEqual([]);
    expect(drawn(scene, 'reactions')).toEqual([]);
    expect(paths(scene, 'hinges', 'hinge-mechanism').filter(({ edges }) => edges[0]?.kind === 'line')).toHaveLength(
      arch.result.mechanism?.hinges.length ?? -1,
    );
    expect(paths(scene, 'mechanism', 'ghost').length).toBeGreaterThan(1);
    expect(scene.description).toContain('Does not stand in compression alone');
  });

  it('keeps the moved bodies joined at the hinges between them', () => {
    const ghosts = paths(elevation(thinRing(), AT_1_20), 'mechanism', 'ghost');
    const corners = ghosts.map(({ start, edges }) => [start, ...edges.map(({ to }) => to)]);
    for (let i = 0; i + 1 < corners.length; i++) {
      const gaps = corners[i]!.flatMap((a) => corners[i + 1]!.map((b) => Math.hypot(a.x - b.x, a.y - b.y)));
      // Apart by the square of a small turn at most: half of 0.12² × 1.5 m.
      expect(Math.min(...gaps)).toBeLessThan(0.011);
    }
  });
});

describe('dimensions', () => {
  it.each([
    ['profile.span', '4.80'],
    ['profile.rise', '0.90'],
    ['ring.thickness', '0.35'],
    ['above.height', '0.50'],
    ['breadth', 'breadth 0.60'],
  ])('letters %s as %s, so that the figure can be clicked and typed', (path, text) => {
    const arch = assessed({
      profile: { shape: 'segmental', span: 4.8, rise: 0.9 },
      ring: { thickness: 0.35 },
      above: { kind: 'fill', height: 0.5 },
    });
    const figures = about(elevation(arch, AT_1_20), { kind: 'field', path }).filter((item) => item.kind === 'text');
    expect(figures.map((item) => item.text)).toEqual([text]);
  });

  it('measures the ring square to the soffit though its joints stand plumb', () => {
    const arch = assessed({
      profile: { shape: 'segmental', span: 3.6, rise: 1.2 },
      ring: { thickness: 0.4, voussoirs: 30, joints: 'vertical' },
    });
    const [figure] = about(elevation(arch, AT_1_20), { kind: 'field', path: 'ring.thickness' });
    expect(figure).toMatchObject({ text: '0.40' });
  });

  it('letters lengths as the screen asks', () => {
    const scene = elevation(northDoor(), { ...AT_1_20, length: (metres) => `${Math.round(metres / 0.0254)}″` });
    expect(words(scene, 'dimensions')).toEqual(expect.arrayContaining(['126″', '17″', '47″']));
  });
});

describe('loads', () => {
  it('letters name and amount as given, each pointing at its load', () => {
    const scene = elevation(northDoor(), AT_1_20);
    expect(words(scene, 'loads').sort()).toEqual(['beam end: 12 kN', 'floor: 8 kN/m²']);
    expect(about(scene, { kind: 'load', load: 'l1' }).length).toBeGreaterThan(2);
  });

  it('stands on the top of the wall, or on the back of a bare ring', () => {
    const point = { id: 'p', kind: 'point', x: 0.6, force: 5 } as const;
    const bare = { profile: { shape: 'semicircular', span: 3.2 }, ring: { thickness: 0.42 }, loads: [point] } as const;
    const tip = (arch: AssessedScheme) => paths(elevation(arch, AT_1_20), 'loads', 'load-head')[0]?.start;
    expect(tip(assessed({ ...bare, above: { kind: 'wall', height: 1.2 } }))).toEqual({
      x: 0.6,
      y: expect.closeTo(3.22, 12),
    });
    expect(tip(assessed(bare))).toEqual({ x: 0.6, y: expect.closeTo(Math.sqrt(2.02 ** 2 - 0.36), 12) });
  });

  it('points an upward load upwards and says so', () => {
    const loads = [{ id: 'p', name: 'hoist', kind: 'point', x: 0.6, force: -2.5 }] as const;
    const scene = elevation(
      assessed({ profile: { shape: 'semicircular', span: 3.2 }, ring: { thickness: 0.42 }, loads }),
      AT_1_20,
    );
    expect(words(scene, 'loads')).toEqual(['hoist: 2.5 kN upwards']);
    const [head] = paths(scene, 'loads', 'load-head');
    expect(head!.start.y).toBeGreaterThan(head!.edges[0]!.to.y);
  });

  it('letters numbers and a key where names would climb too high, and counts what it cannot draw', () => {
    const loads = Array.from({ length: 60 }, (_, i) => ({
      id: `l${i}`,
      name: `joist ${i + 1}`,
      kind: 'point' as const,
      x: -1.4 + (i * 2.8) / 59,
      force: 1 + i,
    }));
    const scene = elevation(
      assessed({ profile: { shape: 'semicircular', span: 3.2 }, ring: { thickness: 0.6 }, loads }),
      AT_1_20,
    );
    expect(scene.key).toHaveLength(60);
    expect(scene.key[59]).toEqual({ mark: '60', meaning: 'joist 60: 60 kN' });
    expect(words(scene, 'loads')).toContain('and 20 lighter loads, not drawn');
    expect(words(scene, 'loads')).toContain('60');
  });
});

it('is drawn the same every time, and nothing in it is not a number', () => {
  const scene = elevation(northDoor(), AT_1_20);
  expect(elevation(northDoor(), AT_1_20)).toEqual(scene);
  expect(JSON.stringify(scene)).not.toMatch(/null,"y"|NaN/);
});

it('reaches as far as what is drawn, lettering and curves included', () => {
  const { bounds } = elevation(thinRing(), AT_1_20);
  expect(bounds!.left).toBeLessThan(-1.62);
  expect(bounds!.right).toBeGreaterThan(1.62);
  expect(bounds!.top).toBeGreaterThanOrEqual(1.62);
  expect(bounds!.bottom).toBeLessThan(-0.2);
});
