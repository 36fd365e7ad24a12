/**
 * The drawing of one arch on a sheet: the elevation at a standard scale with its scale bar, the findings and the legend
 * at the right, cautions and title block at the foot. The same arch on the same paper is always the same sheet.
 */
import type { AssessedScheme } from '../assess/assess.ts';
import { raisedCautions, standingCautions } from '../checks/cautions.ts';
import { metres } from '../quantity/figures.ts';
import { Column, paragraphHeight } from './column.ts';
import type { LengthText } from './draught.ts';
import { elevation, headlineOf } from './elevation.ts';
import type { Box } from './extent.ts';
import { drawChecks, drawKeyFigures } from './key-figures.ts';
import { drawLegend, legendHeight } from './legend.ts';
import { insideFrame, paper, PAPER_NAMES, SCALES, type PaperName, type Scale } from './papers.ts';
import { lettering, rectangle, stroke } from './path.ts';
import { scaleBar } from './scale-bar.ts';
import { addItems, makeScene, type Items, type Scene } from './scene.ts';
import type { Paper, Sheet, View } from './sheet.ts';
import { charactersNotInFont, plainText } from './text.ts';
import { drawTitleBlock, TITLE_BLOCK, type TitleBlock } from './title-block.ts';

export interface SheetOptions {
  /** The smallest paper to use; the smallest on which the arch is as large as it would be on A3, where not given. */
  readonly paper?: PaperName;
  /** How lengths are lettered; metres where not given. */
  readonly length?: LengthText;
  readonly units?: string;
}

/** What the title block says besides what the drawing itself knows. */
export type SheetTitle = Omit<TitleBlock, 'scale' | 'units' | 'documentType'>;

export function elevationSheet(assessed: AssessedScheme, title: SheetTitle, options: SheetOptions = {}): Sheet {
  const { paper, scale, scene, zone } = fitted(assessed, options);
  const items: Items = new Map();
  const inside = insideFrame(paper);
  addItems(
    items,
    'frame',
    rectangle('frame', inside.left, inside.bottom, inside.right - inside.left, inside.top - inside.bottom),
  );
  drawTitleBlock(
    items,
    { ...title, scale: `${scale.name} on ${paper.name}`, units: options.units ?? 'm, kN', documentType: 'Elevation' },
    inside.right,
    inside.bottom,
  );
  drawCautions(items, assessed, inside, paper);
  drawViewTitle(items, scale, zone);
  drawColumn(items, assessed, title, scene, paper, options.length ?? metres);
  const furniture = makeScene({ title: 'Sheet', description: '', millimetresPerUnit: 1 }, items);
  const heading = [title.title, title.subtitle]
    .map(plainText)
    .filter((text) => text !== '')
    .join(', ');
  return {
    title: heading,
    description: scene.description,
    paper,
    views: [centred(scene, zone), { id: 'furniture', scene: furniture, at: { x: 0, y: 0 } }],
  };
}

interface Fitted {
  readonly paper: Paper;
  readonly scale: Scale;
  readonly scene: Scene;
  readonly zone: Box;
}

function fitted(assessed: AssessedScheme, options: SheetOptions): Fitted {
  if (options.paper !== undefined) return onPaperFrom(options.paper, assessed, options);
  const onA3 = onPaperFrom('A3', assessed, options);
  const onA4 = fitOn(paper('A4'), assessed, options);
  return onA4 !== null && onA4.scale.millimetresPerMetre >= onA3.scale.millimetresPerMetre ? onA4 : onA3;
}

function onPaperFrom(smallest: PaperName, assessed: AssessedScheme, options: SheetOptions): Fitted {
  for (const name of PAPER_NAMES.slice(PAPER_NAMES.indexOf(smallest))) {
    const found = fitOn(paper(name), assessed, options);
    if (found !== null) return found;
  }
  throw new RangeError('the lettering of this elevation does not fit on the largest sheet');
}

/** The largest standard scale at which the elevation and all its lettering fit. */
function fitOn(paper: Paper, assessed: AssessedScheme, options: SheetOptions): Fitted | null {
  const zone = drawingZone(paper, assessed);
  const width = zone.right - zone.left;
  const height = zone.top - zone.bottom;
  const { joints } = assessed.ring;
  const least = Math.abs(joints.at(-1)!.intrados.x - joints[0]!.intrados.x);
  for (const scale of SCALES) {
    const { millimetresPerMetre } = scale;
    if (least * millimetresPerMetre > width) continue;
    const scene = elevation(assessed, {
      millimetresPerMetre,
      ...(options.length === undefined ? {} : { length: options.length }),
    });
    const { bounds } = scene;
    if (bounds === null) continue;
    const fits =
      (bounds.right - bounds.left) * millimetresPerMetre <= width &&
      (bounds.top - bounds.bottom) * millimetresPerMetre <= height;
    if (fits) return { paper, scale, scene, zone };
  }
  return null;
}

/** mm */
const PAD = 4;
const VIEW_TITLE = 16;
const CAUTION_LETTERS = 1.8;

const isSmall = ({ width }: Paper): boolean => width < 400;

const columnWidth = (paper: Paper): number => (isSmall(paper) ? 72 : 92);

const cautionsWidth = (paper: Paper): number =>
  insideFrame(paper).right - insideFrame(paper).left - TITLE_BLOCK.width - 2 * PAD;

