/** Stress on a joint without tension, linear over its compressed part; standard statics (middle third, triangle beyond). */

export interface StressBlock {
  /** Distance of the resultant from mid-joint, m; positive towards the intrados. */
  readonly eccentricity: number;
  /** Compressed part of the joint, m. */
  readonly compressed: number;
  /** kN/m² at the intrados and extrados ends; zero at an end that has opened. */
  readonly intradosStress: number;
  readonly extradosStress: number;
}

/**
 * e ≤ t/6: N (1 ± 6e/t)/(b t); beyond: 2N/(3 b (t/2 − e)) over 3 (t/2 − e).
 * @param normal kN, compression positive; @param moment kN·m, positive towards the intrados; lengths in m.
 * @returns null when the resultant passes outside the joint or pulls on it.
 */
export function stressBlock(normal: number, moment: number, thickness: number, breadth: number): StressBlock | null {
  if (!(normal > 0)) return null;
  const eccentricity = moment / normal;
  const e = Math.abs(eccentricity);
  if (e >= thickness / 2) return null;
  const mean = normal / (breadth * thickness);
  const inMiddleThird = e <= thickness / 6;
  const compressed = inMiddleThird ? thickness : 3 * (thickness / 2 - e);
  const near = inMiddleThird ? mean * (1 + (6 * e) / thickness) : (2 * normal) / (breadth * compressed);
  const far = inMiddleThird ? mean * (1 - (6 * e) / thickness) : 0;
  const towardsIntrados = eccentricity >= 0;
  return {
    eccentricity,
    compressed,
    intradosStress: towardsIntrados ? near : far,
    extradosStress: towardsIntrados ? far : near,
  };
}
