/** What an assessor may enter by mistake: each is a problem with its place and a way out, never a crash or a figure. */
import { describe, expect, test } from 'vitest';
import { assessJob } from '../../../core/assess/assess.ts';
import type { Job, Profile } from '../../../core/job/schema.ts';
import { problemsWith, schemeFrom } from '../../support/assessed.ts';

const RING = { thickness: 0.4, voussoirs: 15, joints: 'radial' as const };

interface Mistake {
  readonly profile: Profile;
  readonly thickness?: number;
  readonly vertical?: true;
  readonly path: string;
  /** Words that the problem must say of what would be right. */
  readonly right: RegExp;
}

const MISTAKES: Record<string, Mistake> = {
  'a ring thicker than the radius of its intrados': {
    profile: { shape: 'semicircular', span: 4 },
    thickness: 2,
    path: 'ring.thickness',
    right: /less than 2 m/,
  },
  'a segmental arch rising more than half its span': {
    profile: { shape: 'segmental', span: 4, rise: 2.1 },
    path: 'profile.rise',
    right: /at most 2 m.*horseshoe or pointed/,
  },
  'a horseshoe rising less than half its span': {
    profile: { shape: 'horseshoe', span: 4, rise: 2 },
    path: 'profile.rise',
    right: /more than 2 m.*segmental/,
  },
  'a pointed arch rising less than half its span': {
    profile: { shape: 'pointed', span: 4, rise: 1.9 },
    path: 'profile.rise',
    right: /at least 2 m/,
  },
  'a three-centred arch rising half its span': {
    profile: { shape: 'three-centred', span: 4, rise: 2 },
    path: 'profile.rise',
    right: /less than 2 m.*semicircular/,
  },
  'a three-centred arch with a haunch radius as great as its rise': {
    profile: { shape: 'three-centred', span: 4, rise: 1.4, haunchRadius: 1.4 },
    path: 'profile.haunchRadius',
    right: /less than 1\.4 m/,
  },
  'a four-centred arch with haunches as wide as itself': {
    profile: { shape: 'four-centred', span: 4, rise: 1.4, haunchRadius: 2, haunchAngle: 60 },
    path: 'profile.haunchRadius',
    right: /less than 2 m/,
  },
  'a four-centred arch whose upper arcs do not meet': {
    profile: { shape: 'four-centred', span: 4, rise: 3.5, haunchRadius: 0.5, haunchAngle: 60 },
    path: 'profile.haunchAngle',
    right: /haunch angle.*rise/,
  },
  'plumb joints on a horseshoe, which leans back under itself': {
    profile: { shape: 'horseshoe', span: 4, rise: 3 },
    vertical: true,
    path: 'ring.joints',
    right: /radial/,
  },
  'measured points that turn back': {
    profile: { shape: 'measured', points: [[-2, 0], [0, 1], [-0.5, 1.2], [2, 0]] }, // prettier-ignore
    path: 'profile.points[2]',
    right: /greater x/,
  },
  'measured points with the same x twice': {
    profile: { shape: 'measured', points: [[-2, 0], [0, 1], [0, 1.2], [2, 0]] }, // prettier-ignore
    path: 'profile.points[2]',
    right: /greater x/,
  },
  'measured points that sag': {
    profile: { shape: 'measured', points: [[-2, 0], [0, -0.3], [2, 0]] }, // prettier-ignore
    path: 'profile',
    right: /crown above/,
  },
};

describe('a profile or ring that cannot be built', () => {
  test.each(Object.entries(MISTAKES))('%s', (_, { profile, thickness, vertical, path, right }) => {
    const ring = { ...RING, thickness: thickness ?? 0.3, joints: vertical ? ('vertical' as const) : RING.joints };
    const problems = problemsWith({ profile, ring });
    expect(problems).toHaveLength(1);
    expect(problems[0]?.path).toBe(path);
    expect(problems[0]?.right).toMatch(right);
    expect(problems[0]?.value).not.toBe('');
    expect(problems[0]?.wrong).not.toMatch(/\.$/);
  });

  test('the limits themselves are taken', () => {
    const sound: Profile[] = [
      { shape: 'segmental', span: 4, rise: 2 },
      { shape: 'pointed', span: 4, rise: 2 },
      { shape: 'horseshoe', span: 4, rise: 2.001 },
      { shape: 'three-centred', span: 4, rise: 1.999 },
    ];
    for (const profile of sound) expect(problemsWith({ profile, ring: RING }), profile.shape).toEqual([]);
  });
});

describe('the job as a whole', () => {
  const good = schemeFrom({ profile: { shape: 'semicircular', span: 4 }, ring: RING });
  const offTheArch = { ...good, id: 's2', loads: [{ id: 'l1', kind: 'point' as const, x: 9, force: 5 }] };
  const tooHigh = { ...good, id: 's3', profile: { shape: 'segmental' as const, span: 4, rise: 3 } };
  const job: Job = {
    format: 'skewback.job',
    version: 1,
    arches: [
      { id: 'a1', schemes: [good] },
      { id: 'a2', schemes: [good, offTheArch, tooHigh] },
    ],
  };

  test('all problems come at once, with paths from the root of the file', () => {
    const outcome = assessJob(job);
    if (outcome.ok) throw new Error('nothing was found wrong');
    expect(outcome.problems.map(({ path }) => path)).toEqual([
      'arches[1].schemes[1].loads[0].x',
      'arches[1].schemes[2].profile.rise',
    ]);
  });

  test('a job without a title is assessed under an empty one', () => {
    const outcome = assessJob({ ...job, arches: job.arches.slice(0, 1) });
    if (!outcome.ok) throw new Error('a sound job was refused');
    expect(outcome.assessment).toMatchObject({ format: 'skewback.assessment', version: 1, title: '' });
    expect(outcome.assessment.schemes.map(({ arch, scheme }) => [arch, scheme])).toEqual([['a1', 's1']]);
  });
});
