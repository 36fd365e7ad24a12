/** The column at the right of a sheet: the finding in words and figures, checks, legend, and what was assumed. */
import type { AssessedScheme } from '../assess/assess.ts';
import { Column } from './column.ts';
import type { LengthText } from './draught.ts';
import { headlineOf, type Overlays } from './elevation.ts';
import { drawChecks, drawKeyFigures } from './key-figures.ts';
import { drawLegend, legendEntries, legendHeight } from './legend.ts';
import { columnWidth, footHeight, isSmall, PAD } from './layout.ts';
import { insideFrame } from './papers.ts';
import { stroke } from './path.ts';
import { addItems, type Items, type KeyEntry, type LayerName } from './scene.ts';
import type { Paper } from './sheet.ts';
import { charactersNotInFont, plainText } from './text.ts';

export interface SideColumnOptions {
  /** Explains the numbers on the drawing. */
  readonly key: readonly KeyEntry[];
  /** What a person entered and the sheet prints, looked through for letters that the font lacks. */
  readonly texts: readonly string[];
  /** Lengths with their unit. */
  readonly length: LengthText;
  readonly overlays: Overlays;
}

/** What finds no room is counted in its place, never left out without a word. */
export function drawSideColumn(
  items: Items,
  assessed: AssessedScheme,
  paper: Paper,
  { key, texts, length, overlays }: SideColumnOptions,
): void {
  const { resolved, result } = assessed;
  const inside = insideFrame(paper);
  const width = columnWidth(paper);
  const left = inside.right - width - PAD;
  const bottom = inside.bottom + footHeight(paper, assessed);
  addItems(items, 'frame', stroke('rule', { x: left - PAD, y: inside.top }, { x: left - PAD, y: bottom }));
  const small = isSmall(paper);
  const column = new Column(items, left, width, inside.top - PAD, bottom + 2);
  const entries = legendEntries(resolved, result, {
    chosen: overlays.chosen !== undefined,
    moved: overlays.moved !== undefined,
    other: overlays.other?.name,
  });
  const kept = legendHeight(entries) + LISTS_IN_SHORT;
  column.keepFree(kept);
  column.paragraph('figures', headlineOf(result), { height: small ? 2.5 : 3.5 });
  column.space(small ? 2 : 4);
  drawKeyFigures(column, assessed, length);
  column.space(2);
  drawChecks(column, result);
  column.keepFree(-kept);
  column.space(Math.min(2, column.room - kept));
  drawLegend(column, entries, small ? 1.8 : 2.5);
  const loads = key.map(({ mark, meaning }) => `${mark} – ${meaning}`);
  drawList(column, 'legend', 'Loads', loads);
  drawList(
    column,
    'notes',
    'Assumed, not given',
    result.assumed.map(({ because }) => because),
  );
  drawFontNote(column, texts);
}

const QUIET = { height: 1.8, role: 'text-quiet' } as const;
/** Room for a line on each list and a note, mm. */
const LISTS_IN_SHORT = 14;
/** Room under which a list is not begun, mm. */
const LEAST_LIST = 24;

function drawList(column: Column, layer: LayerName, heading: string, texts: readonly string[]): void {
  if (texts.length === 0) return;
  if (column.room < LEAST_LIST) {
    column.paragraph(layer, `${heading}: ${texts.length}, listed in the findings`, QUIET);
    return;
  }
  column.space(2);
  column.heading(layer, heading);
  column.list(layer, texts, QUIET, LISTS_IN_SHORT);
}

function drawFontNote(column: Column, texts: readonly string[]): void {
  if (texts.every((text) => charactersNotInFont(plainText(text)).length === 0)) return;
  column.space(2);
  const note = 'Some letters here are not in the drawing’s own font; another font may stand in for them.';
  column.paragraph('notes', note, QUIET);
}
