import { DEFAULT_PREFERENCES } from '../../core/quantity/kinds.ts';

/** How figures are shown and typed: metres, with a decimal point as the headline, the drawing and the sheets have it. */
export const SHOWN = DEFAULT_PREFERENCES;
