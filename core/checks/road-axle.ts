/**
 * The standard's provisional axle load of a road arch (BA 16/97, carried on in CS 454) with its factors, each step in
 * symbols and numbers so that a sheet can print it. A rule fitted to tests and practice: its result is a comparison
 * beside the mechanism result and never a check, so nothing here has a status.
 *
 * Lengths in m, axle loads in tonnes as the standard has them, and in kN.
 */
import { figure, metres } from '../quantity/figures.ts';

export interface RoadArch {
  /** L, of the intrados. */
  readonly span: number;
  /** rc, of the intrados at the crown. */
  readonly rise: number;
  /** rq, of the intrados at the quarter points. */
  readonly quarterRise: number;
  /** d, of the ring at the crown. */
  readonly ringThickness: number;
  /** h, from the crown's extrados to the road surface. */
  readonly fill: number;
}

/** What the assessor judges, each from 0 to 1; one that is not given counts as 1 and the step says so. */
export interface AssessorsFactors {
  /** Read from the standard's figure for a span of more than four rises; has no default there. */
  readonly spanRise?: number;
  readonly material?: number;
  readonly joint?: number;
  readonly condition?: number;
}

export interface AxleStep {
  readonly id:
    'depth' | 'provisional' | 'span-rise' | 'profile' | 'material' | 'joint' | 'condition' | 'modified' | 'force';
  readonly name: string;
  /** In symbols. */
  readonly formula: string;
  /** The same with its numbers; empty where there are none. */
  readonly numbers: string;
  /** Null where the step cannot be taken; `note` says why. */
  readonly result: number | null;
  /** `m`, `t`, `kN`, or empty. */
  readonly unit: string;
  readonly note: string;
  readonly source: string;
}

export interface RoadAxle {
  readonly steps: readonly AxleStep[];
  /** Before the factors, tonnes. */
  readonly provisional: number | null;
  /** With every factor, for a single axle. */
  readonly modified: { readonly tonnes: number; readonly kilonewtons: number } | null;
  /** Why there is no modified load; empty when there is one. */
  readonly outside: readonly string[];
  /** What to know of this arch's result. */
  readonly notes: readonly string[];
  /** Limits of use that no figure here can test. */
  readonly limits: readonly string[];
  readonly standing: string;
}

const STANDING =
  'A comparison beside the mechanism result. It is no check, and a load under it is not shown to be safe.';

const READ = 'BA 16/97, later CS 454 (read)';
/** The formulas were read as a worked assessment quotes them, with its figures; the standard itself in part only. */
const AS_QUOTED = 'BA 16/97, later CS 454 (read as quoted)';
const ASSESSOR = 'the assessor, by the tables of BA 16/97, later CS 454';

/** m: bounds of the standard's nomogram (BA 16/97, read). */
const SPAN = { least: 1.5, most: 18 };
const DEPTH = { least: 0.25, most: 1.8 };
/** Tonnes (BA 16/97, read). */
const MOST_PROVISIONAL = 70;
/** Spans in rises: up to the first the factor is 1, at the second the standard's curve ends (BA 16/97, read). */
const SPAN_RISE = { unity: 4, end: 8 };
const PROFILE_UNITY = 0.75;
/** kN for a tonne: the rounded gravity that hand calculations use. */
const GRAVITY = 9.81;
/** m: from memory, where other methods give more. */
const LONG_SPAN = 12;

const LIMITS: readonly string[] = [
  'It judges the barrel alone: spandrel walls, wing walls, piers, abutments and foundations are judged apart (read).',
  'It is for a single span, or spans between stout piers; not for an arch that is flat or has lost its shape (from memory).',
  'It is for arches built square; a skew one needs judgement of its own (from memory).',
  'One axle on the arch, without lift-off; bogies and lift-off have factors of their own, not included here (read).',
];

