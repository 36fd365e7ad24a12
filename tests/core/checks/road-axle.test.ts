import { describe, expect, test } from 'vitest';
import { roadAxle, type AssessorsFactors, type AxleStep, type RoadArch } from '../../../core/checks/road-axle.ts';

/** L 6.0 m, d + h 0.85 m, four spans to the rise, quarter points low enough to cost nothing. */
const sound: RoadArch = { span: 6, rise: 1.5, quarterRise: 1.1, ringThickness: 0.45, fill: 0.4 };

function stepOf(arch: Partial<RoadArch>, id: AxleStep['id'], factors: AssessorsFactors = {}): AxleStep {
  const found = roadAxle({ ...sound, ...arch }, factors).steps.find((step) => step.id === id);
  if (found === undefined) throw new Error(`no step ${id}`);
  return found;
}

describe('provisional axle load: 740 (d + h)² / L^1.3 tonnes, at most 70 (BA 16/97, later CS 454)', () => {
  test('L 6.0, d + h 0.85: 52.06 t (formula from memory, arithmetic recomputed)', () => {
    expect(roadAxle(sound).provisional).toBeCloseTo(52.06, 2);
  });

  test('L 5.23, d + h 0.68: 39.83 t (a worked assessment to BA 16/97, read)', () => {
    const arch = { ...sound, span: 5.23, ringThickness: 0.34, fill: 0.34 };
    expect(roadAxle(arch).provisional).toBeCloseTo(39.83, 2);
  });

  test('a thick crown on a short span stops at 70 t and shows what the formula gave', () => {
    const { result, note } = stepOf({ span: 3, ringThickness: 0.6, fill: 0.5 }, 'provisional');
    expect(result).toBe(70);
    // 740 × 1.1² / 3^1.3 = 895.4/4.1712
    expect(note).toContain('215 t');
  });

  test('the step prints symbols, numbers and result', () => {
    expect(stepOf({}, 'provisional')).toMatchObject({
      formula: 'PAL = 740 (d + h)² / L^1.3, at most 70 t',
      numbers: '740 × 0.85² / 6.00^1.3',
      unit: 't',
    });
  });
});

describe('limits of use: span 1.5–18 m, d + h 0.25–1.8 m (BA 16/97, read)', () => {
  test.each<[string, Partial<RoadArch>]>([
    ['span 1.5 m', { span: 1.5, rise: 0.5, quarterRise: 0.35, ringThickness: 0.15, fill: 0.1 }],
    ['span 18 m', { span: 18, rise: 5, quarterRise: 3.6 }],
    ['d + h 0.25 m', { ringThickness: 0.15, fill: 0.1 }],
    ['d + h 1.8 m', { ringThickness: 0.7, fill: 1.1 }],
  ])('%s is within', (_, arch) => {
    const axle = roadAxle({ ...sound, ...arch });
    expect(axle.outside).toEqual([]);
    expect(axle.modified?.tonnes).toBeGreaterThan(0);
  });

  test.each<[string, Partial<RoadArch>, string]>([
    ['a span of 1.49 m', { span: 1.49 }, 'The span must lie between 1.5 and 18 m'],
    ['a span of 18.1 m', { span: 18.1, rise: 5, quarterRise: 3.6 }, 'The span must lie between 1.5 and 18 m'],
    ['d + h 0.24 m', { ringThickness: 0.14, fill: 0.1 }, 'must lie between 0.25 and 1.8 m'],
    ['d + h 1.81 m', { ringThickness: 0.7, fill: 1.11 }, 'must lie between 0.25 and 1.8 m'],
  ])('%s is outside: no load, and the reason', (_, arch, reason) => {
    const axle = roadAxle({ ...sound, ...arch });
    expect(axle.provisional).toBeNull();
    expect(axle.modified).toBeNull();
    expect(axle.outside.join(' ')).toContain(reason);
  });

  test('what no figure can test is said in words', () => {
    expect(roadAxle(sound).limits.join(' ')).toMatch(/spandrel walls.*skew.*lift-off/);
  });

  test('fill deeper than the ring and a long span are remarked on', () => {
    expect(roadAxle(sound).notes).toEqual([]);
    const { notes } = roadAxle({ ...sound, span: 14, rise: 4, quarterRise: 2.9, ringThickness: 0.5, fill: 0.6 });
    expect(notes.join(' ')).toMatch(/deeper than the ring.*Over 12 m/);
  });
});

