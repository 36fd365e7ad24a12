import { describe, expect, it } from 'vitest';
import type { AssessedScheme } from '../../../core/assess/assess.ts';
import { spreadLeft } from '../../../core/assess/long-questions.ts';
import { movement } from '../../../core/assess/questions.ts';
import { mechanismFrame, movedRing, type MovedRing } from '../../../core/drawing/moved-ring.ts';
import { placed, turnOf } from '../../../core/geometry/placement.ts';
import { midpoint } from '../../../core/geometry/point.ts';
import type { Outline } from '../../../core/geometry/ring-blocks.ts';
import { motionsOf } from '../../../core/statics/mechanism.ts';
import type { SupportMovement } from '../../../core/statics/support-movement.ts';
import { assessed, northDoor, thinRing } from './arches.ts';

const corners = ({ start, edges }: Outline) => [start, ...edges.map(({ to }) => to)];
const lengths = (outline: Outline) => {
  const points = corners(outline);
  return points.flatMap((a, i) => points.slice(i + 1).map((b) => Math.hypot(a.x - b.x, a.y - b.y)));
};

function motionsFor(arch: AssessedScheme, moved: SupportMovement) {
  const answer = movement(arch.built, moved);
  if (answer.kind !== 'opens') throw new Error(answer.kind);
  return { openings: answer.openings, motions: motionsOf(arch.built.joints, answer.openings) };
}

function expectRigid(arch: AssessedScheme, moved: MovedRing) {
  moved.outlines.forEach((outline, block) => {
    const before = lengths(arch.ring.outline(block));
    lengths(outline).forEach((length, i) => expect(Math.abs(length - before[i]!)).toBeLessThan(1e-9));
    for (const edge of outline.edges) {
      if (edge.kind !== 'arc') continue;
      const angle = edge.from + edge.turn;
      expect(edge.centre.x + edge.radius * Math.cos(angle)).toBeCloseTo(edge.to.x, 9);
      expect(edge.centre.y + edge.radius * Math.sin(angle)).toBeCloseTo(edge.to.y, 9);
    }
  });
}

/** How far apart the two neighbours hold the point in which they touch. */
function gapsAtHinges(arch: AssessedScheme, { placements, openings }: MovedRing): number[] {
  return openings.map(({ joint, side }) => {
    const contact = arch.built.joints[joint]![side];
    const [a, b] = [placed(placements[joint]!, contact), placed(placements[joint + 1]!, contact)];
    return Math.hypot(a.x - b.x, a.y - b.y);
  });
}

const SPREADING: SupportMovement = { side: 'left', dx: -0.01, dy: 0, turn: 0 };

describe('a small movement drawn larger', () => {
  it.each([1, 5, 20])('keeps every block rigid and every hinge closed, %d times as large', (factor) => {
    const arch = northDoor();
    const { motions, openings } = motionsFor(arch, SPREADING);
    const moved = movedRing(arch, motions, factor);
    expectRigid(arch, moved);
    expect(moved.openings.map(({ joint, side }) => ({ joint, side }))).toEqual(
      openings.map(({ joint, side }) => ({ joint, side })),
    );
    for (const gap of gapsAtHinges(arch, moved)) expect(gap).toBeLessThan(1e-9);
  });

  it('parts the springings by the movement times the factor, without sinking or turning', () => {
    const arch = northDoor();
    const { placements } = movedRing(arch, motionsFor(arch, SPREADING).motions, 12);
    expect(placements[0]).toEqual({
      cos: expect.closeTo(1, 9),
      sin: expect.closeTo(0, 9),
      dx: expect.closeTo(-0.12, 9),
      dy: expect.closeTo(0, 9),
    });
    expect(placements.at(-1)).toMatchObject({ cos: 1, sin: 0, dx: 0, dy: 0 });
  });

  it('opens each joint as wide as the movement opens it, whatever the factor', () => {
    const arch = northDoor();
    const { motions, openings } = motionsFor(arch, SPREADING);
    const widths = openings.map(({ width }) => width);
    movedRing(arch, motions, 0.001).openings.forEach(({ width }, i) => expect(width).toBeCloseTo(widths[i]!, 6));
    movedRing(arch, motions, 10).openings.forEach(({ width }, i) =>
      expect(Math.abs(width! - widths[i]!)).toBeLessThan(0.15 * widths[i]!),
    );
  });

  it.each<[string, SupportMovement]>([
    ['sinking', { side: 'left', dx: 0, dy: -0.02, turn: 0 }],
    ['turning', { side: 'left', dx: 0, dy: 0, turn: 0.01 }],
    ['closing', { side: 'left', dx: 0.01, dy: 0, turn: 0 }],
  ])('keeps hinges closed for a support that is %s', (_, support) => {
    const arch = northDoor();
    const moved = movedRing(arch, motionsFor(arch, support).motions, 5);
    expectRigid(arch, moved);
    for (const gap of gapsAtHinges(arch, moved)) expect(gap).toBeLessThan(1e-9);
    const { intrados, extrados } = arch.ring.joints[0]!;
    const middle = midpoint(intrados, extrados);
    const went = placed(moved.placements[0]!, middle);
    expect(went.x - middle.x).toBeCloseTo(support.dx * 5, 9);
    expect(went.y - middle.y).toBeCloseTo(support.dy * 5, 9);
    expect(turnOf(moved.placements[0]!)).toBeCloseTo(support.turn * 5, 9);
  });
});

