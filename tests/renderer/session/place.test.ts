import { describe, expect, test } from 'vitest';
import { duplicateScheme, patchScheme, removeScheme, renameArch, setThickness } from '../../../core/job/edits.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import { changedPlace } from '../../../renderer/session/place.ts';

const one = freshJob('segmental');
const two = duplicateScheme(one, 'a1', 's1');
const thicker = patchScheme(two, 'a1', 's2', (scheme) => setThickness(scheme, 0.5));

describe('the scheme that a step was about', () => {
  test('is the one edited, there and back', () => {
    expect(changedPlace(two, thicker)).toEqual({ arch: 'a1', scheme: 's2' });
    expect(changedPlace(thicker, two)).toEqual({ arch: 'a1', scheme: 's2' });
  });

  test('is the one added, also where undo brings it back', () => {
    expect(changedPlace(one, two)).toEqual({ arch: 'a1', scheme: 's2' });
    expect(changedPlace(removeScheme(two, 'a1', 's2'), two)).toEqual({ arch: 'a1', scheme: 's2' });
  });

  test('is none where a scheme went, an arch was renamed or nothing happened', () => {
    expect(changedPlace(two, one)).toBeNull();
    expect(changedPlace(one, renameArch(one, 'a1', 'Door'))).toBeNull();
    expect(changedPlace(one, one)).toBeNull();
  });
});
