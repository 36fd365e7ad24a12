import { assessScheme } from '../../core/assess/assess.ts';
import { elevationSheet } from '../../core/drawing/elevation-sheet.ts';
import { sheetToSvg } from '../../core/export/svg.ts';
import type { Arch, Job } from '../../core/job/schema.ts';
import type { AssessedScheme } from '../../core/assess/assess.ts';

/** A drawing or sheet ready to be written. */
export interface Drawing {
  /** File name with its ending, no folder. */
  readonly name: string;
  readonly bytes: Uint8Array;
}

interface Scheme {
  readonly job: Job;
  readonly arch: Arch;
  readonly assessed: AssessedScheme;
}

/** What `--out` can write, one entry a format: the drawings of one scheme of an arch. */
const WRITERS = {
  svg: (scheme: Scheme): Drawing[] => [
    { name: `${nameOf(scheme)}-elevation.svg`, bytes: new TextEncoder().encode(sheetToSvg(sheetOf(scheme))) },
  ],
} as const satisfies Readonly<Record<string, (scheme: Scheme) => Drawing[]>>;

export type Format = keyof typeof WRITERS;

export const FORMAT_NAMES = Object.keys(WRITERS) as readonly Format[];

export function isFormat(name: string): name is Format {
  return Object.hasOwn(WRITERS, name);
}

/** Every drawing of a job that can be assessed, in one format. */
export function drawingsOf(job: Job, format: Format): Drawing[] {
  return job.arches.flatMap((arch) =>
    arch.schemes.flatMap((scheme) => {
      const outcome = assessScheme(arch, scheme);
      return outcome.ok ? WRITERS[format]({ job, arch, assessed: outcome.assessed }) : [];
    }),
  );
}

/** The scheme's name in plain letters, digits and hyphens. */
function nameOf({ assessed }: Scheme): string {
  const plain = assessed.result.name
    .normalize('NFKD')
    .replace(/\p{Mn}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '')
    .slice(0, 100);
  return plain === '' ? 'arch' : plain;
}

function sheetOf({ job, arch, assessed }: Scheme) {
  const { site } = job;
  return elevationSheet(assessed, {
    owner: '',
    number: site?.reference ?? '',
    title: job.title ?? arch.name ?? '',
    subtitle: assessed.result.name,
    createdBy: '',
    approvedBy: '',
    issuedOn: '',
    sheet: '1',
    surveyedBy: site?.surveyedBy ?? '',
    surveyedOn: site?.surveyedOn ?? '',
  });
}
