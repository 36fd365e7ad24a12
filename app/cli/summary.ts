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
    ...checks.map((check) => row(check.status, checkText(check))),
    ...assumed.map(({ field, value, because }) => row('assumed', `${field} ${value ?? 'not known'}: ${because}`)),
  ];
  return [name, ...facts.map((fact) => INDENT + fact)];
}

function checkText({ title, where, because }: Check): string {
  return `${title}${where === '' ? '' : ` (${where})`}: ${because}`;
}

/** In kN; a thrust without a value has no limit. */
const force = (value: number | null | undefined): string =>
  typeof value === 'number' ? `${figure(value)} kN` : 'no limit';
