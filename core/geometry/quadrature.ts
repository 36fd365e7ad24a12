/** Gauss–Legendre nodes and weights on −1…1, ten points: exact for polynomials to degree 19 (Abramowitz & Stegun, 25.4). */
const NODES = [0.1488743389816312, 0.4333953941292472, 0.6794095682990244, 0.8650633666889845, 0.9739065285171717];
const WEIGHTS = [0.2955242247147529, 0.2692667193099963, 0.219086362515982, 0.1494513491505806, 0.0666713443086881];

/** Calls `visit` with each abscissa between a and b and the weight that belongs to it. */
export function eachGaussPoint(a: number, b: number, visit: (u: number, weight: number) => void): void {
  const middle = (a + b) / 2;
  const half = (b - a) / 2;
  for (let i = 0; i < NODES.length; i++) {
    const node = NODES[i] as number;
    const weight = (WEIGHTS[i] as number) * half;
    visit(middle - node * half, weight);
    visit(middle + node * half, weight);
  }
}
