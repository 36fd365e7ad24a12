/** What would change a finding most, in sentences. */
import type { SchemeAssessment } from '../../core/assess/assessment.ts';
import { influences, TRIED_SHARE, type Influence } from '../../core/assess/sensitivity.ts';
import type { Arch, Scheme } from '../../core/job/schema.ts';
import { figure, safetyFigure } from '../../core/quantity/figures.ts';

interface Subject {
  /** As it stands after "raise" and "lower". */
  readonly name: string;
  readonly read: (result: SchemeAssessment) => number | null;
  readonly shown: (value: number) => string;
}

const NAMES: Readonly<Record<string, string>> = {
  'ring.sliding': 'the friction needed',
  'ring.crushing': 'the strength needed',
};

const SAFETY: Subject = {
  name: 'the safety',
  read: ({ geometricSafety }) => geometricSafety,
  shown: safetyFigure,
};

/** The figure of a check that a person would watch: the safety of the ring, else what the check asks of the stone. */
function subjectOf(check: string): Subject {
  if (check === 'ring.compression-only') return SAFETY;
  const found = ({ checks }: SchemeAssessment) => checks.find(({ id }) => id === check);
  return { name: NAMES[check] ?? 'this figure', read: (result) => found(result)?.demand ?? null, shown: figure };
}

const MOST_TOLD = 3;

/** The strongest first, each measure once; empty where nothing that was tried tells. */
export function influencesInWords(arch: Arch, scheme: Scheme, check: string): string[] {
  const subject = subjectOf(check);
  const strongest = new Map<string, Influence>();
  for (const influence of influences(arch, scheme, subject.read)) {
    if (!strongest.has(influence.field)) strongest.set(influence.field, influence);
  }
  return [...strongest.values()].slice(0, MOST_TOLD).map((influence) => sentence(influence, subject));
}

function sentence({ name, share, from, to }: Influence, subject: Subject): string {
  const change = `${figure(100 * TRIED_SHARE, 1)} % ${share > 0 ? 'more' : 'less'} ${name}`;
  if (from === null) return `${change} would let a line of thrust fit.`;
  if (to === null) return `${change} would leave no line of thrust that fits.`;
  const way = to > from ? 'raise' : 'lower';
  return `${change} would ${way} ${subject.name} from ${subject.shown(from)} to ${subject.shown(to)}.`;
}
