/** u, or the nearer of the two bounds, given in either order. */
export const clampBetween = (u: number, a: number, b: number): number =>
  Math.min(Math.max(u, Math.min(a, b)), Math.max(a, b));
