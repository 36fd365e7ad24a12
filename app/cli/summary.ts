import type { Assessment, Check, SchemeAssessment } from '../../core/assess/assessment.ts';
import { standingCautions } from '../../core/checks/cautions.ts';
import { headlineOf } from '../../core/drawing/elevation.ts';
import { figure } from '../../core/quantity/figures.ts';

const INDENT = '  ';

/** The assessment for a person at a terminal: each scheme's finding, its figures, its checks, and what was assumed. */
export function summary(file: string, { title, schemes }: Assessment): string {
  return [
    `${file}: ${title === '' ? 'untitled' : title}`,
    ...schemes.flatMap((scheme) => ['', ...schemeLines(scheme).map((line) => INDENT + line)]),
    '',
    ...standingCautions.slice(0, 2).map((caution) => INDENT + caution),
  ].join('\n');
}

function schemeLines(scheme: SchemeAssessment): string[] {
  const { name, thrust, geometricSafety, checks, assumed } = scheme;
  const row = (head: string, text: string): string => `${head.padEnd(8)} ${text}`;
  const { least, greatest } = thrust;
  const facts = [
    headlineOf(scheme),
    ...(least === null
      ? []
      : [row('thrust', `${force(least.horizontal)} least, ${force(greatest?.horizontal)} greatest`)]),
    ...(geometricSafety === null
      ? []
      : [row('safety', `${figure(geometricSafety)}, ring over the least that would do`)]),
    ...furtherFacts(scheme).map(([head, text]) => row(head, text)),
    ...checks.map((check) => row(check.status, checkText(check))),
    ...assumed.map(({ field, value, because }) => row('assumed', `${field} ${value ?? 'not known'}: ${because}`)),
  ];
  return [name, ...facts.map((fact) => INDENT + fact)];
}

/** What was asked beyond the first look, each only where there is something to say. */
function furtherFacts({
  thinnestRing,
  swayCapacity,
  spread,
  loadFactors,
  axles,
  combinations,
  cracks,
}: SchemeAssessment) {
  const facts: [head: string, text: string][] = [];
  if (typeof thinnestRing === 'number')
    facts.push(['thinnest', `${figure(thinnestRing)} m, the thinnest ring that stands`]);
  if (typeof swayCapacity === 'number') facts.push(['sideways', `${figure(swayCapacity)} g, the smaller of both ways`]);
  if (typeof spread?.collapse === 'number') facts.push(['spread', `${figure(spread.collapse)} m until it falls`]);
  for (const { load, factor } of loadFactors ?? []) {
    if (factor !== null) facts.push(['factor', `${load}: ${figure(factor)}`]);
  }
  for (const { load, worst } of axles ?? []) {
    if (worst !== null)
      facts.push(['axle', `${load}: least factor ${figure(worst.factor)} at x = ${figure(worst.x)} m`]);
  }
  for (const { name, stands, geometricSafety } of combinations ?? []) {
    const safety = geometricSafety === null ? '' : `, geometric safety ${figure(geometricSafety)}`;
    facts.push(['together', `${name}: ${stands ? 'stands' : 'does not stand'}${safety}`]);
  }
  if (cracks !== undefined) facts.push(['cracks', cracks.because]);
  return facts;
}

function checkText({ title, where, because }: Check): string {
  return `${title}${where === '' ? '' : ` (${where})`}: ${because}`;
}

/** In kN; a thrust without a value has no limit. */
const force = (value: number | null | undefined): string =>
  typeof value === 'number' ? `${figure(value)} kN` : 'no limit';
