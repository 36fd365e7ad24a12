/**
 * How each thing on a drawing is drawn. An item names its role; the role gives pen, dashes and colour token; the theme
 * gives the token its colour. Black and white has to tell everything too, so no two roles with different meanings
 * differ by colour alone: they differ by dash, by shape or by being filled or open.
 *
 * Pen widths in paper millimetres by ISO 128 (0.13, 0.18, 0.25, 0.35, 0.5, 0.7); cut 0.35, edges 0.25, surfaces 0.13
 * as heritage recording practice has them at 1:50.
 */
import type { Face } from './text.ts';

/** Colours by meaning. `wash` is the band between least and greatest thrust; `hatch` shows in black and white only. */
export type Token =
  | 'sheet'
  | 'ink'
  | 'quiet'
  | 'stone1'
  | 'stone2'
  | 'stone3'
  | 'indigo'
  | 'verdigris'
  | 'ochre'
  | 'madder'
  | 'wash'
  | 'hatch';

export type ThemeName = 'light' | 'dark' | 'print' | 'black-and-white';

/** A colour as `#rrggbb`, or null where this theme draws nothing. */
export type Theme = Readonly<Record<Token, string | null>>;

const LIGHT: Theme = {
  sheet: '#FFFDF8',
  ink: '#1F2A30',
  quiet: '#57564E',
  stone1: '#E9E2D5',
  stone2: '#CFC6B5',
  stone3: '#8A8272',
  indigo: '#2C3E7B',
  verdigris: '#1F6B64',
  ochre: '#85560A',
  madder: '#9B2F24',
  wash: '#CBCBD6',
  hatch: null,
};

export const THEMES: Readonly<Record<ThemeName, Theme>> = {
  light: LIGHT,
  print: { ...LIGHT, sheet: '#FFFFFF' },
  dark: {
    sheet: '#1C2226',
    ink: '#ECE7DB',
    quiet: '#A9A699',
    stone1: '#262D31',
    stone2: '#3B4347',
    stone3: '#7C7F78',
    indigo: '#A3B4F2',
    verdigris: '#6CC3B8',
    ochre: '#E0B25B',
    madder: '#F0897B',
    wash: '#3B4660',
    hatch: null,
  },
  'black-and-white': {
    sheet: '#FFFFFF',
    ink: '#000000',
    quiet: '#000000',
    stone1: '#FFFFFF',
    stone2: '#000000',
    stone3: '#000000',
    indigo: '#000000',
    verdigris: '#000000',
    ochre: '#000000',
    madder: '#000000',
    wash: null,
    hatch: '#000000',
  },
};

export interface Style {
  /** Pen width, paper mm, and its colour; absent for what is filled only. */
  readonly pen?: number;
  readonly stroke?: Token;
  readonly fill?: Token;
  /** Lengths of stroke and gap in turn, paper mm. */
  readonly dash?: readonly number[];
}

const LONG_DASH = [6, 1.5];
const SHORT_DASH = [2, 1];
const CHAIN = [8, 1.2, 0.4, 1.2];