describe('a place of the remaining spread', () => {
  const arch = assessed({ profile: { shape: 'semicircular', span: 3.2 }, ring: { thickness: 0.42, voussoirs: 21 } });
  const spread = spreadLeft(arch.built, { x: -1, y: 0 }, 0.2, () => true)!;

  it('stands at its true size with its blocks rigid', () => {
    for (const place of [spread.places[0]!, spread.places[20]!, spread.places.at(-1)!]) {
      const moved = movedRing(arch, place);
      expectRigid(arch, moved);
      expect(moved.factor).toBe(1);
      expect(moved.placements[0]!.dx).toBeCloseTo(-place.moved, 9);
      place.joints.forEach(({ intrados, extrados }, j) => {
        const at = moved.joints[j]!;
        expect(Math.hypot(at.intrados.x - intrados.x, at.intrados.y - intrados.y)).toBeLessThan(1e-9);
        expect(Math.hypot(at.extrados.x - extrados.x, at.extrados.y - extrados.y)).toBeLessThan(1e-9);
      });
    }
  });

  it('is closed at first and gapes at its hinges later', () => {
    expect(movedRing(arch, spread.places[0]!).openings).toEqual([]);
    const place = spread.places[20]!;
    const gaping = movedRing(arch, place).openings.map(({ joint }) => joint);
    expect(gaping).toEqual(expect.arrayContaining(place.hinges.map(({ joint }) => joint)));
  });
});

describe('the fall of an arch that does not stand', () => {
  it('begins where it stands and moves by more than its thickness, rigid and closed at every hinge', () => {
    const arch = thinRing();
    expect(mechanismFrame(arch, 0)?.openings).toEqual([]);
    let furthest = 0;
    for (const t of [0.1, 0.5, 1]) {
      const frame = mechanismFrame(arch, t)!;
      expectRigid(arch, frame);
      for (const gap of gapsAtHinges(arch, frame)) expect(gap).toBeLessThan(1e-9);
      expect(frame.openings).toHaveLength(arch.result.mechanism!.hinges.length);
      const moved = Math.max(
        ...frame.joints.map(({ intrados: { x, y } }, j) => {
          const was = arch.ring.joints[j]!.intrados;
          return Math.hypot(x - was.x, y - was.y);
        }),
      );
      expect(moved).toBeGreaterThan(furthest);
      furthest = moved;
    }
    expect(furthest).toBeGreaterThan(0.12);
    expect(furthest).toBeLessThan(0.24);
  });

  it('leaves both supports where they are', () => {
    const { placements } = mechanismFrame(thinRing(), 1)!;
    for (const at of [placements[0]!, placements.at(-1)!]) {
      expect(at).toEqual({
        cos: expect.closeTo(1, 9),
        sin: expect.closeTo(0, 9),
        dx: expect.closeTo(0, 9),
        dy: expect.closeTo(0, 9),
      });
    }
  });

  it('has no frames for an arch that stands', () => {
    expect(mechanismFrame(northDoor(), 0.5)).toBeNull();
  });
});
