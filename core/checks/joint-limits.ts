/** Sliding and crushing of the joints: can a line be found that also obeys these, and what would it take. */
import { figure } from '../quantity/figures.ts';
import { jointsInWords, type Check } from './check.ts';

const FRICTION_SOURCE =
  'Coulomb friction at the joints as a rule of limit analysis, with associated flow: D. C. Drucker, Coulomb friction, plasticity and limit loads, J. Appl. Mech. 21 (1954) 71–74 (from memory)';
const CRUSHING_SOURCE =
  'Rectangular stress block beside the compressed edge of a joint without tension; standard statics of masonry';

/** `needed` is null when no line of thrust fits in the ring at all; `friction` is null when it is not known. */
export function sliding(
  friction: number | null,
  needed: { readonly coefficient: number; readonly joints: readonly number[] } | null,
): Check {
  const common = { id: 'ring.sliding', title: 'Sliding at the joints', unit: '', source: FRICTION_SOURCE } as const;
  if (needed === null) {
    return {
      ...common,
      ...nothing(friction),
      because: 'No line of thrust fits in the ring, so there is none to hold against sliding.',
    };
  }
  const { coefficient, joints } = needed;
  const found = { demand: coefficient, limit: friction, where: jointsInWords(joints), joints };
  if (friction === null) {
    return {
      ...common,
      ...found,
      status: 'unknown',
      utilisation: null,
      because: `The friction of the joints is not known; a coefficient of ${figure(coefficient)} is needed. Enter one to have sliding checked.`,
    };
  }
  const holds = coefficient <= friction;
  const governs =
    'Where sliding governs, the bound is not guaranteed for real friction; the thrusts for hinges alone stand beside it.';
  return {
    ...common,
    ...found,
    status: holds ? 'holds' : 'fails',
    utilisation: coefficient / friction,
    because: holds
      ? `A line of thrust fits that needs a friction of ${figure(coefficient)}; ${figure(friction)} is there.`
      : `Every line of thrust needs a friction of at least ${figure(coefficient)}, and only ${figure(friction)} is there. ${governs}`,
  };
}

/** Strengths in MPa. `needed` is null when there is no line or no stress to speak of; `strength` when it is not known. */
export function crushing(
  strength: number | null,
  needed: { readonly strength: number; readonly joint: number } | null,
  stands: boolean,
): Check {
  const common = {
    id: 'ring.crushing',
    title: 'Crushing at the joints',
    unit: 'MPa',
    source: CRUSHING_SOURCE,
  } as const;
  if (needed === null) {
    return {
      ...common,
      ...nothing(strength),
      because: stands
        ? 'Some joints carry next to nothing, so no line stays clear of every edge and no stress can be named.'
        : 'No line of thrust fits in the ring, so there is no stress to hold against its strength.',
    };
  }
  const found = {
    demand: needed.strength,
    limit: strength,
    where: jointsInWords([needed.joint]),
    joints: [needed.joint],
  };
  if (strength === null) {
    return {
      ...common,
      ...found,
      status: 'unknown',
      utilisation: null,
      because: `The strength of the masonry is not known; ${figure(needed.strength)} MPa is needed. Enter one to have crushing checked.`,
    };
  }
  const holds = needed.strength <= strength;
  return {
    ...common,
    ...found,
    status: holds ? 'holds' : 'fails',
    utilisation: needed.strength / strength,
    because: holds
      ? `The line that presses the stone least needs a strength of ${figure(needed.strength)} MPa; ${figure(strength)} MPa is given.`
      : `Every line of thrust presses some joint with at least ${figure(needed.strength)} MPa, more than the ${figure(strength)} MPa given.`,
  };
}

const nothing = (limit: number | null) =>
  ({ status: 'unknown', demand: null, limit, utilisation: null, where: '', joints: [] }) as const;
