/** A sheet of paper with views on it. Whatever an export needs to know is here. */
import type { Point } from '../geometry/point.ts';
import type { Scene } from './scene.ts';

export interface View {
  /** Plain and unique on its sheet, such as `elevation`. */
  readonly id: string;
  readonly scene: Scene;
  /** Where the origin of the scene lies on the paper, mm from its lower left corner. */
  readonly at: Point;
}

export interface Paper {
  readonly name: string;
  /** mm */
  readonly width: number;
  readonly height: number;
}

export interface Sheet {
  readonly title: string;
  readonly description: string;
  readonly paper: Paper;
  readonly views: readonly View[];
}

/** A place of a view's scene on the paper, mm from the lower left corner. */
export const onPaper = ({ scene, at }: View, point: Point): Point => ({
  x: at.x + point.x * scene.millimetresPerUnit,
  y: at.y + point.y * scene.millimetresPerUnit,
});
