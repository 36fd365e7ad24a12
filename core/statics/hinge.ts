export type Side = 'intrados' | 'extrados';

/** The line of thrust touches this face at this joint; the joint opens at the other face. */
export interface Hinge {
  /** Joints count from 0 at the left springing. */
  readonly joint: number;
  readonly side: Side;
}
