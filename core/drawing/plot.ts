/** A small plot with two axes: figures at round steps, what is measured named at the end of each axis. Paper mm. */
import type { Point } from '../geometry/point.ts';
import { figure } from '../quantity/figures.ts';
import { lettering, polyline, stroke } from './path.ts';
import { Places } from './places.ts';
import { addItems, type Items, type LayerName, type SceneItem } from './scene.ts';
import type { Role } from './style.ts';
import { textWidth } from './text.ts';

/** mm */
export interface FigureSize {
  readonly width: number;
  readonly height: number;
}

export const FIGURE_SIZE: FigureSize = { width: 92, height: 58 };

export interface Axis {
  readonly from: number;
  readonly to: number;
  /** What it measures, with its unit. */
  readonly name: string;
}

/** mm */
const MARGIN = { bottom: 10, top: 7, right: 5 } as const;
const LETTERS = 1.8;
const TICK = 1.2;
const MOST_TICKS = 6;

export class Plot {
  readonly items: Items = new Map();
  readonly places = new Places(1);
  private readonly left: number;
  private readonly right: number;
  private readonly bottom = MARGIN.bottom;
  private readonly top: number;

  constructor(
    { width, height }: FigureSize,
    private readonly across: Axis,
    private readonly up: Axis,
  ) {
    const widest = Math.max(...ticksOf(up).map((tick) => textWidth(figureAt(tick, up), LETTERS)));
    this.left = widest + TICK + 2;
    this.right = width - MARGIN.right;
    this.top = height - MARGIN.top;
    this.drawAxes();
  }

  /** Where a pair of values stands on paper. */
  at(x: number, y: number): Point {
    const share = (value: number, { from, to }: Axis): number => (value - from) / (to - from);
    return {
      x: this.left + share(x, this.across) * (this.right - this.left),
      y: this.bottom + share(y, this.up) * (this.top - this.bottom),
    };
  }

  put(layer: LayerName, ...items: readonly SceneItem[]): void {
    addItems(this.items, layer, ...items);
  }

  /** A line through pairs of values, which lettering keeps off. */
  line(layer: LayerName, role: Role, values: readonly (readonly [number, number])[]): void {
    const [start, ...rest] = values.map(([x, y]) => this.at(x, y));
    if (start === undefined || rest.length === 0) return;
    const path = polyline(role, [start, ...rest]);
    this.put(layer, path);
    this.places.blockPath(path);
  }

  /** Lettering beside a point, wherever there is room: right and over it first. */
  letter(text: string, at: Point, role: Role): void {
    const places = [2, 4, 6, 9].flatMap(
      (away) =>
        [
          { dx: 2, dy: away, align: 'start' },
          { dx: -2, dy: away, align: 'end' },
          { dx: 2, dy: -away - LETTERS, align: 'start' },
          { dx: -2, dy: -away - LETTERS, align: 'end' },
          { dx: 0, dy: away, align: 'middle' },
          { dx: 0, dy: -away - LETTERS, align: 'middle' },
        ] as const,
    );
    const placings = places
      .map(({ dx, dy, align }) => [lettering(text, { x: at.x + dx, y: at.y + dy }, { height: LETTERS, align, role })])
      .filter(([placing]) => {
        const reach = textWidth(text, LETTERS);
        const start = placing!.at.x - { start: 0, middle: reach / 2, end: reach }[placing!.align];
        return start > this.left && start + reach < this.right + MARGIN.right && placing!.at.y > this.bottom;
      });
    const placed = this.places.placeSurely(placings, at);
    this.put('notes', ...placed.texts, ...(placed.leader === null ? [] : [placed.leader]));
  }

  private drawAxes(): void {
    const { left, right, bottom, top, across, up } = this;
    for (const tick of ticksOf(across)) {
      const { x } = this.at(tick, up.from);
      this.put('axes', stroke('axis', { x, y: bottom }, { x, y: bottom - TICK }));
      this.text(figureAt(tick, across), { x, y: bottom - TICK - 1 - LETTERS }, 'middle');
    }
    for (const tick of ticksOf(up)) {
      const { y } = this.at(across.from, tick);
      if (y > bottom + 0.1) {
        const line = stroke('grid', { x: left, y }, { x: right, y });
        this.put('frame', line);
        this.places.blockPath(line);
      }
      this.put('axes', stroke('axis', { x: left, y }, { x: left - TICK, y }));
      this.text(figureAt(tick, up), { x: left - TICK - 0.8, y: y - LETTERS / 2 }, 'end');
    }
    const axes = polyline('axis', [
      { x: left, y: top + 1 },
      { x: left, y: bottom },
      { x: right + 1, y: bottom },
    ]);
    this.put('axes', axes);
    this.places.blockPath(axes);
    this.text(up.name, { x: 0.5, y: top + 3.2 }, 'start');
    this.text(across.name, { x: right + 1, y: bottom - TICK - 2.6 - 2 * LETTERS }, 'end');
  }

  private text(text: string, at: Point, align: 'start' | 'middle' | 'end'): void {
    const item = lettering(text, at, { height: LETTERS, align, role: 'text-quiet' });
    this.put('axes', item);
    this.places.blockText(item);
  }
}

const ROUND = [1, 2, 5, 10];

function stepOf({ from, to }: Axis): number {
  const rough = (to - from) / MOST_TICKS;
  const decade = 10 ** Math.floor(Math.log10(rough));
  return decade * (ROUND.find((factor) => factor * decade >= rough * (1 - 1e-9)) ?? 10);
}

function ticksOf(axis: Axis): number[] {
  const step = stepOf(axis);
  const first = Math.ceil(axis.from / step - 1e-9);
  const last = Math.floor(axis.to / step + 1e-9);
  return Array.from({ length: last - first + 1 }, (_, i) => (first + i) * step);
}

/** As many decimals as the step has. */
function figureAt(tick: number, axis: Axis): string {
  const step = stepOf(axis);
  if (Math.abs(tick) < step / 2) return '0';
  return figure(
    tick,
    Math.max(1, 1 + Math.floor(Math.log10(Math.abs(tick)) + 1e-9) - Math.floor(Math.log10(step) + 1e-9)),
  );
}

/** A bound for an axis that leaves room over its greatest value and ends at a round step. */
export function roundOver(value: number): number {
  const step = stepOf({ from: 0, to: value > 0 ? value : 1, name: '' });
  return Math.ceil((value > 0 ? value : 1) / step + 0.1) * step;
}
