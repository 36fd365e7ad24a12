/** One force on one block, acting at (x, y): kN and m, y up, so a weight has a negative fy. */
export interface BlockForce {
  readonly x: number;
  readonly y: number;
  readonly fx: number;
  readonly fy: number;
  /** `self-weight`, `above`, `sway`, or the id of the load it comes from. */
  readonly from: string;
}

/** The forces on one block of the ring. */
export interface Block {
  readonly forces: readonly BlockForce[];
}

/** Forces per block, left to right, while they are gathered. */
export type BlockForces = BlockForce[][];
