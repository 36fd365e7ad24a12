/**
 * What the resultant does at each joint, as affine forms of the state (X0, Y0, M0); all scaled. Each is made once for a
 * system, however many questions are asked of it.
 */
import type { JointForms } from './ratio.ts';
import { momentAbout, oncePerSystem, type RingSystem } from './system.ts';

const emptyForms = (joints: number): JointForms => ({ a: new Float64Array(3 * joints), b: new Float64Array(joints) });

/** Moment about mid-joint, positive when the resultant passes towards the intrados. */
export const momentForms = oncePerSystem((system): JointForms => {
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
});

/** Lengths of the joints, scaled. */
export const jointLengths = oncePerSystem((system): Float64Array => {
  const lengths = new Float64Array(system.joints);
  for (let j = 0; j < system.joints; j++) {
    const dx = (system.ex[j] as number) - (system.ix[j] as number);
    const dy = (system.ey[j] as number) - (system.iy[j] as number);
    lengths[j] = Math.sqrt(dx * dx + dy * dy);
  }
  return lengths;
});

/** Normal force times half the joint: the moment that an edge can balance. */
export const halfMomentForms = oncePerSystem((system): JointForms => {
  const forms = emptyForms(system.joints);
  for (let j = 0; j < system.joints; j++) {
    const vx = ((system.ey[j] as number) - (system.iy[j] as number)) / 2;
    const vy = ((system.ix[j] as number) - (system.ex[j] as number)) / 2;
    setForce(forms, system, j, vx, vy);
  }
  return forms;
});

/** Normal force, positive in compression. */
export const normalForms = oncePerSystem((system): JointForms => {
  const forms = emptyForms(system.joints);
  const lengths = jointLengths(system);
  for (let j = 0; j < system.joints; j++) {
    const t = lengths[j] as number;
    const vx = ((system.ey[j] as number) - (system.iy[j] as number)) / t;
    const vy = ((system.ix[j] as number) - (system.ex[j] as number)) / t;
    setForce(forms, system, j, vx, vy);
  }
  return forms;
});

/** Shear along the joint, positive towards the extrados. */
export const shearForms = oncePerSystem((system): JointForms => {
  const forms = emptyForms(system.joints);
  const lengths = jointLengths(system);
  for (let j = 0; j < system.joints; j++) {
    const t = lengths[j] as number;
    const vx = ((system.ex[j] as number) - (system.ix[j] as number)) / t;
    const vy = ((system.ey[j] as number) - (system.iy[j] as number)) / t;
    setForce(forms, system, j, vx, vy);
  }
  return forms;
});

/** The form of the force along (vx, vy) at joint j. */
function setForce(forms: JointForms, { sums }: RingSystem, j: number, vx: number, vy: number): void {
  forms.a[3 * j] = vx;
  forms.a[3 * j + 1] = vy;
  forms.b[j] = vx * (sums.fx[j] as number) + vy * (sums.fy[j] as number);
}
