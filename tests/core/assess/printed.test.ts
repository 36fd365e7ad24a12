/** The printed assessment proves itself: nothing here is taken from the search, only from the figures a reader sees. */
import { beforeAll, describe, expect, test } from 'vitest';
import type { LinePoint, Point, SchemeAssessment, ThrustState } from '../../../core/assess/assessment.ts';
import { assessed } from '../../support/assessed.ts';
import { randomSchemes } from '../../validation/random-arches.ts';
import { totalLoad } from '../../validation/total-load.ts';

/** A share of a joint beyond its ends that counts as on it. The line is printed to rounding; thin joints magnify it. */
const ON_EDGE = 1e-9;

let results: SchemeAssessment[] = [];
beforeAll(() => {
  results = randomSchemes(14, 300).map(assessed);
});

const standing = (): SchemeAssessment[] => results.filter(({ thrust }) => thrust.stands);
const isPoint = (point: LinePoint): point is Point => point.x !== null;

/** Where a point of the line lies on its joint: 0 at the intrados, 1 at the extrados. */
function shareOfJoint({ intrados: i, extrados: e }: { intrados: Point; extrados: Point }, { x, y }: Point): number {
  const along = { x: e.x - i.x, y: e.y - i.y };
  return ((x - i.x) * along.x + (y - i.y) * along.y) / (along.x ** 2 + along.y ** 2);
}

const extremes = ({ thrust }: SchemeAssessment): ThrustState[] =>
  [thrust.least, thrust.greatest].filter((state) => state !== null);

describe('lines of thrust', () => {
  test('have one point a joint, on the joint and within the ring', () => {
    for (const result of standing()) {
      for (const { line } of extremes(result)) {
        expect(line).toHaveLength(result.model.joints.length);
        line.forEach((point, j) => {
          if (!isPoint(point)) return;
          const share = shareOfJoint(result.model.joints[j]!, point);
          expect(share).toBeGreaterThan(-ON_EDGE);
          expect(share).toBeLessThan(1 + ON_EDGE);
        });
      }
    }
  });

  test('touch the face that each hinge names', () => {
    for (const result of standing()) {
      for (const { line, hinges } of extremes(result)) {
        expect(hinges.length).toBeGreaterThan(0);
        expect(hinges.length).toBeLessThanOrEqual(3);
        expect(hinges.map(({ joint }) => joint)).toEqual([...hinges.map(({ joint }) => joint)].sort((p, q) => p - q));
        for (const { joint, side } of hinges) {
          const point = line[joint]!;
          if (!isPoint(point)) continue;
          const face = result.model.joints[joint]![side];
          expect(Math.hypot(point.x - face.x, point.y - face.y)).toBeLessThan(1e-8);
        }
      }
    }
  });
});

describe('reactions at the least thrust', () => {
  test('balance all forces on the ring, and their moments', () => {
    for (const { model, reactions, thrust } of standing()) {
      if (reactions === null || thrust.least === null) continue;
      const { left, right } = reactions;
      if (left.x === null || left.y === null || right.x === null || right.y === null) continue;
      const load = totalLoad(model.blocks);
      let fx = left.horizontal - right.horizontal;
      let fy = left.vertical + right.vertical;
      let moment = left.x * left.vertical - left.y * left.horizontal;
      moment += right.x * right.vertical + right.y * right.horizontal;
      for (const force of model.blocks.flatMap(({ forces }) => forces)) {
        fx += force.fx;
        fy += force.fy;
        moment += force.x * force.fy - force.y * force.fx;
      }
      expect(left.horizontal).toBe(thrust.least.horizontal);
      for (const rest of [fx, fy, moment / 20]) expect(Math.abs(rest)).toBeLessThan(1e-10 * load);
      const [first, last] = [thrust.least.line[0], thrust.least.line.at(-1)];
      expect([left.x, left.y, right.x, right.y]).toEqual([first?.x, first?.y, last?.x, last?.y]);
    }
  });
});

