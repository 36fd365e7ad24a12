import { describe, expect, test } from 'vitest';
import { resolveScheme } from '../../../core/job/defaults.ts';
import { addLoad, setAbove } from '../../../core/job/edits.ts';
import { freshScheme } from '../../../core/job/fresh.ts';
import type { Scheme } from '../../../core/job/schema.ts';
import {
  aboveMeasures,
  ASKED_SAFETY,
  loadMeasures,
  measureAt,
  openingMeasures,
  RING_MEASURES,
  STONE_MEASURES,
  SWAY,
  type Measure,
} from '../../../renderer/session/measures.ts';
import { CHOOSABLE } from '../../../renderer/session/shapes.ts';

const resolved = (scheme: Scheme) => resolveScheme(scheme).resolved;

function measuresOf(scheme: Scheme): readonly Measure[] {
  const filled = resolved(scheme);
  return [
    ...openingMeasures(filled.profile),
    ...RING_MEASURES,
    ...STONE_MEASURES,
    ...aboveMeasures(filled),
    ...filled.loads.flatMap(loadMeasures),
    SWAY,
    ASKED_SAFETY,
  ];
}

function furnished(scheme: Scheme): Scheme {
  const walled = setAbove(scheme, { kind: 'wall', height: 1, unitWeight: 20 });
  const posted = addLoad(walled, { kind: 'point', name: 'post', x: 0.1, force: 5 });
  return addLoad(posted, { kind: 'strip', name: 'floor', from: -0.2, to: 0.3, intensity: 4 });
}

describe.each(CHOOSABLE)('the measures of a %s arch', (shape) => {
  const scheme = furnished(freshScheme(shape));

  test('read back what was set', () => {
    for (const measure of measuresOf(scheme)) {
      const before = measure.read(resolved(scheme)) ?? 1;
      const value = measure.whole === true ? before + 2 : before === 0 ? 0.01 : before * 1.01;
      expect(measure.read(resolved(measure.set(scheme, value))), measure.path).toBeCloseTo(value, 9);
    }
  });

  test('left open again, are what is usually assumed', () => {
    for (const measure of measuresOf(scheme)) {
      if (measure.forget === undefined) continue;
      const forgotten = measure.forget(measure.set(scheme, measure.whole === true ? 12 : 1.5));
      const assumed = resolveScheme(forgotten).assumed.find(({ field }) => field === measure.path);
      expect(measure.read(resolved(forgotten)), measure.path).toBe(assumed === undefined ? 0 : assumed.value);
    }
  });

  test('are found by their paths, each once', () => {
    const paths = measuresOf(scheme).map(({ path }) => path);
    expect(new Set(paths).size).toBe(paths.length);
    for (const path of paths) expect(measureAt(resolved(scheme), path)?.path).toBe(path);
  });
});

test('a figure that is computed has no measure', () => {
  expect(measureAt(resolved(freshScheme()), 'profile.radius')).toBeNull();
});
