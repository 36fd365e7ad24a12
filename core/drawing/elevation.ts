/** The elevation of one arch: the drawing that the board shows, and the one that goes onto the sheet. */
import type { AssessedScheme } from '../assess/assess.ts';
import { headline } from '../checks/headline.ts';
import { metres } from '../quantity/figures.ts';
import { drawAbove } from './above.ts';
import { drawChosen, letterChosen, type ChosenLine } from './chosen.ts';
import { drawCracks, letterCracks } from './cracks.ts';
import { drawDimensions } from './dimensions.ts';
import { beginDraught, type LengthText } from './draught.ts';
import { drawLoads } from './loads.ts';
import { drawMasonry } from './masonry.ts';
import { drawMechanism } from './mechanism.ts';
import { drawMoved, letterMoved, type MovedPicture } from './moved.ts';
import { drawNotes } from './notes.ts';
import { drawOther, type OtherScheme } from './other.ts';
import { drawReactions } from './reactions.ts';
import { makeScene, type LayerName, type Scene } from './scene.ts';
import { plainText } from './text.ts';
import { drawThrust } from './thrust.ts';

/** What is laid over the elevation, or left off it, to show one answer. */
export interface Overlays {
  /** A chosen or hand-drawn line of thrust, solid, with the places where it leaves the ring. */
  readonly chosen?: ChosenLine;
  /**
   * The ring after a movement, with its hinges open and its first place dashed. Lines of thrust and reactions of the
   * ring as it stands are left off then.
   */
  readonly moved?: MovedPicture;
  /** Another scheme to compare with; left off while the ring is drawn moved. */
  readonly other?: OtherScheme;
  /** Layers to leave off. Lettering keeps the places that it has with them. */
  readonly hide?: readonly LayerName[];
}

export interface ElevationOptions extends Overlays {
  /** Paper millimetres per metre of the arch: 50 at 1:20. On a screen, pixels per metre over pixels per millimetre. */
  readonly millimetresPerMetre: number;
  /** How lengths are lettered; metres where not given. */
  readonly length?: LengthText;
}

/**
 * Pure and without a clock: the same arch at the same scale is always drawn the same. When the arch does not stand there
 * are no lines of thrust, and the mechanism is drawn where the assessment has one.
 */
export function elevation(assessed: AssessedScheme, options: ElevationOptions): Scene {
  const { millimetresPerMetre, length = metres, chosen, moved, other, hide } = options;
  const draught = beginDraught(assessed, millimetresPerMetre, length, moved?.ring ?? null);
  drawAbove(draught);
  if (moved === undefined) {
    drawMasonry(draught);
    drawThrust(draught);
    drawMechanism(draught);
    if (other !== undefined) drawOther(draught, other);
  } else {
    drawMoved(draught, moved);
  }
  const drawnChosen = chosen === undefined ? null : drawChosen(draught, chosen);
  drawLoads(draught);
  const cracks = drawCracks(draught);
  // measures are those of the ring as it was, and would lie across a moved one
  if (moved === undefined) drawDimensions(draught);
  // lettering may not lie on lines that are drawn after it
  letterCracks(draught, cracks);
  if (chosen !== undefined && drawnChosen !== null) letterChosen(draught, chosen, drawnChosen);
  if (moved === undefined) drawReactions(draught);
  else letterMoved(draught, moved);
  drawNotes(draught);
  const title = plainText(assessed.result.name);
  return makeScene(
    { title, description: headlineOf(assessed.result), millimetresPerUnit: millimetresPerMetre },
    draught.items,
    draught.key,
    hide,
  );
}

/** The finding in plain words, as it heads the findings and the sheet. */
export function headlineOf({ thrust, geometricSafety, model }: AssessedScheme['result']): string {
  const { stands, least, greatest } = thrust;
  return headline({
    stands,
    geometricSafety,
    least: least?.horizontal ?? null,
    greatest: greatest?.horizontal ?? null,
    alike: model.blocks.every(({ forces }) => forces.every(({ fx }) => fx === 0)),
  });
}
