/**
 * Sheets as SVG: millimetres at true scale, one group for each layer, all text escaped, no figure finer than a
 * thousandth of a millimetre. The same sheet always gives the same bytes.
 */
import type { Point } from '../geometry/point.ts';
import type { PathItem, Scene, SceneItem, TextItem } from '../drawing/scene.ts';
import { onPaper, type Paper, type Sheet, type View } from '../drawing/sheet.ts';
import { drawnStyle, FACES, THEMES, type DrawnStyle, type Theme, type ThemeName } from '../drawing/style.ts';
import { emOf, plainText } from '../drawing/text.ts';

export interface SvgOptions {
  /** `print` where not given. */
  readonly theme?: ThemeName;
  /** Fonts to carry in the file, as base64 of their WOFF2; without them the drawing asks for DejaVu Sans by name. */
  readonly fonts?: { readonly regular: string; readonly bold: string };
}

export function sheetToSvg(sheet: Sheet, options: SvgOptions = {}): string {
  const { paper, title, description, views } = sheet;
  const theme = THEMES[options.theme ?? 'print'];
  const used = new Set<string>();
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<svg xmlns="http://www.w3.org/2000/svg" width="${number(paper.width)}mm" height="${number(paper.height)}mm" viewBox="0 0 ${number(paper.width)} ${number(paper.height)}" role="img" aria-labelledby="drawing-title drawing-description" font-family="'DejaVu Sans', sans-serif" text-rendering="geometricPrecision" stroke-linejoin="round" style="font-kerning:none">`,
    `<title id="drawing-title">${escapeText(title)}</title>`,
    `<desc id="drawing-description">${escapeText(description)}</desc>`,
    ...(options.fonts === undefined ? [] : [fontFaces(options.fonts)]),
    `<rect id="sheet" width="${number(paper.width)}" height="${number(paper.height)}" fill="${theme.sheet ?? 'none'}"/>`,
    ...views.map((view) => viewGroup(view, paper, theme, used)),
    '</svg>',
    '',
  ].join('\n');
}

/** One scene in the middle of a sheet of its own. */
export function sceneToSvg(scene: Scene, paper: Paper, options: SvgOptions = {}): string {
  const { bounds, millimetresPerUnit: k } = scene;
  const middle =
    bounds === null
      ? { x: 0, y: 0 }
      : { x: ((bounds.left + bounds.right) / 2) * k, y: ((bounds.bottom + bounds.top) / 2) * k };
  const at = { x: paper.width / 2 - middle.x, y: paper.height / 2 - middle.y };
  const { title, description } = scene;
  return sheetToSvg({ title, description, paper, views: [{ id: 'view', scene, at }] }, options);
}

function fontFaces({ regular, bold }: { regular: string; bold: string }): string {
  const face = (weight: string, data: string): string =>
    `@font-face{font-family:'DejaVu Sans';font-weight:${weight};src:url(data:font/woff2;base64,${data}) format('woff2')}`;
  return `<style>${face('normal', regular)}${face('bold', bold)}</style>`;
}

function viewGroup(view: View, paper: Paper, theme: Theme, used: Set<string>): string {
  const layers = view.scene.layers.map(({ name, items }) => {
    const id = used.has(name) ? `${view.id}-${name}` : name;
    used.add(name);
    return `<g id="${id}">\n${runs(items)
      .map((run) => runGroup(run, view, paper, theme))
      .join('')}</g>`;
  });
  return `<g id="${view.id}-view">\n${layers.join('\n')}\n</g>`;
}

/** Items one after another that are drawn with the same pen share a group. */
function runs(items: readonly SceneItem[]): SceneItem[][] {
  const found: SceneItem[][] = [];
  for (const item of items) {
    const last = found.at(-1);
    const first = last?.[0];
    if (last !== undefined && first?.role === item.role && first.kind === item.kind) last.push(item);
    else found.push([item]);
  }
  return found;
}

function runGroup(run: readonly SceneItem[], view: View, paper: Paper, theme: Theme): string {
  const first = run[0]!;
  const style = drawnStyle(first.role, theme);
  if (style.fill === null && style.stroke === null) return '';
  const place = (point: Point): Point => {
    const { x, y } = onPaper(view, point);
    return { x, y: paper.height - y };
  };
  const inside = run.map((item) =>
    item.kind === 'path' ? pathElement(item, place, view.scene.millimetresPerUnit) : textElement(item, place),
  );
  return `<g ${penAttributes(first, style)}>\n${inside.join('\n')}\n</g>\n`;
}

function penAttributes(item: SceneItem, { stroke, fill, pen, dash }: DrawnStyle): string {
  const closed = item.kind === 'text' || fill !== null;
  const attributes = [`fill="${closed ? (fill ?? 'none') : 'none'}"`];
  if (item.kind === 'path' && stroke !== null) attributes.push(`stroke="${stroke}" stroke-width="${number(pen)}"`);
  if (item.kind === 'path' && dash.length > 0) attributes.push(`stroke-dasharray="${dash.map(number).join(' ')}"`);
  return attributes.join(' ');
}

function pathElement(path: PathItem, place: (point: Point) => Point, millimetresPerUnit: number): string {
  const steps = [`M${pair(place(path.start))}`];
  for (const edge of path.edges) {
    const to = pair(place(edge.to));
    if (edge.kind === 'line') {
      steps.push(`L${to}`);
    } else {
      const radius = number(edge.radius * millimetresPerUnit);
      const large = Math.abs(edge.turn) > Math.PI ? 1 : 0;
      // On paper y runs up and in SVG down, so that an anticlockwise turn is one of falling angles there.
      const sweep = edge.turn > 0 ? 0 : 1;
      steps.push(`A${radius} ${radius} 0 ${large} ${sweep} ${to}`);
    }
  }
  return `<path d="${steps.join('')}${path.closed ? 'Z' : ''}"/>`;
}

const ANCHORS = { start: '', middle: ' text-anchor="middle"', end: ' text-anchor="end"' } as const;

function textElement(text: TextItem, place: (point: Point) => Point): string {
  const { x, y } = place(text.at);
  const { weight, slope } = FACES[text.face];
  const turn =
    text.angle === 0 ? '' : ` transform="rotate(${number((-text.angle * 180) / Math.PI)} ${number(x)} ${number(y)})"`;
  const face = `${weight === 'normal' ? '' : ` font-weight="${weight}"`}${slope === 'normal' ? '' : ` font-style="${slope}"`}`;
  return `<text x="${number(x)}" y="${number(y)}" font-size="${number(emOf(text.height))}"${ANCHORS[text.align]}${face}${turn}>${escapeText(text.text)}</text>`;
}

const pair = ({ x, y }: Point): string => `${number(x)} ${number(y)}`;

/** To a thousandth, without exponent or a minus before nothing. A figure that is none must not reach a drawing. */
function number(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError('a drawing has a place or a size that is not a number');
  const thousandths = Math.round(value * 1000);
  return thousandths === 0 ? '0' : String(thousandths / 1000);
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function escapeText(text: string): string {
  return plainText(text).replace(/[&<>"']/g, (character) => ENTITIES[character]!);
}