describe('the proof', () => {
  test('blocks balance to 1e-12 of the load, and the two bounds meet to 1e-10', () => {
    for (const { proof, thrust } of standing()) {
      if (thrust.least === null) continue;
      expect(proof.equilibriumResidual ?? 0).toBeLessThan(1e-12);
      expect(proof.gap).toBeLessThan(1e-10);
      expect(proof.static).toBe(thrust.least.horizontal);
    }
  });

  test('the residual is that of the printed line, walked block by block', () => {
    for (const { model, proof, reactions, thrust } of standing()) {
      const { left } = reactions ?? {};
      if (!left || left.x === null || left.y === null || thrust.least === null) continue;
      let [fx, fy] = [left.horizontal, left.vertical];
      let moment = left.x * fy - left.y * fx;
      let worst = 0;
      model.blocks.forEach(({ forces }, k) => {
        for (const force of forces) {
          fx += force.fx;
          fy += force.fy;
          moment += force.x * force.fy - force.y * force.fx;
        }
        const next = thrust.least!.line[k + 1]!;
        if (isPoint(next)) worst = Math.max(worst, Math.abs(moment - next.x * fy + next.y * fx));
      });
      expect(worst).toBeLessThan(1e-11 * totalLoad(model.blocks) * 20);
      expect(proof.equilibriumResidual).not.toBeNull();
    }
  });

  test('the mechanism of the least thrust, turned by hand: virtual work gives the same thrust', () => {
    for (const { model, proof, thrust } of standing()) {
      const { hinges } = thrust.least ?? {};
      if (!hinges || hinges.length !== 3) continue;
      const at = hinges.map(({ joint, side }) => model.joints[joint]![side]) as [Point, Point, Point];
      // rotations whose sum and whose moment of x vanish: the left abutment neither turns nor rises, it only spreads
      const turns = [at[1].x - at[2].x, at[2].x - at[0].x, at[0].x - at[1].x];
      const spread = turns.reduce((sum, turn, i) => sum + turn * at[i]!.y, 0);
      let work = 0;
      model.blocks.forEach(({ forces }, k) => {
        // a block moves by the turns of all hinges on its right, as seen from the right abutment at rest
        for (const { x, y, fx, fy } of forces) {
          hinges.forEach(({ joint }, i) => {
            if (joint <= k) return;
            work += turns[i]! * (fy * (x - at[i]!.x) - fx * (y - at[i]!.y));
          });
        }
      });
      expect(-work / spread).toBeCloseTo(proof.kinematic ?? NaN, 6);
    }
  });
});

describe('what else is printed', () => {
  test('names, and the order that the contract gives', () => {
    const result = assessed({
      name: 'As found',
      profile: { shape: 'semicircular', span: 4 },
      ring: { thickness: 0.5, voussoirs: 12, joints: 'radial' },
    });
    expect(result.arch).toBe('a1');
    expect(result.scheme).toBe('s1');
    expect(result.name).toBe('a1 / As found');
    expect(result.model.joints).toHaveLength(13);
    expect(result.model.blocks).toHaveLength(12);
    expect(Object.keys(result.model.joints[0]!)).toEqual(['intrados', 'extrados']);
  });

  test('every default that was used is listed with its reason', () => {
    const { assumed } = assessed({ profile: { shape: 'semicircular', span: 4 }, ring: { thickness: 0.5 } });
    const fields = assumed.map(({ field }) => field);
    for (const field of ['ring.voussoirs', 'ring.joints', 'masonry.unitWeight', 'masonry.friction', 'above.kind']) {
      expect(fields).toContain(field);
    }
    expect(assumed.every(({ because }) => because.length > 20)).toBe(true);
  });

  test('a ring that falls has a mechanism and no line; one that stands has no mechanism', () => {
    for (const { thrust, mechanism, reactions, geometricSafety } of results) {
      if (thrust.stands) {
        expect(mechanism).toBeUndefined();
      } else {
        expect([thrust.least, thrust.greatest, reactions, geometricSafety]).toEqual([null, null, null, null]);
        expect(mechanism?.hinges.length).toBeGreaterThanOrEqual(2);
        expect(mechanism?.hinges.length).toBeLessThanOrEqual(4);
      }
    }
  });

  test('the crown balance lies between least and greatest thrust where its line is in the ring', () => {
    let inside = 0;
    for (const { crown, thrust, model } of standing()) {
      if (!crown?.inside || thrust.least === null) continue;
      inside++;
      const slack = 1e-9 * totalLoad(model.blocks);
      expect(crown.horizontal).toBeGreaterThan((thrust.least.horizontal ?? NaN) - slack);
      expect(crown.horizontal).toBeLessThan((thrust.greatest?.horizontal ?? Infinity) + slack);
    }
    expect(inside).toBeGreaterThan(5);
  });
});
