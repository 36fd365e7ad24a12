import { describe, expect, test } from 'vitest';
import { addLoad, moveCrown, setThickness } from '../../../core/job/edits.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import type { Job } from '../../../core/job/schema.ts';
import { NO_PHOTOGRAPHS } from '../../../renderer/session/document.ts';
import { measureAt } from '../../../renderer/session/measures.ts';
import { Session } from '../../../renderer/session/session.svelte.ts';

const opened = (job: Job = freshJob('segmental')): Session =>
  new Session({ job, photographs: NO_PHOTOGRAPHS, file: null });

const rise = (session: Session): unknown => 'rise' in session.scheme.profile && session.scheme.profile.rise;

function measure(session: Session, path: string) {
  const found = session.assessed && measureAt(session.assessed.resolved, path);
  if (!found) throw new Error(`no measure at ${path}`);
  return found;
}

describe('a drag', () => {
  test('shows each place from the document that it began with, and is one step when released', () => {
    const session = opened();
    const before = session.job;
    const drag = session.drag();
    for (const y of [0.8, 0.9, 1]) drag.preview((scheme) => moveCrown(scheme, { x: 0, y }));
    expect(rise(session)).toBe(1);
    expect(session.settled).toBe(before);
    drag.release('rise 1 m');
    expect(rise(session)).toBe(1);
    expect(session.toUndo).toBe('rise 1 m');
    session.undo();
    expect(session.job).toBe(before);
    expect(session.toUndo).toBeNull();
  });

  test('abandoned, it leaves the document and its steps as they were', () => {
    const session = opened();
    const before = session.job;
    const drag = session.drag();
    drag.preview((scheme) => moveCrown(scheme, { x: 0, y: 1 }));
    drag.abandon();
    expect(session.job).toBe(before);
    expect(session.toUndo).toBeNull();
  });

  test('released where it began, it makes no step', () => {
    const session = opened();
    session.drag().release('rise');
    expect(session.toUndo).toBeNull();
    expect(session.dirty).toBe(false);
  });

  test('stops at what can be built and says why it goes no further', () => {
    const session = opened();
    session.edit('add load', (scheme) => addLoad(scheme, { kind: 'point', name: 'post', x: 1.2, force: 5 }));
    const drag = session.drag();
    drag.preview((scheme) => ({ ...scheme, profile: { shape: 'segmental', span: 1, rise: 0.2 } }));
    expect(session.refusal).not.toBe('');
    expect(session.scheme.profile).toMatchObject({ span: 3 });
    drag.release('span');
    expect(session.refusal).toBe('');
  });

  test('undone while it lasts, it changes nothing any more', () => {
    const session = opened();
    session.edit('thickness', (scheme) => setThickness(scheme, 0.4));
    const drag = session.drag();
    session.undo();
    drag.preview((scheme) => moveCrown(scheme, { x: 0, y: 1 }));
    drag.release('rise');
    expect(rise(session)).toBe(0.75);
    expect(session.toUndo).toBeNull();
  });
});

describe('a typed figure', () => {
  test('is taken as one named step', () => {
    const session = opened();
    expect(session.enter(measure(session, 'profile.span'), 2.5273, '2.5273 m')).toBeNull();
    expect(session.scheme.profile).toMatchObject({ span: 2.5273 });
    expect(session.toUndo).toBe('span 2.5273 m');
  });

  test('is refused with the limit where a drag would be held at it', () => {
    const session = opened();
    expect(session.enter(measure(session, 'profile.rise'), 2, '2 m')).toMatch(/^At most 1\.500.m is possible here\.$/);
    expect(session.enter(measure(session, 'ring.thickness'), -1, '−1 m')).toMatch(/^At least /);
    expect(session.toUndo).toBeNull();
  });

  test('is refused where the arch could not be built with it', () => {
    const session = opened();
    session.edit('add load', (scheme) => addLoad(scheme, { kind: 'point', name: 'post', x: 1.2, force: 5 }));
    expect(session.enter(measure(session, 'profile.span'), 1, '1 m')).not.toBeNull();
    expect(session.scheme.profile).toMatchObject({ span: 3 });
  });

  test('of a count is a whole number', () => {
    const session = opened();
    expect(session.enter(measure(session, 'ring.voussoirs'), 17.5, '17.5')).toBe('A whole number is wanted.');
    expect(session.enter(measure(session, 'ring.voussoirs'), 17, '17')).toBeNull();
  });
});

describe('the document', () => {
  test('is dirty until its file has it, and clean again when undone back to that', () => {
    const session = opened();
    const file = { id: '1', name: 'door.skewback', folder: '' };
    session.edit('thickness', (scheme) => setThickness(scheme, 0.4));
    expect(session.dirty).toBe(true);
    session.kept(session.settled, file);
    expect(session.dirty).toBe(false);
    session.edit('thickness', (scheme) => setThickness(scheme, 0.5));
    expect(session.dirty).toBe(true);
    session.undo();
    expect(session.dirty).toBe(false);
  });

  test('is assessed once for each scheme, however often it is looked at', () => {
    const session = opened();
    const first = session.assessed;
    session.edit('thickness', (scheme) => setThickness(scheme, 0.4));
    expect(session.assessed).not.toBe(first);
    session.undo();
    expect(session.assessed).toBe(first);
  });

  test('that cannot be built as it came takes an edit that mends it', () => {
    const job = freshJob('segmental');
    const [arch] = job.arches;
    const scheme = { ...arch!.schemes[0]!, loads: [{ id: 'l1', kind: 'point' as const, x: 9, force: 1 }] };
    const session = opened({ ...job, arches: [{ ...arch!, schemes: [scheme] }] });
    expect(session.assessed).toBeNull();
    session.edit('thickness', (before) => setThickness(before, 0.4));
    expect(session.scheme.ring.thickness).toBe(0.4);
    session.edit('no loads', (before) => ({ ...before, loads: [] }));
    expect(session.assessed).not.toBeNull();
  });
});
