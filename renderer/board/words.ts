/** What the picture on the board says, in words, for those who do not see it. */
import type { AssessedScheme } from '../../core/assess/assess.ts';
import type { Hinge, ThrustState } from '../../core/assess/assessment.ts';
import { headlineOf } from '../../core/drawing/elevation.ts';
import type { ResolvedLoad } from '../../core/job/defaults.ts';
import { crownHeightOf, spanOf } from '../../core/job/edits.ts';
import { figure, metres } from '../../core/quantity/figures.ts';
import { shapeName } from '../session/shapes.ts';

export function boardInWords(assessed: AssessedScheme): string {
  const { resolved, result } = assessed;
  const { profile, ring, above, loads } = resolved;
  const sentences = [
    `Elevation of ${result.name}. ${shapeName(profile.shape)} arch, span ${metres(spanOf(profile))} m, rise ${metres(crownHeightOf(profile))} m.`,
    `Ring of ${ring.voussoirs} voussoirs, ${metres(ring.thickness)} m thick and ${metres(resolved.breadth)} m broad, joints ${ring.joints}.`,
    above.kind === 'none'
      ? 'Nothing above the ring.'
      : `Above it a ${above.kind === 'wall' ? 'wall' : 'fill'} to ${metres(above.height)} m over the crown, ${figure(above.unitWeight)} kN/m³.`,
    loads.length === 0 ? 'No loads.' : `Loads: ${loads.map(loadInWords).join('; ')}.`,
    headlineOf(result),
    ...thrustInWords(assessed),
  ];
  return sentences.join(' ');
}

function loadInWords(load: ResolvedLoad): string {
  return load.kind !== 'strip'
    ? `${load.name}, ${figure(load.force)} kN ${placeInWords(load.x)}`
    : `${load.name}, ${figure(load.intensity)} kN/m² from ${placeInWords(load.from)} to ${placeInWords(load.to)}`;
}

function placeInWords(x: number): string {
  if (x === 0) return 'at mid-span';
  return `${metres(Math.abs(x))} m ${x < 0 ? 'left' : 'right'} of mid-span`;
}

function thrustInWords({ result }: AssessedScheme): string[] {
  const { thrust, mechanism, reactions } = result;
  const sentences: string[] = [];
  if (thrust.least !== null) sentences.push(stateInWords('Least', thrust.least));
  if (thrust.greatest !== null) sentences.push(stateInWords('Greatest', thrust.greatest));
  if (reactions !== null) {
    const { left, right } = reactions;
    sentences.push(
      `At the least thrust the left support takes ${figure(left.horizontal)} kN sideways and ${figure(left.vertical)} kN down, the right one ${figure(right.horizontal)} and ${figure(right.vertical)} kN.`,
    );
  }
  if (mechanism) sentences.push(`It turns about hinges ${hingesInWords(mechanism.hinges)}.`);
  return sentences;
}

function stateInWords(name: string, { horizontal, hinges }: ThrustState): string {
  const amount = horizontal === null ? '' : ` of ${figure(horizontal)} kN`;
  return `${name} thrust${amount}: the line touches the ring ${hingesInWords(hinges)}.`;
}

function hingesInWords(hinges: readonly Hinge[]): string {
  return hinges.map(({ joint, side }) => `at joint ${joint} on the ${side}`).join(', ');
}
