/** Gauss–Legendre rules on −1…1 (Abramowitz & Stegun, Table 25.4): `points` points are exact to degree 2·points − 1. */
export interface GaussRule {
  readonly points: number;
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

function symmetricRule(nodes: readonly number[], weights: readonly number[]): GaussRule {
  const both = [...nodes.map((node) => -node), ...nodes];
  return { points: both.length, nodes: Float64Array.from(both), weights: Float64Array.from([...weights, ...weights]) };
}

/** For a whole span of a curve. */
export const TEN_POINTS = symmetricRule(
  [0.1488743389816312, 0.4333953941292472, 0.6794095682990244, 0.8650633666889845, 0.9739065285171717],
  [0.2955242247147529, 0.2692667193099963, 0.219086362515982, 0.1494513491505806, 0.0666713443086881],
);

/** For less than half a span, where it leaves no more error than ten points on the whole. */
export const SIX_POINTS = symmetricRule(
  [0.2386191860831969, 0.6612093864662645, 0.9324695142031521],
  [0.467913934572691, 0.3607615730481386, 0.1713244923791704],
);

/** For a sixth of a span and less, where four points leave no more than rounding. */
export const FOUR_POINTS = symmetricRule(
  [0.3399810435848563, 0.8611363115940526],
  [0.6521451548625461, 0.3478548451374538],
);