describe('profile factor: 1 for rq/rc ≤ 0.75, else 2.3 ((rc − rq)/rc)^0.6 (BA 16/97, read)', () => {
  test.each([
    [0.6, 1],
    [0.75, 1],
  ])('rq/rc %f: %f', (ratio, factor) => {
    expect(stepOf({ rise: 2, quarterRise: 2 * ratio }, 'profile').result).toBe(factor);
  });

  test('rq/rc 0.8: 0.8757', () => {
    expect(stepOf({ rise: 2, quarterRise: 1.6 }, 'profile').result).toBeCloseTo(0.8757, 4);
  });

  test('rc 1.57, rq 1.373: 0.66 (a worked assessment to BA 16/97, read)', () => {
    expect(stepOf({ rise: 1.57, quarterRise: 1.373 }, 'profile').result).toBeCloseTo(0.66, 2);
  });

  test('just over 0.75, where the expression gives 1.001, nothing is added', () => {
    expect(stepOf({ rise: 2, quarterRise: 1.5001 }, 'profile').result).toBe(1);
  });

  test('quarter points as high as the crown are outside', () => {
    const axle = roadAxle({ ...sound, rise: 1.5, quarterRise: 1.5 });
    expect(axle.modified).toBeNull();
    expect(axle.outside.join(' ')).toContain('as high as the crown');
  });
});

describe('span/rise factor', () => {
  test('four rises to the span or fewer: 1 (BA 16/97, read)', () => {
    expect(stepOf({ rise: 1.5 }, 'span-rise').result).toBe(1);
    expect(stepOf({ rise: 2.5, quarterRise: 1.8 }, 'span-rise').result).toBe(1);
  });

  const flatter = { ...sound, rise: 1, quarterRise: 0.7 };

  test('beyond four it is not included, and no modified load is made up without it', () => {
    const axle = roadAxle(flatter);
    expect(axle.provisional).toBeCloseTo(52.06, 2);
    expect(axle.modified).toBeNull();
    expect(axle.outside.join(' ')).toContain('not included');
  });

  test('beyond four the assessor’s reading of the standard’s figure is taken', () => {
    const axle = roadAxle(flatter, { spanRise: 0.75 });
    expect(axle.modified?.tonnes).toBeCloseTo(52.06 * 0.75, 1);
  });

  test('within four a reading changes nothing', () => {
    expect(stepOf({}, 'span-rise', { spanRise: 0.5 }).result).toBe(1);
  });

  test('beyond eight, where the figure ends, a reading is not taken', () => {
    const axle = roadAxle({ ...sound, rise: 0.7, quarterRise: 0.5 }, { spanRise: 0.6 });
    expect(axle.modified).toBeNull();
    expect(axle.outside.join(' ')).toContain('ends at 8');
  });

  test('an intrados without rise is outside, said once and without an infinity', () => {
    const axle = roadAxle({ ...sound, rise: 0, quarterRise: 0 });
    expect(axle.outside).toEqual(['The intrados has no rise.']);
    expect(JSON.stringify(axle)).not.toMatch(/NaN|Infinity/);
  });
});

describe('the assessor’s factors', () => {
  test('those not given count as 1, and each step says what that supposes', () => {
    for (const id of ['material', 'joint', 'condition'] as const) {
      const { result, note } = stepOf({}, id);
      expect(result).toBe(1);
      expect(note).toContain('taken as 1');
    }
  });

  test('the modified load is the product of all, in tonnes and in kN at 9.81 m/s²', () => {
    // 52.0615 × 1 × 0.8757 × 0.9 × 0.8 × 0.7 = 22.977 t; × 9.81 = 225.4 kN
    const arch = { ...sound, rise: 2, quarterRise: 1.6 };
    const { modified } = roadAxle(arch, { material: 0.9, joint: 0.8, condition: 0.7 });
    expect(modified?.tonnes).toBeCloseTo(22.977, 2);
    expect(modified?.kilonewtons).toBeCloseTo(225.4, 1);
  });

  test.each([-0.1, 1.2, Number.NaN])('%d is refused with the range', (entered) => {
    const axle = roadAxle(sound, { condition: entered });
    expect(axle.modified).toBeNull();
    expect(axle.outside.join(' ')).toContain('between 0 and 1');
  });

  test('a condition of 0 takes the whole load away', () => {
    expect(roadAxle(sound, { condition: 0 }).modified).toEqual({ tonnes: 0, kilonewtons: 0 });
  });
});

test('the result is a comparison and no check', () => {
  const axle = roadAxle(sound);
  expect(axle.standing).toContain('comparison beside the mechanism result');
  for (const step of [axle, ...axle.steps]) expect(step).not.toHaveProperty('status');
});
