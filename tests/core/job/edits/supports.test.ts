import { describe, expect, it } from 'vitest';
import {
  addBodyLoad,
  addCourse,
  addTie,
  applyEnough,
  moveTie,
  removeBodyLoad,
  removeCourse,
  removeTie,
  setBedFriction,
  setBodyLoad,
  setCourse,
  setEarth,
  setFooting,
  setGround,
  setSupportKind,
  setTie,
} from '../../../../core/job/edits.ts';
import { freshScheme } from '../../../../core/job/fresh.ts';
import type { Scheme } from '../../../../core/job/schema.ts';
import { supportProblems } from '../../../../core/job/support-relations.ts';

const bare: Scheme = freshScheme('segmental');
const pier = setSupportKind(bare, 'left', 'pier');
const left = (scheme: Scheme) => scheme.supports!.left!;

describe('a support', () => {
  it('that becomes a pier begins with one course in believable proportions', () => {
    expect(left(pier)).toEqual({ kind: 'pier', courses: [{ height: 1.5, depth: 0.75 }] });
    expect(pier.supports!.right).toBeUndefined();
  });

  it('keeps its courses when it is taken as rigid for a while', () => {
    const back = setSupportKind(setSupportKind(pier, 'left', 'rigid'), 'left', 'buttress');
    expect(left(back)).toEqual({ kind: 'buttress', courses: [{ height: 1.5, depth: 0.75 }] });
  });

  it('is the same object when nothing changes', () => {
    expect(setSupportKind(pier, 'left', 'pier')).toBe(pier);
    expect(setCourse(pier, 'left', 0, { depth: 0.75 })).toBe(pier);
    expect(setCourse(pier, 'left', 4, { depth: 2 })).toBe(pier);
  });

  it('takes footing, ground, earth and friction, and gives them up again', () => {
    const full = setEarth(
      setGround(setFooting(setBedFriction(pier, 'left', null), 'left', { projectionBack: 0.2 }), 'left', {
        bearing: 150,
      }),
      'left',
      { height: 1.2 },
    );
    expect(left(full)).toMatchObject({
      friction: null,
      footing: { height: 0.4, projectionBack: 0.2 },
      ground: { bearing: 150 },
      earth: { active: 0.33, height: 1.2 },
    });
    const gone = setEarth(
      setGround(setFooting(setBedFriction(full, 'left', undefined), 'left', undefined), 'left', undefined),
      'left',
      undefined,
    );
    expect(left(gone)).toEqual(left(pier));
  });
});

describe('courses', () => {
  const stepped = addCourse(pier, 'left', { height: 1, setOffBack: 0.25 });

  it('know their depth one way only', () => {
    const deep = setCourse(stepped, 'left', 1, { depth: 1.1 });
    expect(left(deep).courses![1]).toEqual({ height: 1, depth: 1.1 });
    expect(left(setCourse(deep, 'left', 1, { setOffBack: 0.3 })).courses![1]).toEqual({ height: 1, setOffBack: 0.3 });
    expect(supportProblems({ kind: 'pier', courses: [{ height: 1, depth: 1, setOffBack: 0.1 }] })).toMatchObject([
      { path: 'courses[0].setOffBack' },
    ]);
    expect(supportProblems({ kind: 'pier', courses: [{ height: 1 }] })).toMatchObject([{ path: 'courses[0].depth' }]);
  });

  it('refuse set-offs that leave no depth', () => {
    const thin = [
      { height: 1, depth: 0.5 },
      { height: 1, setOffBack: -0.6 },
    ];
    expect(supportProblems({ kind: 'pier', courses: thin })).toMatchObject([
      { path: 'courses[1].setOffBack', wrong: 'the set-offs leave a course no depth (-0.1 m)' },
    ]);
  });

  it('that come to the top keep the depth they had', () => {
    expect(left(removeCourse(stepped, 'left', 0)).courses).toEqual([{ height: 1, depth: 1 }]);
    expect(removeCourse(pier, 'left', 0)).toBe(pier);
  });

  it('stay above nothing', () => {
    expect(left(setCourse(pier, 'left', 0, { depth: -3, height: Number.NaN })).courses).toEqual([
      { height: 1.5, depth: 0.005 },
    ]);
  });

  it('grow together to a depth that is enough', () => {
    const deeper = applyEnough(addCourse(stepped, 'left', { height: 1, depth: 1.5 }), 'left', 'depth', 1);
    expect(left(deeper).courses!.map(({ depth }) => depth)).toEqual([1, undefined, 1.75]);
    const wide = applyEnough(setFooting(stepped, 'left', { projectionFront: 0.1 }), 'left', 'footing', 1.4);
    expect(left(wide).footing!.projectionBack).toBeCloseTo(0.3, 10);
    expect(left(applyEnough(pier, 'left', 'weight', 12)).loads).toEqual([
      { kind: 'vertical', name: 'Weight added', force: 12, offset: 0.375 },
    ]);
  });
});

it('loads on a body are added, changed and taken away', () => {
  const loaded = addBodyLoad(pier, 'left', { kind: 'horizontal', push: -20, level: 0 });
  expect(left(setBodyLoad(loaded, 'left', 0, { kind: 'vertical', force: 8, offset: 0.2 })).loads).toEqual([
    { kind: 'vertical', force: 8, offset: 0.2 },
  ]);
  expect(removeBodyLoad(loaded, 'left', 0)).toEqual(pier);
});

describe('a tie', () => {
  const tied = addTie(bare);

  it('has the next free id and a usual bar at the springing', () => {
    expect(tied.ties).toEqual([{ id: 't1', level: 0, bar: { shape: 'round', diameter: 0.025 } }]);
    expect(addTie(tied).ties!.map(({ id }) => id)).toEqual(['t1', 't2']);
  });

  it('is dragged, typed and taken away', () => {
    expect(moveTie(tied, 't1', 0.4).ties![0]!.level).toBe(0.4);
    expect(moveTie(tied, 't1', Number.NaN)).toBe(tied);
    expect(setTie(tied, 't1', { pretension: -4, thread: 'M24' }).ties![0]).toMatchObject({
      pretension: 0,
      thread: 'M24',
    });
    expect(setTie(tied, 'none', { level: 1 })).toBe(tied);
    expect(removeTie(tied, 't1')).toEqual(bare);
  });
});
