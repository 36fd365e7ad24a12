/** What can be made of an assessed scheme, by format. The command line and the app offer what stands in this table. */
import type { AssessedScheme } from '../assess/assess.ts';
import { elevationSheet, type SheetOptions } from '../drawing/elevation-sheet.ts';
import type { Job } from '../job/schema.ts';
import { sheetToSvg, type SvgOptions } from './svg.ts';

/** What a sheet says that is not in the job. Dates are given, never taken from a clock. */
export interface ExportOptions extends SheetOptions, SvgOptions {
  readonly owner?: string;
  readonly drawnBy?: string;
  readonly approvedBy?: string;
  readonly issuedOn?: string;
}

/** One scheme of a job with its answers. */
export interface ExportSubject {
  readonly job: Job;
  readonly assessed: AssessedScheme;
}

export interface ExportFormat {
  /** File name ending without its point. */
  readonly extension: string;
  readonly mime: string;
  /** Text, to be written as UTF-8, or bytes; the same subject and options always give the same. */
  readonly make: (subject: ExportSubject, options?: ExportOptions) => string | Uint8Array;
}

export const FORMATS = {
  svg: { extension: 'svg', mime: 'image/svg+xml', make: elevationSvg },
} as const satisfies Readonly<Record<string, ExportFormat>>;

export type FormatId = keyof typeof FORMATS;

function elevationSvg(subject: ExportSubject, options: ExportOptions = {}): string {
  const sheet = elevationSheet(subject.assessed, sheetTitle(subject, options), options);
  return sheetToSvg(sheet, options);
}

function sheetTitle({ job, assessed }: ExportSubject, options: ExportOptions) {
  const { site = {} } = job;
  const { arch, scheme, name } = assessed.result;
  const schemes = job.arches.flatMap((each) => each.schemes.map(({ id }) => ({ arch: each.id, scheme: id })));
  const index = schemes.findIndex((each) => each.arch === arch && each.scheme === scheme);
  return {
    owner: options.owner ?? '',
    number: site.reference ?? '',
    title: job.title ?? '',
    subtitle: [name, site.place ?? ''].filter((text) => text !== '').join(', '),
    createdBy: options.drawnBy ?? '',
    approvedBy: options.approvedBy ?? '',
    issuedOn: options.issuedOn ?? '',
    sheet: `${index + 1} of ${schemes.length}`,
    surveyedBy: site.surveyedBy ?? '',
    surveyedOn: site.surveyedOn ?? '',
  };
}

const LONGEST_STEM = 80;

/** A file name without its ending for one scheme: plain letters, digits and hyphens of its name. */
export function exportFileStem({ result }: AssessedScheme): string {
  const plain = result.name
    .normalize('NFKD')
    .replace(/\p{Mn}/gu, '')
    .toLowerCase()
    .match(/[a-z0-9]+/g);
  return [...(plain ?? ['arch']), 'elevation'].join('-').slice(-LONGEST_STEM);
}
