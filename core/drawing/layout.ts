/** How a sheet is divided: the drawing, the column at its right, the foot with cautions and title block. */
import type { AssessedScheme } from '../assess/assess.ts';
import { raisedCautions, standingCautions } from '../checks/cautions.ts';
import { Column, paragraphHeight } from './column.ts';
import type { Box } from './extent.ts';
import { insideFrame } from './papers.ts';
import { stroke } from './path.ts';
import { addItems, type Items } from './scene.ts';
import type { Paper } from './sheet.ts';
import { TITLE_BLOCK } from './title-block.ts';

/** mm */
export const PAD = 4;
export const VIEW_TITLE = 16;
const CAUTION_LETTERS = 1.8;

export const isSmall = ({ width }: Paper): boolean => width < 400;

export const columnWidth = (paper: Paper): number => (isSmall(paper) ? 72 : 92);

const cautionsWidth = (paper: Paper): number =>
  insideFrame(paper).right - insideFrame(paper).left - TITLE_BLOCK.width - 2 * PAD;

const cautionsOf = ({ result, resolved }: AssessedScheme) => ({
  raised: raisedCautions({ ...result, stands: result.thrust.stands, scheme: resolved }).map(({ text }) => text),
  standing: standingCautions,
});

export function footHeight(paper: Paper, assessed: AssessedScheme): number {
  const { raised, standing } = cautionsOf(assessed);
  const width = cautionsWidth(paper);
  const lines = [...raised, ...standing].reduce(
    (sum, text) => sum + paragraphHeight(text, width - BULLET, CAUTION_LETTERS),
    0,
  );
  return Math.max(TITLE_BLOCK.leastHeight, lines + 10);
}

const BULLET = 3.5;

export function drawingZone(paper: Paper, assessed: AssessedScheme): Box {
  const inside = insideFrame(paper);
  return {
    left: inside.left + PAD,
    right: inside.right - columnWidth(paper) - 3 * PAD,
    bottom: inside.bottom + footHeight(paper, assessed) + VIEW_TITLE + PAD,
    top: inside.top - PAD,
  };
}

export function drawCautions(items: Items, assessed: AssessedScheme, paper: Paper): void {
  const { raised, standing } = cautionsOf(assessed);
  const inside = insideFrame(paper);
  const top = inside.bottom + footHeight(paper, assessed);
  const titleLeft = inside.right - TITLE_BLOCK.width;
  addItems(items, 'frame', stroke('rule', { x: inside.left, y: top }, { x: titleLeft, y: top }));
  const column = new Column(items, inside.left + PAD, cautionsWidth(paper), top - 2.5, inside.bottom);
  column.heading('cautions', 'Cautions');
  for (const text of raised) column.paragraph('cautions', text, { height: CAUTION_LETTERS }, BULLET, '▲');
  for (const text of standing)
    column.paragraph('cautions', text, { height: CAUTION_LETTERS, role: 'text-quiet' }, BULLET, '–');
}
