/** Every edit of a job: one pure function each, old document to new document. */
export * from './edits/above-details.ts';
export * from './edits/combinations.ts';
export * from './edits/cracks.ts';
export * from './edits/document.ts';
export * from './edits/loads.ts';
export * from './edits/opening.ts';
export * from './edits/ring-details.ts';
export * from './edits/ring.ts';
export * from './edits/road.ts';
export * from './edits/supports.ts';
export * from './edits/ties.ts';
export type { Patch } from './edits/patch.ts';
