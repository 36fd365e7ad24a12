/**
 * Finds room for lettering, by rule and always the same way: each label brings its places in order of preference, and
 * the first one that touches nothing is taken. What is drawn is kept as convex figures; two of them are apart when
 * some edge of either has the other wholly beyond it (the separating axis of convex figures).
 */
import type { Edge } from '../geometry/curve.ts';
import type { Point } from '../geometry/point.ts';
import { boxOf, textCorners, type Box } from './extent.ts';
import { along, stroke } from './path.ts';
import type { PathItem, TextItem } from './scene.ts';

/** Least distance between lettering and anything else, paper mm. */
const CLEARANCE = 0.6;

type ArcEdge = Extract<Edge, { kind: 'arc' }>;

interface Taken {
  readonly corners: readonly Point[];
  readonly box: Box;
  readonly lettering: boolean;
}

/** A label of one or more lines in one of its possible places. */
export type Placing = readonly TextItem[];

export interface Placed {
  readonly texts: Placing;
  /** Drawn from the thing to its label when the label had to go far. */
  readonly leader: PathItem | null;
}

export class Places {
  private readonly taken: Taken[] = [];
  private readonly clearance: number;

  constructor(private readonly millimetresPerUnit: number) {
    this.clearance = CLEARANCE / millimetresPerUnit;
  }

  /** Keeps lettering off a convex figure, or off the straight line between two points. */
  block(corners: readonly Point[]): void {
    this.take(corners, false);
  }

  /** Keeps lettering off every edge of a path. */
  blockPath(path: PathItem): void {
    let from = path.start;
    for (const edge of path.edges) {
      for (const to of edge.kind === 'line' ? [edge.to] : chordsOf(edge)) {
        this.block([from, to]);
        from = to;
      }
    }
  }

  blockText(text: TextItem): void {
    this.take(textCorners(text, this.millimetresPerUnit), true);
  }

  /** Takes the first placing that is free; null when none is. */
  place(placings: Iterable<Placing>): Placing | null {
    for (const placing of placings) {
      if (!this.isFree(placing)) continue;
      placing.forEach((text) => this.blockText(text));
      return placing;
    }
    return null;
  }

  /**
   * Like `place`, but goes on outwards in rings from `from` until there is room, with a leader back to it. The plane is
   * large, so there always is room within `RINGS`.
   */
  placeSurely(placings: Iterable<Placing>, from: Point): Placed {
    const wished = [...placings];
    const near = this.place(wished);
    if (near !== null) return { texts: near, leader: null };
    const first = wished[0];
    if (first === undefined) return { texts: [], leader: null };
    for (let ring = 1; ring <= RINGS; ring++) {
      for (const direction of DIRECTIONS) {
        const end = along(from, direction, (ring * RING_STEP) / this.millimetresPerUnit);
        const texts = this.hungFrom(first, end, Math.cos(direction) >= 0);
        const leader = stroke('leader', from, end);
        const crossed =
          ring < RINGS_WITH_CLEAR_LEADER &&
          this.taken.some((other) => other.lettering && !apart([from, end], other.corners, 0));
        if (crossed || !this.isFree(texts)) continue;
        texts.forEach((text) => this.blockText(text));
        this.blockPath(leader);
        return { texts, leader };
      }
    }
    return { texts: first, leader: null };
  }

  isFree(placing: Placing): boolean {
    return placing.every((text) => this.isClear(textCorners(text, this.millimetresPerUnit)));
  }

  /** Whether a convex figure or a line touches nothing that is drawn. */
  isClear(corners: readonly Point[]): boolean {
    const box = boxOf(corners);
    const { clearance } = this;
    if (box === null) return true;
    return this.taken.every(
      (other) => boxesApart(box, other.box, clearance) || apart(corners, other.corners, clearance),
    );
  }

  /** The lines of a label, level, beginning (or ending) just beyond the end of its leader. */
  private hungFrom(label: Placing, end: Point, rightwards: boolean): Placing {
    const gap = 1 / this.millimetresPerUnit;
    const top = label.reduce((most, text) => Math.max(most, text.at.y), -Infinity);
    return label.map((text) => ({
      ...text,
      angle: 0,
      align: rightwards ? ('start' as const) : ('end' as const),
      at: {
        x: end.x + (rightwards ? gap : -gap),
        y: end.y - text.height / 2 / this.millimetresPerUnit + (text.angle === 0 ? text.at.y - top : 0),
      },
    }));
  }

  private take(corners: readonly Point[], lettering: boolean): void {
    const box = boxOf(corners);
    if (box !== null) this.taken.push({ corners, box, lettering });
  }
}

/** Chords of an arc that turn no more than this, radians, lie close enough to it for lettering. */
const CHORD_TURN = 0.1;

function chordsOf({ centre, radius, from, turn }: ArcEdge): Point[] {
  const count = Math.ceil(Math.abs(turn) / CHORD_TURN);
  return Array.from({ length: count }, (_, i) => along(centre, from + (turn * (i + 1)) / count, radius));
}

/** Paper mm from one ring of tries to the next. */
const RING_STEP = 6;
/** Rings within which a leader may not cross other lettering; beyond, a crossed label is better than none. */
const RINGS_WITH_CLEAR_LEADER = 60;
const RINGS = 400;
/** Down and to the sides first: the space over an arch belongs to its loads. */
const DIRECTIONS = [-45, -135, -20, -160, 20, 160, 45, 135, -70, -110, 70, 110].map(
  (degrees) => (degrees * Math.PI) / 180,
);

const boxesApart = (a: Box, b: Box, clearance: number): boolean =>
  a.left >= b.right + clearance ||
  b.left >= a.right + clearance ||
  a.bottom >= b.top + clearance ||
  b.bottom >= a.top + clearance;

/** Whether two convex figures are at least `clearance` apart; segments count as figures of two corners. */
export function apart(a: readonly Point[], b: readonly Point[], clearance: number): boolean {
  return hasSeparatingEdge(a, b, clearance) || hasSeparatingEdge(b, a, clearance);
}

function hasSeparatingEdge(figure: readonly Point[], other: readonly Point[], clearance: number): boolean {
  for (let i = 0; i < figure.length; i++) {
    const p = figure[i] as Point;
    const q = figure[(i + 1) % figure.length] as Point;
    const length = Math.hypot(q.x - p.x, q.y - p.y);
    if (length === 0) continue;
    const nx = (q.y - p.y) / length;
    const ny = (p.x - q.x) / length;
    const [least, most] = reach(figure, nx, ny);
    const [otherLeast, otherMost] = reach(other, nx, ny);
    if (otherLeast >= most + clearance || least >= otherMost + clearance) return true;
  }
  return false;
}

function reach(figure: readonly Point[], nx: number, ny: number): [number, number] {
  let least = Infinity;
  let most = -Infinity;
  for (const { x, y } of figure) {
    const value = x * nx + y * ny;
    least = Math.min(least, value);
    most = Math.max(most, value);
  }
  return [least, most];
}
