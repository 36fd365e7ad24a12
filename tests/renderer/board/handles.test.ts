import { describe, expect, test } from 'vitest';
import { assessScheme } from '../../../core/assess/assess.ts';
import { elevation } from '../../../core/drawing/elevation.ts';
import type { Scheme } from '../../../core/job/schema.ts';
import { handlesOf, nearestHandle, rounded, tidy, type Handle } from '../../../renderer/board/handles.ts';
import { CHOOSABLE } from '../../../renderer/session/shapes.ts';
import { drawnArch, type DrawnArch } from './drawn.ts';

const handles = ({ assessed, scene }: DrawnArch): Handle[] => handlesOf(assessed, scene);

function found(arch: DrawnArch, id: string): Handle {
  const handle = handles(arch).find((candidate) => candidate.id === id);
  if (handle === undefined) throw new Error(`no handle ${id}`);
  return handle;
}

/** Where the handle stands after it was moved so far along its axis. */
function moved({ scheme, scene }: DrawnArch, handle: Handle, by: number): Handle {
  const next: Scheme = handle.set(scheme, handle.value + handle.rate * by);
  const outcome = assessScheme({ id: 'a1', schemes: [next] }, next);
  if (!outcome.ok) throw new Error('the arch cannot be built');
  const redrawn = elevation(outcome.assessed, { millimetresPerMetre: scene.millimetresPerUnit });
  return found({ scheme: next, assessed: outcome.assessed, scene: redrawn }, handle.id);
}

describe.each(CHOOSABLE)('a handle of a %s arch', (shape) => {
  const arch = drawnArch(shape);

  test('follows the pointer: moved by a little, it stands that much further', () => {
    const by = shape === 'flat' ? 0.003 : 0.01;
    for (const handle of handles(arch)) {
      const went = moved(arch, handle, by).at[handle.axis] - handle.at[handle.axis];
      // Over a point the thickness and the height of the back are not quite in proportion.
      const near = handle.id === 'thickness' ? 0.03 * by : 1e-9;
      expect(Math.abs(went - by), handle.id).toBeLessThan(near);
    }
  });

  test('reads back its own value unchanged', () => {
    for (const handle of handles(arch)) {
      expect(handle.set(arch.scheme, handle.value), handle.id).toEqual(arch.scheme);
    }
  });
});

test('every size and every place of the arch has its handle, in the order in which one measures', () => {
  expect(handles(drawnArch()).map(({ id }) => id)).toEqual([
    'springing-left',
    'crown',
    'springing-right',
    'thickness',
    'top',
    'load-l1-x',
    'load-l2-from',
    'load-l2-middle',
    'load-l2-to',
  ]);
});

test('the nearest of two handles is taken, and none that is out of reach', () => {
  const arch = drawnArch();
  const place = ({ x, y }: { x: number; y: number }) => ({ x: x * 100, y: -y * 100 });
  const crown = found(arch, 'crown');
  const at = place(crown.at);
  expect(nearestHandle(handles(arch), { x: at.x, y: at.y + 10 }, 22, place)?.id).toBe('crown');
  expect(nearestHandle(handles(arch), { x: at.x, y: at.y - 30 }, 22, place)?.id).toBe('thickness');
  expect(nearestHandle(handles(arch), { x: at.x, y: at.y + 40 }, 22, place)).toBeNull();
});

test('a dragged value has no digits that the hand could not place', () => {
  expect(rounded(1.23456789, 160)).toBe(1.23);
  expect(rounded(1.23456789, 1000)).toBe(1.235);
  expect(rounded(-0.3, 160)).toBe(-0.3);
});

test('a nudged value keeps no dust of binary fractions', () => {
  expect(tidy(0.1 + 0.2)).toBe(0.3);
  expect(Object.is(tidy(-1e-9), 0)).toBe(true);
});
