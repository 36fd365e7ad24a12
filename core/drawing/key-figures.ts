/** The findings beside the elevation: what follows from it in figures, the checks, and what it was computed from. */
import type { AssessedScheme } from '../assess/assess.ts';
import type { SchemeAssessment, Status } from '../assess/assessment.ts';
import type { ResolvedScheme } from '../job/defaults.ts';
import { figure } from '../quantity/figures.ts';
import { paragraphHeight, type Column } from './column.ts';
import type { LengthText } from './draught.ts';
import { entered } from './entered.ts';
import { lettering } from './path.ts';
import { STATUS_ROLES, statusMark } from './status.ts';
import { cutToWidth, plainText, textWidth } from './text.ts';

export function drawKeyFigures(column: Column, { result, resolved }: AssessedScheme, length: LengthText): void {
  column.heading('figures', 'Figures');
  for (const [name, value] of findings(result, resolved)) column.row('figures', name, value);
  column.space(1.5);
  for (const [name, value] of given(resolved, length)) column.row('figures', name, value);
}

type Row = readonly [name: string, value: string];

function findings(result: SchemeAssessment, { asked }: ResolvedScheme): Row[] {
  const { thrust, reactions, geometricSafety, crown } = result;
  const rows: Row[] = [];
  if (geometricSafety !== null) {
    rows.push(['Geometric safety', `${figure(geometricSafety)} (${entered(asked.geometricSafety)} asked for)`]);
  }
  const least = thrust.least?.horizontal ?? null;
  if (least !== null) rows.push(['Least thrust', kilonewtons(least)]);
  if (thrust.stands) {
    const greatest = thrust.greatest?.horizontal ?? null;
    rows.push(['Greatest thrust', greatest === null ? 'no limit' : kilonewtons(greatest)]);
  }
  if (reactions !== null) {
    rows.push(['Vertical, left', kilonewtons(reactions.left.vertical)]);
    rows.push(['Vertical, right', kilonewtons(reactions.right.vertical)]);
  }
  if (crown !== null) rows.push(['Crown balance, mid-ring', kilonewtons(crown.horizontal)]);
  return rows;
}

function given({ ring, masonry, above, backing, breadth, sway, cracks }: ResolvedScheme, length: LengthText): Row[] {
  const { thickness, springingThickness, courses } = ring;
  const rings = courses > 1 ? `${courses} rings of ` : '';
  const rows: Row[] = [['Ring', `${rings}${entered(ring.voussoirs)} voussoirs, ${ring.joints} joints`]];
  if (thickness === springingThickness) {
    rows.push(['Thickness and breadth', `${length(thickness)} and ${length(breadth)}`]);
  } else {
    rows.push(['Thickness, crown to springing', `${length(thickness)} to ${length(springingThickness)}`]);
    rows.push(['Breadth', length(breadth)]);
  }
  rows.push(['Masonry', masonry.name], ['Unit weight', `${entered(masonry.unitWeight)} kN/m³`]);
  if (above.kind === 'none') rows.push(['Above', 'nothing']);
  else rows.push(['Above', `${above.kind} ${length(above.height)}, ${entered(above.unitWeight)} kN/m³`]);
  if (above.kind !== 'none') {
    for (const layer of above.layers) {
      rows.push([plainText(layer.name ?? 'layer'), `${length(layer.thickness)}, ${entered(layer.unitWeight)} kN/m³`]);
    }
  }
  if (above.sidePressure !== 0) rows.push(['Side pressure', `${entered(above.sidePressure)} of the vertical`]);
  if (backing !== null) {
    const counts = backing.counts === 'masonry' ? 'as masonry' : 'weight only';
    rows.push(['Backing', `to ${length(backing.level)}, ${counts}`]);
  }
  if (cracks.length > 0) rows.push(['Openings seen', String(cracks.length)]);
  if (sway !== 0) rows.push(['Sideways', `${entered(sway)} of gravity`]);
  return rows.slice(0, MOST_GIVEN);
}

/** A file may have thousands of layers; the drawing's figures are for the few that matter. */
const MOST_GIVEN = 16;

const kilonewtons = (value: number): string => `${figure(value)} kN`;

/** What fails comes first, so that what finds no room is what holds. */
const ORDER: readonly Status[] = ['fails', 'narrow', 'unknown', 'holds'];

/** Each check with its mark and its word, and the reason in small lettering where there is room for it. */
export function drawChecks(column: Column, result: SchemeAssessment): void {
  const checks = [...result.checks].sort((a, b) => ORDER.indexOf(a.status) - ORDER.indexOf(b.status));
  column.heading('figures', 'Checks');
  for (const [i, { title, status, because }] of checks.entries()) {
    const left = checks.length - i;
    if (column.room < (left === 1 ? CHECK_ROW : 2 * CHECK_ROW)) {
      column.paragraph('figures', `and ${left} more, see the findings`, QUIET);
      return;
    }
    const baseline = column.top - 3.1;
    const word = { height: 2.5, role: STATUS_ROLES[status], align: 'end' } as const;
    const room = column.width - INDENT - textWidth(status, 2.5) - 2;
    column.put('figures', ...statusMark(status, { x: column.left + 1.6, y: column.top - 1.9 }, 2.6));
    column.put('figures', lettering(status, { x: column.left + column.width, y: baseline }, word));
    column.put('figures', lettering(cutToWidth(plainText(title), room, 2.5), { x: column.left + INDENT, y: baseline }));
    column.space(CHECK_ROW);
    const reason = paragraphHeight(because, column.width - INDENT, 1.8);
    if (column.room - reason >= CHECK_ROW * (left - 1)) column.paragraph('figures', because, QUIET, INDENT);
  }
}

const QUIET = { height: 1.8, role: 'text-quiet' } as const;
/** mm */
const CHECK_ROW = 4.6;
const INDENT = 5;
