/** An arch as the board has it, for the tests of the board. */
import { assessScheme, type AssessedScheme } from '../../../core/assess/assess.ts';
import { elevation } from '../../../core/drawing/elevation.ts';
import type { Scene } from '../../../core/drawing/scene.ts';
import { addLoad, setAbove } from '../../../core/job/edits.ts';
import { freshScheme } from '../../../core/job/fresh.ts';
import type { DrawnShape } from '../../../core/job/edits.ts';
import type { Scheme } from '../../../core/job/schema.ts';
import { millimetresPerMetre, type Viewport } from '../../../renderer/board/viewport.ts';

/** A hundred and sixty pixels to the metre, the origin in the middle of the lower half. */
export const VIEWPORT: Viewport = { width: 900, height: 700, scale: 160, x: 450, y: 560 };

export interface DrawnArch {
  readonly scheme: Scheme;
  readonly assessed: AssessedScheme;
  readonly scene: Scene;
}

/** With a wall, a post and a floor on it. */
export function drawnArch(shape: DrawnShape = 'segmental', edit: (scheme: Scheme) => Scheme = (s) => s): DrawnArch {
  const walled = setAbove(freshScheme(shape), { kind: 'wall', height: 0.5, unitWeight: 20 });
  const posted = addLoad(walled, { kind: 'point', name: 'post', x: 0.5, force: 6 });
  const scheme = edit(addLoad(posted, { kind: 'strip', name: 'floor', from: -0.5, to: 0.3, intensity: 4 }));
  const outcome = assessScheme({ id: 'a1', name: 'Arch', schemes: [scheme] }, scheme);
  if (!outcome.ok) throw new Error('the arch cannot be built');
  const { assessed } = outcome;
  return { scheme, assessed, scene: elevation(assessed, { millimetresPerMetre: millimetresPerMetre(VIEWPORT) }) };
}
