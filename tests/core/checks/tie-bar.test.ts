/** The metalwork of a tie, worked by hand. Units m, kN, MPa, K. */
import { describe, expect, it } from 'vitest';
import { pinShear, plateBearing, plateBending, wallCone } from '../../../core/checks/tie-anchor.ts';
import { allowedStress, barAreas, barMovement, smallestThread, stressOf } from '../../../core/checks/tie-bar.ts';
import { tieCapacity } from '../../../core/checks/ties.ts';
import type { Tie } from '../../../core/job/schema.ts';
import { GROUNDS, MASONRY, METALS, PLATE_BEARINGS, THREADS } from '../../../core/job/tables.ts';
import { resolveTies, type ResolvedTie } from '../../../core/job/tie-defaults.ts';

const tieFrom = (draft: Partial<Tie>): ResolvedTie =>
  resolveTies([{ id: 't1', level: 0, bar: { shape: 'round', diameter: 0.024 }, length: 5, ...draft }], 5, [])[0]!;

const S275 = { name: 'steel S275' };
const partial = { kind: 'partial' } as const;

describe('the tables', () => {
  it.each([METALS, THREADS, GROUNDS, MASONRY, PLATE_BEARINGS])('name a source on every row', (...rows) => {
    for (const { name, source } of rows) {
      expect(name).not.toBe('');
      expect(source.length).toBeGreaterThan(7);
    }
  });

  it.each(THREADS.map((thread) => [thread.name, thread] as const))(
    '%s: π/4 (d − 0.9382 p)² rounds to the printed stress area (ISO 898-1)',
    (_, { diameter, pitch, stressArea }) => {
      const area = (Math.PI / 4) * (diameter - 0.9382 * pitch) ** 2;
      // printed to three figures
      expect(area / stressArea).toBeGreaterThan(0.995);
      expect(area / stressArea).toBeLessThan(1.005);
    },
  );
});

describe('a bar of 24 mm with an M24 thread', () => {
  const tie = tieFrom({ thread: 'M24', material: S275, factors: partial });

  it('has 452.4 mm² in the shank and 353 in the thread', () => {
    expect(barAreas(tie).gross * 1e6).toBeCloseTo(452.389, 3);
    expect(barAreas(tie).thread! * 1e6).toBeCloseTo(353, 6);
  });

  it('is stressed with 110.5 and 141.6 MPa by 50 kN', () => {
    expect(stressOf(50, barAreas(tie).gross)).toBeCloseTo(110.524, 3);
    expect(stressOf(50, barAreas(tie).thread!)).toBeCloseTo(50_000 / 353, 8);
  });

  it('may carry 0.9 fu As / γM2 in its thread, over the factor on the force (EN 1993-1-8, from memory)', () => {
    // 0.9 × 430 × 353 / 1.25 = 109.29 kN; gross 275 × 452.39 / 1.0 = 124.41 kN; over 1.35
    expect(allowedStress(tie).thread * 353e-3).toBeCloseTo(109.289 / 1.35, 3);
    expect(allowedStress(tie).gross * 452.389e-3).toBeCloseTo(124.407 / 1.35, 3);
    expect(tieCapacity(tie)).toBeCloseTo(109.289 / 1.35, 3);
  });

  it('loses metal to corrosion on the diameter', () => {
    // 22 mm left: π/4 × 22² = 380.13 mm²
    expect(barAreas({ ...tie, corrosion: 0.002 }).gross * 1e6).toBeCloseTo(380.133, 3);
    expect(barMovement({ ...tie, corrosion: 0.03 }, barAreas({ ...tie, corrosion: 0.03 }).gross, 10)).toBeNull();
  });

  it('lengthens by F L / (E A), and half a part in a thousand is 105 MPa at 210 GPa (handbook)', () => {
    const area = barAreas(tie).gross;
    expect(barMovement(tie, area, 105e3 * area)!.extension).toBeCloseTo(0.0005 * 5, 10);
  });
});

