import { assessScheme } from '../../core/assess/assess.ts';
import { exportFileStem, FORMATS, type FormatId } from '../../core/export/formats.ts';
import type { Job } from '../../core/job/schema.ts';

/** A drawing or sheet ready to be written. */
export interface Drawing {
  /** File name with its ending, no folder. */
  readonly name: string;
  readonly bytes: Uint8Array;
}

export const FORMAT_NAMES = Object.keys(FORMATS) as readonly FormatId[];

export function isFormat(name: string): name is FormatId {
  return Object.hasOwn(FORMATS, name);
}

/** A drawing of every scheme of a job that can be assessed, in one format. */
export function drawingsOf(job: Job, format: FormatId): Drawing[] {
  const { extension, make } = FORMATS[format];
  return job.arches.flatMap((arch) =>
    arch.schemes.flatMap((scheme) => {
      const outcome = assessScheme(arch, scheme);
      if (!outcome.ok) return [];
      const made: string | Uint8Array = make({ job, assessed: outcome.assessed });
      const bytes = typeof made === 'string' ? new TextEncoder().encode(made) : made;
      return [{ name: `${exportFileStem(outcome.assessed)}.${extension}`, bytes }];
    }),
  );
}
