import { describe, expect, it } from 'vitest';
import { drawnStyle, STYLES, THEMES, type Role, type Style, type ThemeName } from '../../../core/drawing/style.ts';

/** Relative luminance and contrast by WCAG 2.2, success criterion 1.4.3. */
function luminance(colour: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const share = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r! + 0.7152 * g! + 0.0722 * b!;
}
function contrast(a: string, b: string): number {
  const [dark, light] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (light! + 0.05) / (dark! + 0.05);
}

describe.each(Object.keys(THEMES) as ThemeName[])('%s', (name) => {
  const theme = THEMES[name];
  const sheet = theme.sheet!;
  const roles = Object.keys(STYLES) as Role[];

  it.each(roles.filter((role) => role.startsWith('text')))('letters %s readably on the sheet', (role) => {
    expect(contrast(drawnStyle(role, theme).fill!, sheet)).toBeGreaterThanOrEqual(4.5);
  });

  it.each([
    'thrust-least',
    'thrust-greatest',
    'reaction',
    'hinge-least',
    'ring-edge',
    'ghost',
    'mark-fails',
    'thrust-chosen',
    'crack',
    'opening-gap',
  ] as const)('draws %s to be seen on sheet, stone and wash alike', (role) => {
    for (const ground of [theme.sheet, theme.stone1, theme.wash ?? theme.sheet]) {
      expect(contrast(drawnStyle(role, theme).stroke!, ground!)).toBeGreaterThanOrEqual(3);
    }
  });
});

describe('without colour', () => {
  const look = (role: Role): string => {
    const { dash, pen, fill }: Style = STYLES[role];
    return JSON.stringify({ dash, pen, open: fill === undefined || fill === 'sheet' });
  };

  it.each<[Role, Role]>([
    ['thrust-least', 'thrust-greatest'],
    ['hinge-least', 'hinge-greatest'],
    ['load-head', 'reaction-head'],
    ['datum', 'ghost'],
    ['thrust-least', 'ghost'],
    ['thrust-greatest', 'ghost'],
    ['joint', 'ring-edge'],
    ['other-least', 'other-greatest'],
    ['other-least', 'thrust-least'],
    ['other-greatest', 'thrust-greatest'],
    ['other-outline', 'as-it-was'],
    ['other-outline', 'datum'],
    ['thrust-chosen', 'thrust-least'],
    ['thrust-chosen', 'thrust-greatest'],
    ['backing-hatch', 'backing-bond'],
    ['as-it-was', 'moved-stone'],
    ['opening-gap', 'hinge-least'],
    ['load-spread', 'load'],
    ['curve', 'curve-limit'],
  ])('%s and %s differ by dash, pen or by being open', (a, b) => {
    expect(look(a)).not.toBe(look(b));
  });

  it('uses pens of the ISO 128 series only', () => {
    const pens = Object.values(STYLES).flatMap((style: Style) => style.pen ?? []);
    for (const pen of pens) expect([0.13, 0.18, 0.25, 0.35, 0.5, 0.7]).toContain(pen);
  });
});