describe('heat', () => {
  const tie = tieFrom({ material: S275, warming: 30, pretension: 20 });
  const area = barAreas(tie).gross;

  it('takes E α ΔT, about 25 MPa for 10 K of steel, with the anchors held (handbook)', () => {
    const loss = barMovement({ ...tie, warming: 10 }, area, 30)!.heatLoss;
    expect(loss / area / 1000).toBeCloseTo(25.2, 8);
  });

  it('slackens a tie whose pretension is less, and says how far the springings part', () => {
    // 75.6 MPa × 452.39 mm² = 34.2 kN > 20 kN; α ΔT L = 1.8 mm; 20 kN × 5 / (E A) = 1.0526 mm
    const moved = barMovement(tie, area, 30)!;
    expect(moved.slack).toBe(true);
    expect(moved.spreadToPull).toBeCloseTo(0.0018 - (20 * 5) / (210e6 * area), 10);
    expect(moved.spreadToHold).toBeCloseTo(0.0018 + (10 * 5) / (210e6 * area), 10);
  });

  it('leaves a tie tight whose pretension is more', () => {
    expect(barMovement({ ...tie, pretension: 40 }, area, 40)).toMatchObject({ slack: false, spreadToPull: 0 });
  });
});

describe('factors', () => {
  it('one on the ultimate strength of wrought iron: 234 / 3 = 78 MPa, as c. 1909 permitted 77', () => {
    const iron = tieFrom({});
    expect(iron.material.name).toBe('wrought iron');
    expect(allowedStress(iron).gross).toBeCloseTo(78, 10);
  });

  it('never let a bar yield', () => {
    expect(allowedStress(tieFrom({ factors: { kind: 'global', safety: 1 } })).gross).toBe(159);
  });

  it('hold a brittle metal to its ultimate strength', () => {
    const cast = tieFrom({ material: { name: 'cast iron' }, factors: partial });
    expect(allowedStress(cast).gross).toBeCloseTo(90 / 1.25 / 1.35, 10);
  });
});

describe('the anchor under 40 kN', () => {
  const tie = tieFrom({
    material: S275,
    factors: partial,
    plate: { width: 0.4, height: 0.4, thickness: 0.02, hole: 0.026, allowable: 0.5, wall: 0.6, shear: 0.05 },
    pin: { diameter: 0.02, planes: 2 },
  });
  const allowed = allowedStress(tie);

  it('shears its pin of 20 mm in two planes with 63.7 MPa', () => {
    // 40 000 / (2 × 314.16); limit 0.6 × 430 / 1.25 / 1.35
    expect(pinShear(tie, allowed, 40)!.demand).toBeCloseTo(63.662, 3);
    expect(pinShear(tie, allowed, 40)!.limit).toBeCloseTo((0.6 * 430) / 1.25 / 1.35, 10);
  });

  it('presses the masonry with 0.251 MPa', () => {
    // 0.16 − π/4 × 0.026² = 0.159469 m²
    expect(plateBearing(tie, 40)).toEqual({ demand: expect.closeTo(0.25083, 5) as number, limit: 0.5 });
  });

  it('needs a plate of 11.3 mm', () => {
    // q = 250.83 kN/m², c = (0.4 − 0.026)/2 = 0.187: M = 4.3857 kN·m/m; t = √(6 × 4.3857 / (203 704)) = 0.011366 m
    expect(plateBending(tie, allowed, 40)!.demand).toBeCloseTo(0.011366, 5);
  });

  it('leaves a cone of 104.5 kN in a wall of 0.6 m', () => {
    // 0.6 (2 × 0.8 + π × 0.6) = 2.0910 m² × 50 kN/m²
    expect(wallCone(tie, 40)!.limit).toBeCloseTo(104.549, 3);
  });
});

describe('the smallest standard size', () => {
  const tie = tieFrom({ material: S275, factors: partial });

  it('carries the force and the next smaller does not', () => {
    // 50 kN × 1.35 = 67.5 kN; M20: 0.9 × 430 × 245 / 1.25 = 75.9; M18: 0.9 × 430 × 192 / 1.25 = 59.4
    expect(smallestThread(tie, 50)!.name).toBe('M20');
  });

  it('is none where the table ends', () => {
    expect(smallestThread(tie, 500)).toBeNull();
  });
});
