/** The title block at the foot of a sheet: the fields of ISO 7200, and those that a survey drawing needs besides. */
import { lettering, rectangle, stroke } from './path.ts';
import { addItems, type Items, type Lettering } from './scene.ts';
import { cutToWidth, plainText, type Face } from './text.ts';

export interface TitleBlock {
  readonly owner: string;
  /** Identification number. */
  readonly number: string;
  readonly title: string;
  readonly subtitle: string;
  readonly documentType: string;
  readonly createdBy: string;
  readonly approvedBy: string;
  /** Date of issue as it is to be printed. */
  readonly issuedOn: string;
  readonly sheet: string;
  readonly scale: string;
  readonly units: string;
  readonly surveyedBy: string;
  readonly surveyedOn: string;
}

/** mm; its rows grow with the height it is given. */
export const TITLE_BLOCK = { width: 180, leastHeight: 36 } as const;
const ROWS = 4;

interface Cell {
  readonly label: string;
  readonly value: string;
  readonly width: number;
  readonly height?: Lettering;
  readonly face?: Face;
}

/** @param right, bottom its lower right corner, and its height, in paper mm. */
export function drawTitleBlock(items: Items, block: TitleBlock, right: number, bottom: number, height: number): void {
  const left = right - TITLE_BLOCK.width;
  const row = height / ROWS;
  addItems(items, 'title', {
    ...rectangle('ring-edge', left, bottom, TITLE_BLOCK.width, height),
    closed: false,
  });
  rowsOf(block).forEach((cells, i) => {
    const top = bottom + height - i * row;
    if (i > 0) addItems(items, 'title', stroke('rule', { x: left, y: top }, { x: right, y: top }));
    let x = left;
    for (const cell of cells) {
      if (x > left) addItems(items, 'title', stroke('rule', { x, y: top }, { x, y: top - row }));
      drawCell(items, cell, x, top, row);
      x += cell.width;
    }
  });
}

function rowsOf(block: TitleBlock): readonly (readonly Cell[])[] {
  return [
    [
      { label: 'Title', value: block.title, width: 126, height: 3.5, face: 'bold' },
      { label: 'Identification', value: block.number, width: 54 },
    ],
    [
      { label: 'Arch and scheme', value: block.subtitle, width: 126 },
      { label: 'Document', value: block.documentType, width: 54 },
    ],
    [
      { label: 'Owner', value: block.owner, width: 72 },
      { label: 'Drawn by', value: block.createdBy, width: 54 },
      { label: 'Approved by', value: block.approvedBy, width: 54 },
    ],
    [
      { label: 'Surveyed by', value: block.surveyedBy, width: 46 },
      { label: 'Surveyed on', value: block.surveyedOn, width: 26 },
      { label: 'Issued on', value: block.issuedOn, width: 26 },
      { label: 'Scale', value: block.scale, width: 32 },
      { label: 'Units', value: block.units, width: 28 },
      { label: 'Sheet', value: block.sheet, width: 22 },
    ],
  ];
}

function drawCell(
  items: Items,
  { label, value, width, height = 2.5, face = 'regular' }: Cell,
  left: number,
  top: number,
  row: number,
): void {
  const room = width - 3;
  addItems(
    items,
    'title',
    lettering(label, { x: left + 1.5, y: top - 2.4 }, { height: 1.8, role: 'text-quiet' }),
    lettering(
      cutToWidth(plainText(value), room, height, face),
      { x: left + 1.5, y: top - row + 1.4 },
      { height, face },
    ),
  );
}
