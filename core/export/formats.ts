/** What can be made of an assessed job, by format. The command line and the app offer what stands in this table. */
import { assessScheme, type AssessedScheme } from '../assess/assess.ts';
import type { Assessment, SchemeAssessment } from '../assess/assessment.ts';
import { elevationSheet, type SheetOptions } from '../drawing/elevation-sheet.ts';
import type { Job } from '../job/schema.ts';
import { sheetToSvg, type SvgOptions } from './svg.ts';

/** What the sheet says that is not in the job. Dates are given, never taken from a clock. */
export interface ExportOptions extends SheetOptions, SvgOptions {
  readonly owner?: string;
  readonly drawnBy?: string;
  readonly approvedBy?: string;
  readonly issuedOn?: string;
}

export interface ExportFormat {
  readonly id: FormatId;
  readonly extension: string;
  readonly mime: string;
  /**
   * One scheme of the job, by its place in `assessment.schemes`.
   * @throws RangeError when there is no such scheme.
   */
  make(job: Job, assessment: Assessment, scheme: number, options?: ExportOptions): string;
}

export type FormatId = 'svg';

export const FORMATS: Readonly<Record<FormatId, ExportFormat>> = {
  svg: { id: 'svg', extension: 'svg', mime: 'image/svg+xml', make: elevationSvg },
};

function elevationSvg(job: Job, assessment: Assessment, scheme: number, options: ExportOptions = {}): string {
  const assessed = assessedAgain(job, assessment, scheme);
  const { site = {} } = job;
  const title = {
    owner: options.owner ?? '',
    number: site.reference ?? '',
    title: job.title ?? '',
    subtitle: assessed.result.name,
    createdBy: options.drawnBy ?? '',
    approvedBy: options.approvedBy ?? '',
    issuedOn: options.issuedOn ?? '',
    sheet: `${scheme + 1} of ${assessment.schemes.length}`,
    surveyedBy: site.surveyedBy ?? '',
    surveyedOn: site.surveyedOn ?? '',
  };
  return sheetToSvg(elevationSheet(assessed, title, options), options);
}

/** The assessment document carries no outlines, so the ring is built again: a millisecond, and the same figures. */
function assessedAgain(job: Job, assessment: Assessment, index: number): AssessedScheme {
  const wanted = assessment.schemes[index];
  const arch = job.arches.find(({ id }) => id === wanted?.arch);
  const scheme = arch?.schemes.find(({ id }) => id === wanted?.scheme);
  const outcome = arch === undefined || scheme === undefined ? null : assessScheme(arch, scheme);
  if (outcome === null || !outcome.ok) throw new RangeError(`no assessed scheme ${index} in this job`);
  return outcome.assessed;
}

const LONGEST_STEM = 80;

/** A file name without extension for one scheme's elevation: letters and figures of its name, parted by hyphens. */
export function elevationFileStem({ name }: SchemeAssessment): string {
  const words =
    name
      .normalize('NFKC')
      .toLowerCase()
      .match(/[\p{L}\p{N}]+/gu) ?? [];
  return ['elevation', ...words].join('-').slice(0, LONGEST_STEM);
}