const cautionsOf = ({ result }: AssessedScheme) => ({
  raised: raisedCautions(result).map(({ text }) => text),
  standing: standingCautions,
});

function footHeight(paper: Paper, assessed: AssessedScheme): number {
  const { raised, standing } = cautionsOf(assessed);
  const width = cautionsWidth(paper);
  const lines = [...raised, ...standing].reduce(
    (sum, text) => sum + paragraphHeight(text, width - BULLET, CAUTION_LETTERS),
    0,
  );
  return Math.max(TITLE_BLOCK.height, lines + 12);
}

const BULLET = 3.5;

function drawingZone(paper: Paper, assessed: AssessedScheme): Box {
  const inside = insideFrame(paper);
  return {
    left: inside.left + PAD,
    right: inside.right - columnWidth(paper) - 3 * PAD,
    bottom: inside.bottom + footHeight(paper, assessed) + VIEW_TITLE + PAD,
    top: inside.top - PAD,
  };
}

function centred(scene: Scene, zone: Box): View {
  const { bounds, millimetresPerUnit: k } = scene;
  const { left, right, bottom, top } = bounds ?? { left: 0, right: 0, bottom: 0, top: 0 };
  return {
    id: 'elevation',
    scene,
    at: { x: (zone.left + zone.right - (left + right) * k) / 2, y: (zone.bottom + zone.top - (bottom + top) * k) / 2 },
  };
}

function drawCautions(items: Items, assessed: AssessedScheme, inside: Box, paper: Paper): void {
  const { raised, standing } = cautionsOf(assessed);
  const top = inside.bottom + footHeight(paper, assessed);
  const titleLeft = inside.right - TITLE_BLOCK.width;
  addItems(items, 'frame', stroke('rule', { x: inside.left, y: top }, { x: titleLeft, y: top }));
  addItems(
    items,
    'frame',
    stroke('rule', { x: titleLeft, y: top }, { x: titleLeft, y: inside.bottom + TITLE_BLOCK.height }),
  );
  const column = new Column(items, inside.left + PAD, cautionsWidth(paper), top - 2.5, inside.bottom);
  column.heading('cautions', 'Cautions');
  for (const text of raised) column.paragraph('cautions', text, { height: CAUTION_LETTERS }, BULLET, '▲');
  for (const text of standing)
    column.paragraph('cautions', text, { height: CAUTION_LETTERS, role: 'text-quiet' }, BULLET, '–');
}

function drawViewTitle(items: Items, scale: Scale, zone: Box): void {
  const baseline = zone.bottom - VIEW_TITLE + 4;
  addItems(
    items,
    'notes',
    lettering(`Elevation ${scale.name}`, { x: zone.left, y: baseline + 2.6 }, { height: 3.5, face: 'bold' }),
  );
  addItems(
    items,
    'notes',
    lettering(
      'Forces are for the whole breadth.',
      { x: zone.left, y: baseline - 2 },
      { height: 1.8, role: 'text-quiet' },
    ),
  );
  addItems(items, 'notes', ...scaleBar(scale.millimetresPerMetre, zone.left + 58, baseline).items);
}

function drawColumn(
  items: Items,
  assessed: AssessedScheme,
  title: SheetTitle,
  scene: Scene,
  paper: Paper,
  length: LengthText,
): void {
  const { resolved, result } = assessed;
  const inside = insideFrame(paper);
  const width = columnWidth(paper);
  const left = inside.right - width - PAD;
  const bottom = inside.bottom + TITLE_BLOCK.height;
  addItems(items, 'frame', stroke('rule', { x: left - PAD, y: inside.top }, { x: left - PAD, y: bottom }));
  const small = isSmall(paper);
  const column = new Column(items, left, width, inside.top - PAD, bottom + 2);
  const legend = legendHeight(resolved, result);
  column.keepFree(legend);
  column.paragraph('figures', headlineOf(result), { height: small ? 2.5 : 3.5 });
  column.space(small ? 2 : 4);
  drawKeyFigures(column, assessed, length);
  column.space(2);
  drawChecks(column, result);
  column.keepFree(-legend);
  column.space(Math.min(2, column.room - legend));
  drawLegend(column, resolved, result, small ? 1.8 : 2.5);
  const quiet = { height: 1.8, role: 'text-quiet' } as const;
  if (scene.key.length > 0 && column.room > LEAST_LIST) {
    column.space(2);
    column.heading('legend', 'Loads');
    column.list(
      'legend',
      scene.key.map(({ mark, meaning }) => `${mark}  ${meaning}`),
      quiet,
    );
  }
  if (result.assumed.length > 0 && column.room > LEAST_LIST) {
    column.space(2);
    column.heading('notes', 'Assumed, not given');
    column.list(
      'notes',
      result.assumed.map(({ because }) => because),
      quiet,
    );
  }
  drawFontNote(column, title, assessed);
}

/** Room under which a list is not begun, mm. */
const LEAST_LIST = 16;

function drawFontNote(column: Column, title: SheetTitle, { resolved }: AssessedScheme): void {
  const texts = [...Object.values(title), ...resolved.loads.map(({ name }) => name), resolved.masonry.name];
  if (texts.every((text) => charactersNotInFont(plainText(text)).length === 0)) return;
  column.space(2);
  column.paragraph(
    'notes',
    'Some letters here are not in the drawing’s own font; another font may stand in for them.',
    { height: 1.8, role: 'text-quiet' },
  );
}
