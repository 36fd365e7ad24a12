/**
 * The drawing of one arch on a sheet: the elevation at a standard scale with its scale bar, the findings and the legend
 * at the right, cautions and title block at the foot. The same arch on the same paper is always the same sheet.
 */
import type { AssessedScheme } from '../assess/assess.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import { metres } from '../quantity/figures.ts';
import type { LengthText } from './draught.ts';
import { elevation, type Overlays } from './elevation.ts';
import type { Box } from './extent.ts';
import { drawCautions, drawingZone, footHeight, VIEW_TITLE } from './layout.ts';
import { insideFrame, paper, PAPER_NAMES, SCALES, type PaperName, type Scale } from './papers.ts';
import { lettering, rectangle } from './path.ts';
import { scaleBar } from './scale-bar.ts';
import { addItems, makeScene, type Items, type Scene } from './scene.ts';
import type { Paper, Sheet, View } from './sheet.ts';
import { drawSideColumn } from './side-column.ts';
import { plainText } from './text.ts';
import { drawTitleBlock, type TitleBlock } from './title-block.ts';

export interface SheetOptions {
  /** The smallest paper to use, A3 where not given; a larger one is taken when the lettering needs it. */
  readonly paper?: PaperName;
  /** How lengths are lettered; metres where not given. */
  readonly length?: LengthText;
  /** Behind lengths in the columns; `m` where not given, empty where their lettering carries it. */
  readonly lengthUnit?: string;
  /** What the title block says of the units. */
  readonly units?: string;
  /** One answer laid over the elevation, and explained in the legend. */
  readonly overlays?: Overlays;
}

/** What the title block says besides what the drawing itself knows. */
export type SheetTitle = Omit<TitleBlock, 'scale' | 'units' | 'documentType'>;

/**
 * @throws RangeError when the lettering does not fit on the largest paper, which the limits on lettering keep from
 * happening.
 */
export function elevationSheet(assessed: AssessedScheme, title: SheetTitle, options: SheetOptions = {}): Sheet {
  const { paper, scale, scene, zone } = fitted(assessed, options);
  const { resolved } = assessed;
  const items: Items = new Map();
  const { left, bottom, right, top } = insideFrame(paper);
  addItems(items, 'frame', rectangle('frame', left, bottom, right - left, top - bottom));
  const units = options.units ?? 'm, kN';
  const block = { ...title, scale: `${scale.name} on ${paper.name}`, units, documentType: 'Elevation' };
  drawTitleBlock(items, block, right, bottom, footHeight(paper, assessed));
  drawCautions(items, assessed, paper);
  drawViewTitle(items, scale, zone);
  drawSideColumn(items, assessed, paper, {
    key: scene.key,
    texts: [...Object.values(title), ...enteredTexts(resolved)],
    overlays: options.overlays ?? {},
    length: (value) => `${(options.length ?? metres)(value)} ${options.lengthUnit ?? 'm'}`.trim(),
  });
  const furniture = makeScene({ title: 'Sheet', description: '', millimetresPerUnit: 1 }, items);
  const views = [centred(scene, zone), { id: 'furniture', scene: furniture, at: { x: 0, y: 0 } }];
  return { title: headingOf(title), description: scene.description, paper, views };
}

const enteredTexts = ({ masonry, loads, above, cracks }: ResolvedScheme): string[] => [
  masonry.name,
  ...loads.map(({ name }) => name),
  ...above.layers.map(({ name }) => name ?? ''),
  ...cracks.map(({ seenOn }) => seenOn ?? ''),
];

const headingOf = ({ title, subtitle }: SheetTitle): string =>
  [title, subtitle]
    .map(plainText)
    .filter((text) => text !== '')
    .join(', ');

interface Fitted {
  readonly paper: Paper;
  readonly scale: Scale;
  readonly scene: Scene;
  readonly zone: Box;
}

function fitted(assessed: AssessedScheme, options: SheetOptions): Fitted {
  const smallest = options.paper ?? 'A3';
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
      ...options.overlays,
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

function centred(scene: Scene, zone: Box): View {
  const { bounds, millimetresPerUnit: k } = scene;
  const { left, right, bottom, top } = bounds ?? { left: 0, right: 0, bottom: 0, top: 0 };
  return {
    id: 'elevation',
    scene,
    at: { x: (zone.left + zone.right - (left + right) * k) / 2, y: (zone.bottom + zone.top - (bottom + top) * k) / 2 },
  };
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
