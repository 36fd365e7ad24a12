/** A scale bar that stays true however the sheet is copied: five divisions, dark and light in turn. */
import { figure } from '../quantity/figures.ts';
import { lettering, rectangle, stroke } from './path.ts';
import type { SceneItem } from './scene.ts';

const DIVISIONS = 5;
/** mm */
const LONGEST = 100;
const HEIGHT = 1.6;
const LETTERS = 2.5;

export interface ScaleBar {
  /** What the whole bar stands for, m. */
  readonly metres: number;
  /** Its length on paper, mm: exactly metres × scale. */
  readonly length: number;
  readonly items: readonly SceneItem[];
}

/** @param left, bottom lower left corner of the bar in paper mm. */
export function scaleBar(millimetresPerMetre: number, left: number, bottom: number): ScaleBar {
  const division = roundDown(LONGEST / DIVISIONS / millimetresPerMetre);
  const step = division * millimetresPerMetre;
  const inMillimetres = division < 0.01;
  const unit = inMillimetres ? 'mm' : 'm';
  const items: SceneItem[] = [];
  for (let i = 0; i < DIVISIONS; i++) {
    items.push(rectangle(i % 2 === 0 ? 'scale-bar-dark' : 'scale-bar', left + i * step, bottom, step, HEIGHT));
  }
  for (let i = 0; i <= DIVISIONS; i++) {
    const x = left + i * step;
    items.push(stroke('scale-bar', { x, y: bottom }, { x, y: bottom + HEIGHT + 1 }));
    const value = figure(i * division * (inMillimetres ? 1000 : 1), 6)
      .replace(/(\.\d*?)0+$/, '$1')
      .replace(/\.$/, '');
    const last = i === DIVISIONS;
    items.push(
      lettering(
        last ? `${value} ${unit}` : value,
        { x: last ? x - 1.2 : x, y: bottom + HEIGHT + 1.8 },
        { height: LETTERS, align: last ? 'start' : 'middle' },
      ),
    );
  }
  return { metres: division * DIVISIONS, length: step * DIVISIONS, items };
}

/** The largest of 1, 2 and 5 times a power of ten that is not more than this. */
function roundDown(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value) + 1e-9);
  const times = [5, 2, 1].find((first) => first * power <= value * (1 + 1e-9)) ?? 1;
  return power < 1 ? times / Math.round(1 / power) : times * power;
}
