/**
 * A new job to begin from: an opening in believable proportions, and nothing claimed that nobody measured. What is
 * left open counts as assumed until it is entered.
 */
import { usualProfile } from './edits/shapes.ts';
import type { DrawnShape } from './edits/opening.ts';
import { JOB_FORMAT, JOB_VERSION } from './schema.ts';
import type { Job, Scheme } from './schema.ts';

/** A doorway for most shapes; a flat arch spans a window. Ring and breadth as a two-leaf wall would have them. */
const SPAN = 3;
const FLAT_SPAN = 1.2;
const THICKNESS = 0.35;
const BREADTH = 0.6;

export function freshScheme(shape: DrawnShape = 'semicircular'): Scheme {
  return {
    id: 's1',
    name: 'As found',
    role: 'as-found',
    profile: usualProfile(shape, shape === 'flat' ? FLAT_SPAN : SPAN),
    ring: { thickness: THICKNESS },
    breadth: BREADTH,
  };
}

export function freshJob(shape: DrawnShape = 'semicircular'): Job {
  return {
    format: JOB_FORMAT,
    version: JOB_VERSION,
    title: 'New job',
    arches: [{ id: 'a1', name: 'Arch 1', schemes: [freshScheme(shape)] }],
  };
}
