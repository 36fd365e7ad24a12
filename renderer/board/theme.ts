import { THEMES, type Theme, type Token } from '../../core/drawing/style.ts';

/** The colours of the drawing on the board; where the system forces its own few, everything is told in two of them. */
export function boardTheme(dark: boolean, forced: boolean): Theme {
  if (!forced) return dark ? THEMES.dark : THEMES.light;
  const marks = THEMES['black-and-white'];
  const ground = systemColour('Canvas');
  const ink = systemColour('CanvasText');
  const translated = Object.entries(marks).map(([token, colour]) => [
    token,
    colour === '#FFFFFF' ? ground : colour && ink,
  ]);
  return Object.fromEntries(translated) as Record<Token, string | null>;
}

/** A system colour as the canvas takes it. */
function systemColour(name: 'Canvas' | 'CanvasText'): string {
  const probe = document.createElement('span');
  probe.style.color = name;
  document.body.append(probe);
  const { color } = getComputedStyle(probe);
  probe.remove();
  return color;
}
