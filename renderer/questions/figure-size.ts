import type { FigureSize } from '../../core/drawing/plot.ts';

/** mm: so small that its lettering comes out at the page's smallest type when the figure fills the panel. */
export const PANEL_FIGURE: FigureSize = { width: 62, height: 46 };
