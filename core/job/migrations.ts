/**
 * Numbered migrations of the job file: entry n of the table turns a document of version n into one of version n + 1.
 *
 * Version 1 is the first that was ever written, so the table is empty. Whoever raises `JOB_VERSION` adds one entry
 * here and one file under `tests/core/job/migrations/`; the suite fails while either is missing.
 */
import { JOB_VERSION } from './schema.ts';

/** A document of some older version, known only to be a JSON object. */
export type RawDocument = Readonly<Record<string, unknown>>;

export interface Migration {
  /** The version it starts from; it yields `from + 1`. */
  readonly from: number;
  /** What changed, one sentence, for the changelog and for messages. */
  readonly changed: string;
  /** Pure: old document to new document, `version` left to the caller. Must accept whatever the old reader accepted. */
  readonly up: (document: RawDocument) => RawDocument;
}

export const MIGRATIONS: readonly Migration[] = [];

/** The oldest version that can still be read. */
export const OLDEST_VERSION = JOB_VERSION - MIGRATIONS.length;

/**
 * Brings a document up to the version of this program, one step at a time.
 *
 * @param version the version that the document states, between the oldest in the table and `JOB_VERSION`.
 */
export function migrated(document: RawDocument, version: number, table = MIGRATIONS): RawDocument {
  return table
    .filter((migration) => migration.from >= version)
    .reduce((older, migration) => ({ ...migration.up(older), version: migration.from + 1 }), document);
}
