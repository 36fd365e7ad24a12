/**
 * Edits of the job, its arches and their schemes: job to job, sharing whatever did not change, so that undo keeps
 * documents at no cost. An edit that changes nothing returns the very same job. An arch or scheme that is not there
 * is a `RangeError`: a fault of the caller, not of the person.
 */
import { LIMITS } from '../schema.ts';
import type { Arch, Job, Scheme, Site } from '../schema.ts';
import { nextId } from './ids.ts';
import { patched } from './patch.ts';
import type { Patch } from './patch.ts';

export function setTitle(job: Job, title: string): Job {
  return patched(job, { title });
}

export function setSite(job: Job, patch: Patch<Site>): Job {
  const before = job.site ?? {};
  const after = patched(before, patch);
  return after === before ? job : patched(job, { site: after });
}

/** Adds an arch with one scheme as found, after the others; the job as it is where it holds as many as it may. */
export function addArch(job: Job, scheme: Scheme, name?: string): Job {
  if (job.arches.length >= LIMITS.arches) return job;
  const id = nextId('a', job.arches);
  const found: Scheme = { ...scheme, id: 's1', name: scheme.name ?? 'As found', role: 'as-found' };
  const arch: Arch = { id, name: name ?? `Arch ${job.arches.length + 1}`, schemes: [found] };
  return patched(job, { arches: [...job.arches, arch] });
}

export function renameArch(job: Job, archId: string, name: string): Job {
  return withArch(job, archId, (arch) => patched(arch, { name }));
}

/** The last arch of a job stays: a job has at least one. */
export function removeArch(job: Job, archId: string): Job {
  if (job.arches.length === 1) return job;
  const arches = job.arches.filter(({ id }) => id !== archId);
  return arches.length === job.arches.length ? job : patched(job, { arches });
}

/** Lifts an edit of a scheme to the job. */
export function patchScheme(job: Job, archId: string, schemeId: string, edit: (scheme: Scheme) => Scheme): Job {
  return withArch(job, archId, (arch) => {
    const schemes = replaced(arch.schemes, schemeId, edit);
    return schemes === arch.schemes ? arch : patched(arch, { schemes });
  });
}

export function replaceScheme(job: Job, archId: string, scheme: Scheme): Job {
  return patchScheme(job, archId, scheme.id, () => scheme);
}

export function renameScheme(job: Job, archId: string, schemeId: string, name: string): Job {
  return patchScheme(job, archId, schemeId, (scheme) => patched(scheme, { name }));
}

/** A proposal to work on, alike in all but id, name and role, put after the other schemes. */
export function duplicateScheme(job: Job, archId: string, schemeId: string, name?: string): Job {
  return withArch(job, archId, (arch) => {
    const original = found(arch.schemes, schemeId);
    if (arch.schemes.length >= LIMITS.schemes) return arch;
    const proposal: Scheme = {
      ...original,
      id: nextId('s', arch.schemes),
      name: name ?? `Proposal ${arch.schemes.length}`,
      role: 'proposal',
    };
    return patched(arch, { schemes: [...arch.schemes, proposal] });
  });
}

/** The arch as found, which is the first scheme, stays. */
export function removeScheme(job: Job, archId: string, schemeId: string): Job {
  return withArch(job, archId, (arch) => {
    const schemes = arch.schemes.filter(({ id }, index) => index === 0 || id !== schemeId);
    return schemes.length === arch.schemes.length ? arch : patched(arch, { schemes });
  });
}

/** @throws RangeError when the job has no such arch or scheme. */
export function schemeOf(job: Job, archId: string, schemeId: string): Scheme {
  return found(found(job.arches, archId).schemes, schemeId);
}

function withArch(job: Job, archId: string, edit: (arch: Arch) => Arch): Job {
  const arches = replaced(job.arches, archId, edit);
  return arches === job.arches ? job : patched(job, { arches });
}

function replaced<T extends { readonly id: string }>(
  entries: readonly T[],
  id: string,
  edit: (entry: T) => T,
): readonly T[] {
  const before = found(entries, id);
  const after = edit(before);
  return after === before ? entries : entries.map((entry) => (entry === before ? after : entry));
}

function found<T extends { readonly id: string }>(entries: readonly T[], id: string): T {
  const entry = entries.find((candidate) => candidate.id === id);
  if (entry === undefined) throw new RangeError(`the job has nothing with the id "${id}" here`);
  return entry;
}
