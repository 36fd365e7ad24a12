/** Which scheme is shown, and which one a step was about. */
import type { Job } from '../../core/job/schema.ts';

export interface Place {
  readonly arch: string;
  readonly scheme: string;
}

/**
 * The scheme that differs between two documents: the one that was added or edited. Null where a scheme or an arch was
 * taken away, or nothing of a scheme changed.
 */
export function changedPlace(before: Job, after: Job): Place | null {
  if (before === after) return null;
  for (const arch of after.arches) {
    const old = before.arches.find(({ id }) => id === arch.id);
    if (old === arch) continue;
    const scheme = arch.schemes.find((one) => !old?.schemes.includes(one));
    if (scheme !== undefined) return { arch: arch.id, scheme: scheme.id };
  }
  return null;
}
