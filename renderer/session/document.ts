import type { FileRef } from '../../app/host.ts';
import type { Photographs } from '../../core/job/archive.ts';
import type { Job } from '../../core/job/schema.ts';

export interface OpenDocument {
  readonly job: Job;
  readonly photographs: Photographs;
  /** Null for a document that no file holds. */
  readonly file: FileRef | null;
  /** The job is not what the file holds: unsaved work that was kept aside. */
  readonly unsaved?: true;
}

export const NO_PHOTOGRAPHS: Photographs = new Map();
