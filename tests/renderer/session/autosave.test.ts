import { flushSync } from 'svelte';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Draft, Drafts } from '../../../app/host.ts';
import { readJobFile, writeJobFile } from '../../../core/job/archive.ts';
import { setThickness } from '../../../core/job/edits.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import { Autosave, type Holding } from '../../../renderer/session/autosave.svelte.ts';
import { NO_PHOTOGRAPHS } from '../../../renderer/session/document.ts';
import { Session } from '../../../renderer/session/session.svelte.ts';

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

/** A shelf of drafts and the locks of all windows, shared by the windows of one test. */
class Machine {
  readonly shelf = new Map<string, Draft>();
  readonly locks = new Set<string>();
  room = true;
  readonly drafts: Drafts = {
    keep: (note, bytes) => {
      if (!this.room) return Promise.resolve({ kind: 'failed', reason: 'There is no room left.' });
      this.shelf.set(note.id, { ...note, bytes, keptAt: new Date().toISOString() });
      return Promise.resolve({ kind: 'done', value: null });
    },
    list: () => Promise.resolve([...this.shelf.values()]),
    discard: (id) => Promise.resolve(void this.shelf.delete(id)),
  };
  readonly holding: Holding = {
    hold: (name) => {
      this.locks.add(name);
      return () => this.locks.delete(name);
    },
    held: () => Promise.resolve(this.locks),
  };

  window() {
    const session = new Session({ job: freshJob('segmental'), photographs: NO_PHOTOGRAPHS, file: null });
    const tell = vi.fn<(reason: string) => void>();
    const autosave = new Autosave(session, this.drafts, this.holding, tell);
    const stop = autosave.start();
    flushSync();
    return { session, autosave, tell, stop };
  }
}

function change(session: Session, thickness: number): void {
  session.edit('thickness', (scheme) => setThickness(scheme, thickness));
  flushSync();
}

const ring = (draft: Draft | undefined): number | undefined => {
  const reading = readJobFile(draft?.bytes ?? new Uint8Array());
  return reading.ok ? reading.job.arches[0]?.schemes[0]?.ring.thickness : undefined;
};

describe('unsaved work', () => {
  test('is kept within five seconds of the first change, with what was done until then', async () => {
    const machine = new Machine();
    const { session } = machine.window();
    for (let step = 1; step <= 9; step++) {
      change(session, 0.3 + step / 100);
      await vi.advanceTimersByTimeAsync(500);
    }
    expect(machine.shelf.size).toBe(1);
    await vi.advanceTimersByTimeAsync(500);
    expect(ring([...machine.shelf.values()][0])).toBeGreaterThanOrEqual(0.36);
  });

  test('is taken off the shelf when it is saved, and when another document is opened', async () => {
    const machine = new Machine();
    const { session } = machine.window();
    change(session, 0.4);
    await vi.advanceTimersByTimeAsync(5_000);
    session.kept(session.settled, { id: '1', name: 'mill.skewback', folder: '' });
    flushSync();
    await vi.advanceTimersByTimeAsync(0);
    expect(machine.shelf.size).toBe(0);
    change(session, 0.5);
    await vi.advanceTimersByTimeAsync(5_000);
    expect([...machine.shelf.values()][0]?.file?.name).toBe('mill.skewback');
    session.open({ job: freshJob('pointed'), photographs: NO_PHOTOGRAPHS, file: null });
    flushSync();
    await vi.advanceTimersByTimeAsync(5_000);
    expect(machine.shelf.size).toBe(0);
  });

  test('that cannot be kept is told', async () => {
    const machine = new Machine();
    machine.room = false;
    const { session, tell } = machine.window();
    change(session, 0.4);
    await vi.advanceTimersByTimeAsync(5_000);
    expect(tell).toHaveBeenCalledWith('There is no room left.');
  });
});

describe('work left behind', () => {
  async function crashed() {
    const machine = new Machine();
    const first = machine.window();
    change(first.session, 0.42);
    await vi.advanceTimersByTimeAsync(5_000);
    first.stop();
    machine.locks.clear();
    const second = machine.window();
    await vi.advanceTimersByTimeAsync(0);
    return { machine, ...second };
  }

  test('is not offered while its window lives', async () => {
    const machine = new Machine();
    change(machine.window().session, 0.42);
    await vi.advanceTimersByTimeAsync(5_000);
    const { autosave } = machine.window();
    await vi.advanceTimersByTimeAsync(0);
    expect(autosave.found).toEqual([]);
  });

  test('is opened unsaved, and its draft stays until there is a newer one', async () => {
    const { machine, session, autosave } = await crashed();
    const left = autosave.found[0]!;
    expect(autosave.recover(left)).toBeNull();
    flushSync();
    expect(session.scheme.ring.thickness).toBe(0.42);
    expect(session.dirty).toBe(true);
    expect(autosave.found).toEqual([]);
    expect(machine.shelf.has(left.id)).toBe(true);
    await vi.advanceTimersByTimeAsync(5_000);
    expect([...machine.shelf.values()].map(ring)).toEqual([0.42]);
    expect(machine.shelf.has(left.id)).toBe(false);
  });

  test('can be thrown away', async () => {
    const { machine, autosave } = await crashed();
    autosave.throwAway(autosave.found[0]!);
    await vi.advanceTimersByTimeAsync(0);
    expect(autosave.found).toEqual([]);
    expect(machine.shelf.size).toBe(0);
  });

  test('that cannot be read is told and nothing else is opened', async () => {
    const { session, autosave } = await crashed();
    const { job } = session;
    const broken = { ...autosave.found[0]!, bytes: writeJobFile(freshJob('pointed'), NO_PHOTOGRAPHS).slice(0, 40) };
    expect(autosave.recover(broken)).toContain('no longer be read');
    expect(session.job).toBe(job);
  });
});