export const STYLES = {
  stone: { fill: 'stone1' },
  joint: { pen: 0.18, stroke: 'stone3' },
  'ring-edge': { pen: 0.35, stroke: 'ink' },
  above: { fill: 'sheet' },
  'above-edge': { pen: 0.18, stroke: 'stone3' },
  opening: { pen: 0.25, stroke: 'ink', fill: 'sheet' },
  'opening-cross': { pen: 0.13, stroke: 'stone3' },
  backing: { fill: 'sheet' },
  'backing-edge': { pen: 0.25, stroke: 'stone3' },
  'backing-hatch': { pen: 0.13, stroke: 'stone3', dash: [2.4, 1.2] },
  'backing-masonry': { fill: 'stone1' },
  'backing-bond': { pen: 0.18, stroke: 'stone3' },
  'swatch-edge': { pen: 0.18, stroke: 'stone3' },
  'joint-onward': { pen: 0.18, stroke: 'ink', dash: [1, 0.8] },
  'moved-stone': { pen: 0.18, stroke: 'ink', fill: 'stone1' },
  course: { pen: 0.13, stroke: 'stone3' },
  'lost-mortar': { pen: 0.18, stroke: 'ink', fill: 'sheet' },
  support: { pen: 0.5, stroke: 'ink' },
  'support-hatch': { pen: 0.18, stroke: 'ink' },
  datum: { pen: 0.13, stroke: 'quiet', dash: CHAIN },
  load: { pen: 0.25, stroke: 'ink' },
  'load-head': { fill: 'ink' },
  'load-leader': { pen: 0.13, stroke: 'ink' },
  wheel: { pen: 0.25, stroke: 'ink', fill: 'ink' },
  'load-spread': { pen: 0.25, stroke: 'ink', dash: [0.3, 1.1] },
  reaction: { pen: 0.35, stroke: 'indigo' },
  'reaction-head': { pen: 0.25, stroke: 'indigo', fill: 'sheet' },
  'thrust-band': { fill: 'wash' },
  'thrust-band-hatch': { pen: 0.13, stroke: 'hatch' },
  'thrust-least': { pen: 0.5, stroke: 'indigo', dash: LONG_DASH },
  'thrust-greatest': { pen: 0.5, stroke: 'indigo', dash: SHORT_DASH },
  'thrust-chosen': { pen: 0.5, stroke: 'indigo' },
  'thrust-outside': { pen: 0.25, stroke: 'madder', fill: 'sheet' },
  'hinge-least': { pen: 0.25, stroke: 'indigo', fill: 'indigo' },
  'hinge-greatest': { pen: 0.25, stroke: 'indigo', fill: 'sheet' },
  'hinge-mechanism': { pen: 0.25, stroke: 'madder', fill: 'madder' },
  ghost: { pen: 0.25, stroke: 'madder', dash: SHORT_DASH },
  'as-it-was': { pen: 0.18, stroke: 'quiet', dash: [1.2, 1.2] },
  'other-outline': { pen: 0.25, stroke: 'quiet', dash: [3, 1, 0.3, 1, 0.3, 1] },
  'other-least': { pen: 0.25, stroke: 'indigo', dash: [6, 1, 0.3, 1] },
  'other-greatest': { pen: 0.25, stroke: 'indigo', dash: [2, 0.8, 0.3, 0.8] },
  'opening-gap': { pen: 0.25, stroke: 'madder', fill: 'sheet' },
  crack: { pen: 0.35, stroke: 'madder' },
  'crack-ground': { pen: 0.7, stroke: 'sheet' },
  dimension: { pen: 0.13, stroke: 'ink' },
  'dimension-stroke': { pen: 0.35, stroke: 'ink' },
  leader: { pen: 0.13, stroke: 'quiet' },
  frame: { pen: 0.7, stroke: 'ink' },
  rule: { pen: 0.18, stroke: 'stone3' },
  'scale-bar': { pen: 0.18, stroke: 'ink' },
  'scale-bar-dark': { pen: 0.18, stroke: 'ink', fill: 'ink' },
  'mark-holds': { pen: 0.25, stroke: 'verdigris', fill: 'verdigris' },
  'mark-narrow': { pen: 0.25, stroke: 'ochre' },
  'mark-narrow-half': { fill: 'ochre' },
  'mark-fails': { pen: 0.25, stroke: 'madder' },
  'mark-unknown': { pen: 0.25, stroke: 'quiet', dash: [0.3, 0.5] },
  'stress-block': { pen: 0.25, stroke: 'indigo', fill: 'wash' },
  'stress-hatch': { pen: 0.13, stroke: 'hatch' },
  axis: { pen: 0.25, stroke: 'ink' },
  grid: { pen: 0.13, stroke: 'stone2' },
  curve: { pen: 0.5, stroke: 'indigo' },
  'curve-mark': { pen: 0.35, stroke: 'madder', fill: 'sheet' },
  'curve-limit': { pen: 0.25, stroke: 'madder', dash: CHAIN },
  text: { fill: 'ink' },
  'text-quiet': { fill: 'quiet' },
  'text-force': { fill: 'indigo' },
  'text-holds': { fill: 'verdigris' },
  'text-narrow': { fill: 'ochre' },
  'text-fails': { fill: 'madder' },
} as const satisfies Readonly<Record<string, Style>>;

export type Role = keyof typeof STYLES;

/** What a renderer needs to draw a role: colours resolved, null where nothing is to be drawn. */
export interface DrawnStyle {
  readonly stroke: string | null;
  readonly fill: string | null;
  /** Paper mm. */
  readonly pen: number;
  readonly dash: readonly number[];
}

export function drawnStyle(role: Role, theme: Theme): DrawnStyle {
  const style: Style = STYLES[role];
  return {
    stroke: style.stroke === undefined ? null : theme[style.stroke],
    fill: style.fill === undefined ? null : theme[style.fill],
    pen: style.pen ?? 0,
    dash: style.dash ?? [],
  };
}

/** Font weight and slope by the words that SVG, CSS and most libraries use. */
export const FACES: Readonly<
  Record<Face, { readonly weight: 'normal' | 'bold'; readonly slope: 'normal' | 'oblique' }>
> = {
  regular: { weight: 'normal', slope: 'normal' },
  bold: { weight: 'bold', slope: 'normal' },
  oblique: { weight: 'normal', slope: 'oblique' },
};
