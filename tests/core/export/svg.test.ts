import { describe, expect, it } from 'vitest';
import { elevationSheet } from '../../../core/drawing/elevation-sheet.ts';
import { elevation } from '../../../core/drawing/elevation.ts';
import { circle, lettering, stroke } from '../../../core/drawing/path.ts';
import { addItems, LAYERS, makeScene, type Items, type SceneItem } from '../../../core/drawing/scene.ts';
import { sceneToSvg, sheetToSvg } from '../../../core/export/svg.ts';
import { assessed, northDoor, SHEET_TITLE, thinRing } from '../drawing/arches.ts';
import { elements, readXml, textOf, type XmlElement } from './xml.ts';

const A3 = { name: 'A3', width: 420, height: 297 };
const sheet = (arch = northDoor(), title = SHEET_TITLE) => elevationSheet(arch, title);
const layer = (root: XmlElement, id: string): XmlElement =>
  elements(root, 'g').find(({ attributes }) => attributes['id'] === id)!;

function sceneOf(...items: SceneItem[]) {
  const gathered: Items = new Map();
  addItems(gathered, 'notes', ...items);
  return makeScene({ title: 'A scene', description: '', millimetresPerUnit: 50 }, gathered);
}

describe('an SVG drawing', () => {
  it('is well-formed, in millimetres of its paper, with a title and a description', () => {
    const root = readXml(sheetToSvg(sheet()));
    expect(root.attributes).toMatchObject({ width: '420mm', height: '297mm', viewBox: '0 0 420 297' });
    expect(textOf(elements(root, 'title')[0]!)).toBe('Harrowmere Mill, undercroft, North door / As found');
    expect(textOf(elements(root, 'desc')[0]!)).toContain('Stands in compression alone');
  });

  it('has one group for each layer, named after what it holds, no name twice', () => {
    const ids = elements(readXml(sheetToSvg(sheet())), 'g').flatMap(({ attributes }) => attributes['id'] ?? []);
    expect(new Set(ids).size).toBe(ids.length);
    expect(ids).toEqual(
      expect.arrayContaining(['voussoirs', 'joints', 'thrust-least', 'loads', 'dimensions', 'cautions', 'title']),
    );
    for (const id of ids.filter((each) => !each.endsWith('-view'))) {
      expect(LAYERS.some((name) => id === name || id === `furniture-${name}`)).toBe(true);
    }
  });

  it('is at true scale: 3.20 m of springing line are 160 mm at 1:20', () => {
    const [line] = elements(layer(readXml(sheetToSvg(sheet())), 'springing'), 'path');
    const [, x0, y0, x1, y1] = /^M([\d.]+) ([\d.]+)L([\d.]+) ([\d.]+)$/.exec(line!.attributes['d']!)!.map(Number);
    expect(x1! - x0!).toBeCloseTo(160, 3);
    expect(y1).toBe(y0);
  });

  it('turns arcs the way they go: the soffit over the springing line, not under it', () => {
    const root = readXml(sceneToSvg(elevation(thinRing(), { millimetresPerMetre: 50 }), A3));
    const d = elements(layer(root, 'joints'), 'path').map(({ attributes }) => attributes['d']!);
    // From left to right over the top is clockwise as one looks at it: sweep 1.
    expect(d.filter((path) => /^M[\d.]+ [\d.]+A75 75 0 0 1 /.test(path))).toHaveLength(1);
    expect(d.filter((path) => /^M[\d.]+ [\d.]+A81 81 0 0 1 /.test(path))).toHaveLength(1);
  });

  it('holds no figure finer than a thousandth, no exponent, no minus before nothing', () => {
    const scene = sceneOf(
      stroke('joint', { x: -1e-19, y: 1e-17 }, { x: 1 / 3, y: -0 }),
      circle('support', { x: 0, y: 0 }, 1e-12),
      lettering('3.20', { x: 0, y: -1e-14 }, { angle: -1e-15 }),
    );
    for (const svg of [sceneToSvg(scene, A3), sheetToSvg(sheet())]) {
      const figures = svg.replace(/>[^<]*</g, '><').match(/(?<![\w#.-])-?\d[\d.]*(?:e[-+]?\d+)?/g) ?? [];
      expect(figures.length).toBeGreaterThan(5);
      for (const figure of figures) expect(figure).toMatch(/^-?\d+(?:\.\d{1,3})?$/);
      expect(svg).not.toMatch(/NaN|Infinity|(?<![\d.])-0(?![\d.])|\de[-+]\d/);
    }
  });

  it('refuses a place that is not a number rather than draw it wrongly', () => {
    expect(() => sceneToSvg(sceneOf(stroke('joint', { x: NaN, y: 0 }, { x: 1, y: 0 })), A3)).toThrow(RangeError);
  });

  it('is the same to the byte every time', () => {
    expect(sheetToSvg(sheet())).toBe(sheetToSvg(sheet()));
  });
});

describe('text from a file', () => {
  const hostile = [
    '<script>alert(1)</script>',
    '"><image href="x" onload="alert(1)"/>',
    ']]> <!-- --> <?php ?> &lt; &#0; &bogus;',
    '%%d %%c \\P {\\fArial;}',
    'nul \u0000 bell \u0007 escape \u001b[31m',
    '\u202eright to left\u202c \u2066isolate',
    'שער הטחנה بوابة 橋の門 \ud83c\udf09',
    'lone \ud800 half \udc00',
    '\uffff\ufffe',
  ];

  it.each(hostile)('is inert: %j', (text) => {
    const arch = assessed(
      {
        profile: { shape: 'semicircular', span: 3.2 },
        ring: { thickness: 0.5 },
        masonry: { name: text },
        loads: [
          { id: text, name: text, kind: 'point', x: 0.4, force: 12 },
          { id: 'l2', name: text, kind: 'strip', from: -1, to: 0.5, intensity: 8 },
        ],
        name: text,
      },
      text,
    );
    const title = Object.fromEntries(Object.keys(SHEET_TITLE).map((key) => [key, text])) as typeof SHEET_TITLE;
    const root = readXml(sheetToSvg(sheet(arch, title)));
    const names = new Set(root.children.flatMap((child) => (typeof child === 'string' ? [] : everyName(child))));
    expect([...names].sort()).toEqual(['desc', 'g', 'path', 'rect', 'text', 'title']);
    // Line ends stand between elements only; nothing that turns or hides text is left anywhere.
    expect(textOf(root).replaceAll('\n', '')).not.toMatch(/[\p{Cc}\p{Cf}\p{Cs}]/u);
  });

  it('keeps what can be shown', () => {
    const root = readXml(
      sheetToSvg(sheet(northDoor(), { ...SHEET_TITLE, owner: 'R & J <Masons> "Ltd"', number: 'Ä-橋-7' })),
    );
    const shown = elements(root, 'text').map(textOf);
    expect(shown).toEqual(expect.arrayContaining(['R & J <Masons> "Ltd"', 'Ä-橋-7']));
  });
});

function everyName(element: XmlElement): string[] {
  return [element.name, ...element.children.flatMap((child) => (typeof child === 'string' ? [] : everyName(child)))];
}

describe('themes', () => {
  const colours = (svg: string): Set<string> => new Set(svg.match(/#[0-9A-F]{6}/gi));

  it('has black and white of those two only', () => {
    expect(colours(sheetToSvg(sheet(), { theme: 'black-and-white' }))).toEqual(new Set(['#000000', '#FFFFFF']));
  });

  it('hatches the band in black and white, and washes it in colour', () => {
    const band = (svg: string) => elements(layer(readXml(svg), 'thrust-band'), 'path').length;
    expect(band(sheetToSvg(sheet(), { theme: 'black-and-white' }))).toBeGreaterThan(20);
    expect(band(sheetToSvg(sheet(), { theme: 'light' }))).toBe(1);
  });

  it('prints on white unless asked', () => {
    expect(sheetToSvg(sheet())).toContain('<rect id="sheet" width="420" height="297" fill="#FFFFFF"/>');
  });
});

it('carries its fonts when they are handed in, and asks for them by name otherwise', () => {
  const carried = sheetToSvg(sheet(), { fonts: { regular: 'AAAA', bold: 'BBBB' } });
  expect(textOf(elements(readXml(carried), 'style')[0]!)).toContain(
    'font-weight:bold;src:url(data:font/woff2;base64,BBBB)',
  );
  expect(sheetToSvg(sheet())).not.toContain('@font-face');
  expect(readXml(sheetToSvg(sheet())).attributes['font-family']).toBe("'DejaVu Sans', sans-serif");
});
