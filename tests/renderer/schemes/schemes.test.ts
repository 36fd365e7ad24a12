import { describe, expect, test } from 'vitest';
import { setThickness } from '../../../core/job/edits.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import { Schemes } from '../../../renderer/schemes/schemes.svelte.ts';
import { NO_PHOTOGRAPHS } from '../../../renderer/session/document.ts';
import { Session } from '../../../renderer/session/session.svelte.ts';

function opened() {
  const session = new Session({ job: freshJob('segmental'), photographs: NO_PHOTOGRAPHS, file: null });
  return { session, schemes: new Schemes(session) };
}

describe('the schemes of an arch', () => {
  test('duplicated, the copy is shown and takes the edits; the arch as found stays as it was', () => {
    const { session, schemes } = opened();
    const before = session.scheme;
    schemes.duplicate();
    session.edit('thickness', (scheme) => setThickness(scheme, 0.5));
    expect(session.scheme).toMatchObject({ name: 'Proposal 1', role: 'proposal', ring: { thickness: 0.5 } });
    expect(session.arch.schemes[0]).toBe(before);
  });

  test('undo and redo show the scheme that the step was about', () => {
    const { session, schemes } = opened();
    schemes.duplicate();
    session.edit('thickness', (scheme) => setThickness(scheme, 0.5));
    schemes.showAt(1);
    session.undo();
    expect(session.scheme).toMatchObject({ id: 's2', ring: { thickness: 0.35 } });
    schemes.showAt(1);
    session.redo();
    expect(session.scheme).toMatchObject({ id: 's2', ring: { thickness: 0.5 } });
    session.undo();
    session.undo();
    expect(session.arch.schemes).toHaveLength(1);
    session.redo();
    expect(session.scheme.id).toBe('s2');
  });

  test('deleted, the one before is shown, and undo brings it back; the arch as found stays', () => {
    const { session, schemes } = opened();
    expect(schemes.canRemove).toBe(false);
    schemes.duplicate();
    schemes.remove();
    expect(session.scheme.id).toBe('s1');
    schemes.remove();
    expect(session.arch.schemes).toHaveLength(1);
    session.undo();
    expect(session.scheme.id).toBe('s2');
  });

  test('are gone through in a ring, and by their place', () => {
    const { session, schemes } = opened();
    schemes.duplicate();
    schemes.duplicate();
    schemes.step(1);
    expect(session.scheme.id).toBe('s1');
    schemes.step(-1);
    expect(session.scheme.id).toBe('s3');
    schemes.showAt(2);
    expect(session.scheme.id).toBe('s2');
    schemes.showAt(9);
    expect(session.scheme.id).toBe('s2');
  });

  test('laid over one another, the two change places when the upper one is shown', () => {
    const { session, schemes } = opened();
    schemes.duplicate();
    schemes.lay('s1');
    expect(schemes.laid?.id).toBe('s1');
    expect(schemes.other?.name).toBe('As found');
    schemes.showAt(1);
    expect(session.scheme.id).toBe('s1');
    expect(schemes.laid?.id).toBe('s2');
    schemes.lay('s2');
    expect(schemes.laid).toBeNull();
  });

  test('renamed, the name is a step; an empty one is none', () => {
    const { session, schemes } = opened();
    schemes.rename('s1', 'Before the flood');
    expect(session.scheme.name).toBe('Before the flood');
    schemes.rename('s1', '');
    expect(session.scheme.name).toBe('Before the flood');
    session.undo();
    expect(session.scheme.name).toBe('As found');
  });
});