/** No errors: what lies outside the method comes back as null with the reason in `outside` and in the step's note. */
export function roadAxle(arch: RoadArch, factors: AssessorsFactors = {}): RoadAxle {
  const { span, ringThickness: d, fill: h } = arch;
  const provisional = provisionalLoad(span, d + h);
  const given = [
    spanRiseFactor(arch, factors.spanRise),
    profileFactor(arch),
    assessorsFactor('material', 'Material factor', 'Fm', factors.material),
    assessorsFactor('joint', 'Joint factor', 'Fj', factors.joint),
    assessorsFactor('condition', 'Condition factor', 'FcM', factors.condition),
  ];
  const tonnes = product([provisional, ...given]);
  const depth: AxleStep = {
    id: 'depth',
    name: 'Ring and fill at the crown',
    formula: 'd + h',
    numbers: `${metres(d)} + ${metres(h)}`,
    result: d + h,
    unit: 'm',
    note: '',
    source: READ,
  };
  const missing = [provisional, ...given].filter(({ result }) => result === null);
  const last = modifiedSteps([provisional, ...given], tonnes);
  return {
    steps: [depth, provisional, ...given, ...last],
    provisional: provisional.result,
    modified: tonnes === null ? null : { tonnes, kilonewtons: tonnes * GRAVITY },
    outside: [...new Set(missing.map(({ note }) => note))],
    notes: notesOn(arch),
    limits: LIMITS,
    standing: STANDING,
  };
}

/** PAL = 740 (d + h)² / L^1.3, at most 70 t. */
function provisionalLoad(span: number, depth: number): AxleStep {
  const step = {
    id: 'provisional',
    name: 'Provisional axle load',
    formula: 'PAL = 740 (d + h)² / L^1.3, at most 70 t',
    numbers: `740 × ${metres(depth)}² / ${metres(span)}^1.3`,
    unit: 't',
    source: AS_QUOTED,
  } as const;
  const reasons = [
    outsideOf('The span', span, SPAN),
    outsideOf('Ring and fill at the crown together', depth, DEPTH),
  ].filter((reason) => reason !== null);
  if (reasons.length > 0) return { ...step, result: null, note: reasons.join(' ') };
  const load = (740 * depth ** 2) / span ** 1.3;
  const note = load > MOST_PROVISIONAL ? `The formula gives ${figure(load)} t; the standard stops at 70 t.` : '';
  return { ...step, result: Math.min(load, MOST_PROVISIONAL), note };
}

/** Share by which a length may miss a limit that it was entered at: rounding of a sum and a change of unit. */
const ROUNDING = 1e-9;

function outsideOf(what: string, value: number, { least, most }: typeof SPAN): string | null {
  if (value >= least * (1 - ROUNDING) && value <= most * (1 + ROUNDING)) return null;
  return `${what} must lie between ${least} and ${most} m for this method; here ${metres(value)} m.`;
}

function spanRiseFactor({ span, rise }: RoadArch, entered: number | undefined): AxleStep {
  const ratio = span / rise;
  const step = {
    id: 'span-rise',
    name: 'Span/rise factor',
    formula: 'Fsr = 1 for L/rc ≤ 4, beyond that from the standard’s figure',
    numbers: `L/rc = ${metres(span)}/${metres(rise)} = ${figure(ratio)}`,
    unit: '',
    source: READ,
  } as const;
  if (!(rise > 0)) return { ...step, numbers: '', result: null, note: 'The intrados has no rise.' };
  if (ratio <= SPAN_RISE.unity * (1 + ROUNDING)) return { ...step, result: 1, note: '' };
  if (ratio > SPAN_RISE.end * (1 + ROUNDING)) {
    return {
      ...step,
      result: null,
      note: `The standard’s figure for the span/rise factor ends at ${SPAN_RISE.end}; this arch is flatter.`,
    };
  }
  if (entered === undefined) {
    return {
      ...step,
      result: null,
      note: 'The span/rise factor is not included: beyond four it is a curve in the standard. Read it there and enter it; it is less than 1.',
    };
  }
  const share = enteredShare('span/rise', entered);
  return {
    ...step,
    ...share,
    numbers: `${step.numbers}; ${share.numbers}`,
    source: 'the assessor, from the figure in BA 16/97, later CS 454',
  };
}

