/** Lines of thrust, the band between them, and the hinges that they make. */
import type { LinePoint, ThrustState } from '../assess/assessment.ts';
import type { Point } from '../geometry/point.ts';
import { put, type Draught } from './draught.ts';
import { hatchLines } from './hatch.ts';
import { drawHinge } from './hinges.ts';
import { polygon, polyline, stroke } from './path.ts';
import type { About } from './scene.ts';

export type StateName = 'least' | 'greatest';

export function drawThrust(draught: Draught): void {
  const { thrust } = draught.result;
  if (thrust.least !== null && thrust.greatest !== null) drawBand(draught, thrust.least, thrust.greatest);
  if (thrust.greatest !== null) drawState(draught, 'greatest', thrust.greatest);
  if (thrust.least !== null) drawState(draught, 'least', thrust.least);
}

function drawState(draught: Draught, name: StateName, state: ThrustState): void {
  const about: About = { kind: 'thrust', state: name };
  for (const run of unbroken(pointsAt(draught, state))) {
    put(draught, `thrust-${name}`, polyline(`thrust-${name}`, run, about));
  }
  for (const hinge of state.hinges) {
    put(draught, 'hinges', ...drawHinge(draught, hinge, `hinge-${name}`, { kind: 'joint', joint: hinge.joint }));
  }
}

/** The line's points at the joints that are drawn and at its hinges. */
function pointsAt({ joints }: Draught, state: ThrustState): LinePoint[] {
  const wanted = new Set([...joints, ...state.hinges.map((hinge) => hinge.joint)]);
  return state.line.filter((_, joint) => wanted.has(joint));
}

/** Stretches without a gap; the line has a gap where the resultant runs along a joint. */
export function unbroken(line: readonly (LinePoint | null)[]): [Point, ...Point[]][] {
  const runs: [Point, ...Point[]][] = [];
  let open = false;
  for (const point of line) {
    if (point === null || point.x === null) {
      open = false;
    } else if (open) {
      runs.at(-1)!.push(point);
    } else {
      runs.push([point]);
      open = true;
    }
  }
  return runs.filter((run) => run.length > 1);
}

/** Between the two lines, from joint to joint where both have a place. */
function drawBand(draught: Draught, least: ThrustState, greatest: ThrustState): void {
  const lower: Point[] = [];
  const upper: Point[] = [];
  for (const joint of draught.joints) {
    const a = least.line[joint];
    const b = greatest.line[joint];
    if (a === undefined || b === undefined || a.x === null || b.x === null) continue;
    lower.push(a);
    upper.push(b);
  }
  const [first, ...rest] = lower;
  if (first === undefined || rest.length === 0) return;
  const figure: [Point, ...Point[]] = [first, ...rest, ...upper.reverse()];
  put(draught, 'thrust-band', polygon('thrust-band', figure));
  const reach = Math.abs(lower.at(-1)!.x - first.x);
  const gap = Math.max(draught.mm(HATCH_GAP), reach / MOST_HATCH_LINES);
  for (const [from, to] of hatchLines(figure, HATCH_ANGLE, gap)) {
    put(draught, 'thrust-band', stroke('thrust-band-hatch', from, to));
  }
}

const HATCH_ANGLE = Math.PI / 4;
/** Paper mm. */
const HATCH_GAP = 1.5;
const MOST_HATCH_LINES = 250;
