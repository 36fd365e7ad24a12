import { describe, expect, it } from 'vitest';
import {
  addArch,
  duplicateScheme,
  patchScheme,
  removeArch,
  removeScheme,
  renameArch,
  renameScheme,
  replaceScheme,
  schemeOf,
  setSite,
  setSpan,
  setTitle,
} from '../../../../core/job/edits.ts';
import { freshJob, freshScheme } from '../../../../core/job/fresh.ts';
import { readJob } from '../../../../core/job/read.ts';
import type { Job } from '../../../../core/job/schema.ts';
import { writeJob } from '../../../../core/job/write.ts';

const job: Job = freshJob('segmental');
const two = addArch(job, freshScheme('pointed'), 'Chapel window');

describe('the heading', () => {
  it('has a title and a site', () => {
    expect(setTitle(job, 'Harrowmere Mill').title).toBe('Harrowmere Mill');
    const dated = setSite(job, { place: 'Harrowmere', surveyedOn: '2026-05-14' });
    expect(dated.site).toEqual({ place: 'Harrowmere', surveyedOn: '2026-05-14' });
    expect(setSite(dated, { surveyedOn: undefined }).site).toEqual({ place: 'Harrowmere' });
  });

  it('set to what it is gives the very same job', () => {
    expect(setTitle(job, 'New job')).toBe(job);
    expect(setSite(job, {})).toBe(job);
  });
});

describe('arches', () => {
  it('are added after the others, each with one scheme as found', () => {
    expect(two.arches.map(({ id, name }) => [id, name])).toEqual([
      ['a1', 'Arch 1'],
      ['a2', 'Chapel window'],
    ]);
    expect(two.arches[1]?.schemes[0]).toMatchObject({ id: 's1', role: 'as-found', profile: { shape: 'pointed' } });
    expect(two.arches[0]).toBe(job.arches[0]);
  });

  it('are renamed and removed, but the last one stays', () => {
    expect(renameArch(two, 'a2', 'East window').arches[1]?.name).toBe('East window');
    expect(removeArch(two, 'a1').arches.map(({ id }) => id)).toEqual(['a2']);
    expect(removeArch(job, 'a1')).toBe(job);
    expect(addArch(removeArch(two, 'a1'), freshScheme()).arches.map(({ id }) => id)).toEqual(['a2', 'a3']);
  });
});

describe('schemes', () => {
  const proposed = duplicateScheme(two, 'a1', 's1');

  it('are copied as proposals that share what they have in common', () => {
    const [found, proposal] = proposed.arches[0]!.schemes;
    expect(proposal).toMatchObject({ id: 's2', name: 'Proposal 1', role: 'proposal' });
    expect(proposal?.profile).toBe(found?.profile);
    expect(readJob(writeJob(proposed))).toEqual({ ok: true, job: proposed });
  });

  it('are edited one by one, leaving all else untouched', () => {
    const wider = patchScheme(proposed, 'a1', 's2', (scheme) => setSpan(scheme, 3.4));
    expect(schemeOf(wider, 'a1', 's2').profile).toMatchObject({ span: 3.4 });
    expect(wider.arches[0]?.schemes[0]).toBe(proposed.arches[0]?.schemes[0]);
    expect(wider.arches[1]).toBe(proposed.arches[1]);
    expect(schemeOf(proposed, 'a1', 's2').profile).toMatchObject({ span: 3 });
  });

  it('give the very same job when an edit changes nothing', () => {
    expect(patchScheme(proposed, 'a1', 's2', (scheme) => setSpan(scheme, 3))).toBe(proposed);
  });

  it('are renamed, replaced and removed, but the one as found stays', () => {
    expect(schemeOf(renameScheme(proposed, 'a1', 's2', 'Tie at the springing'), 'a1', 's2').name).toBe(
      'Tie at the springing',
    );
    const other = { ...freshScheme('elliptical'), id: 's2', role: 'proposal' } as const;
    expect(schemeOf(replaceScheme(proposed, 'a1', other), 'a1', 's2')).toBe(other);
    expect(removeScheme(proposed, 'a1', 's2')).toEqual(two);
    expect(removeScheme(proposed, 'a1', 's1')).toBe(proposed);
  });
});

it('an arch or scheme that is not there is the caller’s fault', () => {
  expect(() => renameArch(job, 'a9', 'x')).toThrow(RangeError);
  expect(() => schemeOf(job, 'a1', 's9')).toThrow(RangeError);
  expect(() => patchScheme(job, 'a1', 's9', (scheme) => scheme)).toThrow('nothing with the id "s9"');
});

it('undo costs nothing: the old document is still there, unchanged', () => {
  const before = writeJob(job);
  const after = patchScheme(setTitle(job, 'Changed'), 'a1', 's1', (scheme) => setSpan(scheme, 4));
  expect(after).not.toBe(job);
  expect(writeJob(job)).toBe(before);
});
