import type { ExportedFile } from '../../app/host.ts';
import type { AssessedScheme } from '../../core/assess/assess.ts';
import { exportFileStem, FORMATS } from '../../core/export/formats.ts';
import type { Job } from '../../core/job/schema.ts';
import { sheetLettering } from './preferences.ts';

/** The scheme that is shown as a drawing on a sheet, issued today, lengths lettered as the person reads them. */
export function drawingFile(assessed: AssessedScheme, job: Job): ExportedFile {
  const { extension, mime, make } = FORMATS.svg;
  const issuedOn = new Date().toLocaleDateString('en-CA');
  const drawing = make({ job, assessed }, { issuedOn, ...sheetLettering() });
  return { name: `${exportFileStem(assessed)}.${extension}`, mime, bytes: new TextEncoder().encode(drawing) };
}