/** Fp = 1 for rq/rc ≤ 0.75, else 2.3 ((rc − rq)/rc)^0.6. */
function profileFactor({ rise, quarterRise }: RoadArch): AxleStep {
  const ratio = quarterRise / rise;
  const step = {
    id: 'profile',
    name: 'Profile factor',
    formula: 'Fp = 1 for rq/rc ≤ 0.75, else 2.3 ((rc − rq)/rc)^0.6',
    unit: '',
    source: READ,
  } as const;
  const read = `rq/rc = ${metres(quarterRise)}/${metres(rise)} = ${figure(ratio)}`;
  if (!(rise > 0 && quarterRise > 0)) return { ...step, numbers: '', result: null, note: 'The intrados has no rise.' };
  if (quarterRise >= rise) {
    return {
      ...step,
      numbers: read,
      result: null,
      note: 'The quarter points stand as high as the crown; the method is not for an arch of that shape.',
    };
  }
  if (ratio <= PROFILE_UNITY) return { ...step, numbers: read, result: 1, note: '' };
  // just over 0.75 the expression gives 1.001; the factor takes away and never adds
  const factor = Math.min(1, 2.3 * (1 - ratio) ** 0.6);
  const numbers = `${read}; 2.3 × ((${metres(rise)} − ${metres(quarterRise)})/${metres(rise)})^0.6`;
  return { ...step, numbers, result: factor, note: '' };
}

const DEFAULT_MEANS = {
  material: 'Not judged: taken as 1, a sound ring under well-bound fill.',
  joint: 'Not judged: taken as 1, joints narrow, full and in good mortar.',
  condition: 'Not judged: taken as 1, an arch without cracks, bulges or lost stones.',
} as const;

function assessorsFactor(
  id: keyof typeof DEFAULT_MEANS,
  name: string,
  symbol: string,
  entered: number | undefined,
): AxleStep {
  const step = { id, name, formula: `${symbol}, from 0 to 1`, unit: '', source: ASSESSOR } as const;
  if (entered === undefined) return { ...step, numbers: '', result: 1, note: DEFAULT_MEANS[id] };
  return { ...step, ...enteredShare(id, entered) };
}

/** Table values over 1, which the standard has for the best masonry (from memory), are not taken: the safe side. */
function enteredShare(what: string, entered: number): Pick<AxleStep, 'numbers' | 'result' | 'note'> {
  const fits = entered >= 0 && entered <= 1;
  const note = fits ? '' : `The ${what} factor must lie between 0 and 1 here; ${figure(entered)} was entered.`;
  return { numbers: figure(entered), result: fits ? entered : null, note };
}

function product(steps: readonly AxleStep[]): number | null {
  return steps.reduce<number | null>(
    (sofar, { result }) => (sofar === null || result === null ? null : sofar * result),
    1,
  );
}

function modifiedSteps(steps: readonly AxleStep[], tonnes: number | null): AxleStep[] {
  const note = tonnes === null ? 'Not given, for want of a step above.' : '';
  const numbers = tonnes === null ? '' : steps.map(({ result }) => figure(result ?? 0)).join(' × ');
  return [
    {
      id: 'modified',
      name: 'Modified axle load, single axle',
      formula: 'A = PAL Fsr Fp Fm Fj FcM',
      numbers,
      result: tonnes,
      unit: 't',
      note,
      source: AS_QUOTED,
    },
    {
      id: 'force',
      name: 'The same as a force',
      formula: 'A g, with g = 9.81 m/s²',
      numbers: tonnes === null ? '' : `${figure(tonnes)} × 9.81`,
      result: tonnes === null ? null : tonnes * GRAVITY,
      unit: 'kN',
      note,
      source: 'common practice',
    },
  ];
}

function notesOn({ span, ringThickness, fill }: RoadArch): string[] {
  const notes: string[] = [];
  if (fill > ringThickness) {
    notes.push(
      'The fill is deeper than the ring is thick: the method may then give too much, and another is needed beside it (read as quoted).',
    );
  }
  if (span > LONG_SPAN) {
    notes.push('Over 12 m the method gives less and less beside others (from memory).');
  }
  return notes;
}
