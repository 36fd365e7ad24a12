/** Lettering set downwards in a column: headings, paragraphs, figures in two columns, each knowing where the next begins. */
import { lettering, type LetteringStyle } from './path.ts';
import { addItems, type Items, type LayerName, type Lettering, type SceneItem } from './scene.ts';
import { cutToWidth, plainText, textWidth, wrapText } from './text.ts';

/** Line height as a multiple of the height of capitals. */
const LEADING = 1.75;

export class Column {
  /** Where the next line's top is, mm from the bottom of the paper. */
  top: number;

  constructor(
    private readonly items: Items,
    readonly left: number,
    readonly width: number,
    top: number,
    private bottom: number,
  ) {
    this.top = top;
  }

  /** Keeps the lowest `height` mm free; a negative height gives them back. */
  keepFree(height: number): void {
    this.bottom += height;
  }

  get room(): number {
    return this.top - this.bottom;
  }

  space(height: number): void {
    this.top -= height;
  }

  heading(layer: LayerName, text: string): void {
    this.paragraph(layer, text, { height: 2.5, face: 'bold' });
    this.space(0.8);
  }

  /** Sets a paragraph, its first line led by a bullet where one is given; false and nothing set when there is no room. */
  paragraph(
    layer: LayerName,
    text: string,
    how: LetteringStyle & { height: Lettering },
    indent = 0,
    bullet = '',
  ): boolean {
    const lines = wrapText(withUnitsKept(plainText(text)), this.width - indent, how.height, how.face);
    if (lines.length * how.height * LEADING > this.room) return false;
    if (bullet !== '')
      addItems(this.items, layer, lettering(bullet, { x: this.left, y: this.baseline(how.height) }, how));
    for (const line of lines) {
      addItems(this.items, layer, lettering(line, { x: this.left + indent, y: this.baseline(how.height) }, how));
      this.space(how.height * LEADING);
    }
    return true;
  }

  /** A name at the left and a value at the right edge, the name cut short where both do not fit. */
  row(
    layer: LayerName,
    name: string,
    value: string,
    height: Lettering = 2.5,
    valueStyle: LetteringStyle = {},
  ): boolean {
    if (height * LEADING > this.room) return false;
    const shownValue = cutToWidth(plainText(value), this.width * 0.72, height);
    const nameWidth = this.width - textWidth(shownValue, height) - 2;
    const y = this.baseline(height);
    addItems(
      this.items,
      layer,
      lettering(cutToWidth(plainText(name), nameWidth, height), { x: this.left, y }, { height, role: 'text-quiet' }),
      lettering(shownValue, { x: this.left + this.width, y }, { ...valueStyle, height, align: 'end' }),
    );
    this.space(height * LEADING);
    return true;
  }

  /** As many of the texts as there is room for with `kept` mm left over, and a word on the rest. */
  list(layer: LayerName, texts: readonly string[], how: LetteringStyle & { height: Lettering }, kept: number): void {
    const more = how.height * LEADING;
    for (const [i, text] of texts.entries()) {
      const last = i === texts.length - 1;
      const needed = paragraphHeight(text, this.width, how.height) + (last ? 0 : more);
      if (needed > this.room - kept) {
        this.paragraph(
          layer,
          i === 0 ? `${texts.length}, listed in the findings` : `and ${texts.length - i} more`,
          how,
        );
        return;
      }
      this.paragraph(layer, text, how);
      this.space(Math.min(0.6, this.room - more));
    }
  }

  put(layer: LayerName, ...drawn: readonly SceneItem[]): void {
    addItems(this.items, layer, ...drawn);
  }

  private baseline(height: number): number {
    return this.top - height * 1.25;
  }
}

/** Height of a wrapped paragraph, mm. */
export function paragraphHeight(text: string, width: number, height: Lettering): number {
  return wrapText(withUnitsKept(plainText(text)), width, height).length * height * LEADING;
}

/** A figure and its unit stay on one line. */
const withUnitsKept = (text: string): string => text.replace(/(\d) (?=(?:kN|m|mm|kPa|MPa)\b)/g, '$1\u00a0');
