/** What the resultant does at each joint, as affine forms of the state (X0, Y0, M0); all scaled. */
import type { JointForms } from './ratio.ts';
import { momentAbout, type RingSystem } from './system.ts';

const emptyForms = (joints: number): JointForms => ({ a: new Float64Array(3 * joints), b: new Float64Array(joints) });

/** Moment about mid-joint, positive when the resultant passes towards the intrados. */
export function momentForms(system: RingSystem): JointForms {
  const forms = emptyForms(system.joints);
  for (let j = 0; j < system.joints; j++) {
    const px = ((system.ex[j] as number) + (system.ix[j] as number)) / 2;
    const py = ((system.ey[j] as number) + (system.iy[j] as number)) / 2;
    forms.a[3 * j] = py;
    forms.a[3 * j + 1] = -px;
    forms.a[3 * j + 2] = 1;
    forms.b[j] = momentAbout(system.sums, j, px, py);
  }
  return forms;
}

/** Force along (vx, vy) at each joint, where (vx, vy) is made from the joint's own direction from intrados to extrados. */
function forceForms(system: RingSystem, direction: (dx: number, dy: number) => readonly [number, number]): JointForms {
  const forms = emptyForms(system.joints);
  for (let j = 0; j < system.joints; j++) {
    const [vx, vy] = direction(
      (system.ex[j] as number) - (system.ix[j] as number),
      (system.ey[j] as number) - (system.iy[j] as number),
    );
    forms.a[3 * j] = vx;
    forms.a[3 * j + 1] = vy;
    forms.b[j] = vx * (system.sums.fx[j] as number) + vy * (system.sums.fy[j] as number);
  }
  return forms;
}

/** Normal force, positive in compression. */
export const normalForms = (system: RingSystem): JointForms =>
  forceForms(system, (dx, dy) => {
    const t = Math.hypot(dx, dy);
    return [dy / t, -dx / t];
  });

/** Normal force times half the joint: the moment that an edge can balance. */
export const halfMomentForms = (system: RingSystem): JointForms => forceForms(system, (dx, dy) => [dy / 2, -dx / 2]);

/** Shear along the joint, positive towards the extrados. */
export const shearForms = (system: RingSystem): JointForms =>
  forceForms(system, (dx, dy) => {
    const t = Math.hypot(dx, dy);
    return [dx / t, dy / t];
  });

/** Lengths of the joints, scaled. */
export const jointLengths = (system: RingSystem): Float64Array =>
  system.ex.map((ex, j) =>
    Math.hypot(ex - (system.ix[j] as number), (system.ey[j] as number) - (system.iy[j] as number)),
  );
