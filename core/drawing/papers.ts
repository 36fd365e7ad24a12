/** Sheets of ISO 5457 with their margins, and the scales of ISO 5455. */
import type { Box } from './extent.ts';
import type { Paper } from './sheet.ts';

export type PaperName = 'A4' | 'A3' | 'A2' | 'A1';

const SIZES: Readonly<Record<PaperName, readonly [number, number]>> = {
  A4: [297, 210],
  A3: [420, 297],
  A2: [594, 420],
  A1: [841, 594],
};

/** From the smallest, all lying on their long side. */
export const PAPER_NAMES: readonly PaperName[] = ['A4', 'A3', 'A2', 'A1'];

export function paper(name: PaperName): Paper {
  const [width, height] = SIZES[name];
  return { name, width, height };
}

/** mm: wide at the edge that is bound. */
const BINDING_MARGIN = 20;
const MARGIN = 10;

/** What lies inside the frame, mm from the lower left corner of the paper. */
export const insideFrame = ({ width, height }: Paper): Box => ({
  left: BINDING_MARGIN,
  bottom: MARGIN,
  right: width - MARGIN,
  top: height - MARGIN,
});

export interface Scale {
  /** As it is lettered: 1:20. */
  readonly name: string;
  readonly millimetresPerMetre: number;
}

/** From the largest to the smallest: enlargements, full size, and reductions by 2, 5 and 10 and their tens. */
export const SCALES: readonly Scale[] = [
  ...[50, 20, 10, 5, 2].map((times) => ({ name: `${times}:1`, millimetresPerMetre: 1000 * times })),
  ...[1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000, 20_000].map((by) => ({
    name: `1:${by}`,
    millimetresPerMetre: 1000 / by,
  })),
];
