/** Every edit of a job: one pure function each, old document to new document. */
export * from './edits/document.ts';
export * from './edits/loads.ts';
export * from './edits/opening.ts';
export * from './edits/ring.ts';
export type { Patch } from './edits/patch.ts';
