import { describe, expect, test, vi } from 'vitest';
import type { FileRef, Host } from '../../../app/host.ts';
import { readJobFile, writeJobFile } from '../../../core/job/archive.ts';
import { setThickness } from '../../../core/job/edits.ts';
import { freshJob } from '../../../core/job/fresh.ts';
import { NO_PHOTOGRAPHS } from '../../../renderer/session/document.ts';
import { Files } from '../../../renderer/session/files.svelte.ts';
import { Session } from '../../../renderer/session/session.svelte.ts';

const FILE: FileRef = { id: '7', name: 'mill.skewback', folder: '' };

function desk(answers: Partial<Host> = {}) {
  const session = new Session({ job: freshJob('segmental'), photographs: NO_PHOTOGRAPHS, file: null });
  const host: Host = {
    shell: 'browser',
    versions: { app: '0', engine: 'test' },
    open: () => Promise.resolve({ kind: 'cancelled' }),
    save: (file) => Promise.resolve({ kind: 'done', value: file }),
    saveAs: (name) => Promise.resolve({ kind: 'done', value: { ...FILE, name } }),
    exportFile: ({ name }) => Promise.resolve({ kind: 'done', value: name }),
    ...answers,
  };
  return { session, files: new Files(session, host) };
}

const changed = (session: Session): void => session.edit('thickness', (scheme) => setThickness(scheme, 0.5));

describe('saving', () => {
  test('a document without a file asks for a place, and the next saving goes there', async () => {
    const saveAs = vi.fn<Host['saveAs']>(() => Promise.resolve({ kind: 'done', value: FILE }));
    const save = vi.fn<Host['save']>((file) => Promise.resolve({ kind: 'done', value: file }));
    const { session, files } = desk({ saveAs, save });
    changed(session);
    expect(await files.save()).toBe(true);
    expect(saveAs.mock.calls[0]?.[0]).toBe('new-job.skewback');
    expect(session.dirty).toBe(false);
    changed(session);
    session.edit('thickness', (scheme) => setThickness(scheme, 0.6));
    await files.save();
    expect(save.mock.calls[0]?.[0]).toBe(FILE);
    const written = readJobFile(save.mock.calls[0]![1]);
    expect(written.ok && written.job).toEqual(session.settled);
  });

  test('that fails is told, and the work stays unsaved', async () => {
    const { session, files } = desk({ saveAs: () => Promise.resolve({ kind: 'failed', reason: 'The disk is full.' }) });
    changed(session);
    expect(await files.save()).toBe(false);
    expect(files.notice).toMatchObject({ kind: 'problem', text: 'The disk is full.' });
    expect(session.dirty).toBe(true);
  });

  test('given up in the dialog says nothing', async () => {
    const { session, files } = desk({ saveAs: () => Promise.resolve({ kind: 'cancelled' }) });
    changed(session);
    expect(await files.save()).toBe(false);
    expect(files.notice).toBeNull();
  });
});

describe('opening', () => {
  const opening = (bytes: Uint8Array) =>
    desk({ open: () => Promise.resolve({ kind: 'done', value: { file: FILE, bytes } }) });

  test('puts the file in the place of the document, with nothing to undo', async () => {
    const { session, files } = opening(writeJobFile({ ...freshJob('pointed'), title: 'Mill' }));
    await files.open();
    expect(session.job.title).toBe('Mill');
    expect(session.file).toBe(FILE);
    expect(session.toUndo).toBeNull();
  });

  test('of what is no job says what is wrong with it and keeps the document', async () => {
    const { session, files } = opening(new TextEncoder().encode('{"format": "skewback.job", "version": 99}'));
    const { job } = session;
    await files.open();
    expect(files.notice?.text).toBe('mill.skewback could not be opened.');
    expect(files.notice?.details[0]).toContain('newer');
    expect(session.job).toBe(job);
  });

  test('over unsaved work asks first, and staying keeps it', async () => {
    const { session, files } = opening(writeJobFile(freshJob('pointed')));
    changed(session);
    const { job } = session;
    const opened = files.open();
    files.question?.('stay');
    await opened;
    expect(session.job).toBe(job);
    expect(files.question).toBeNull();
  });

  test('over unsaved work saves it first where that is asked for', async () => {
    const { session, files } = opening(writeJobFile({ ...freshJob('pointed'), title: 'Mill' }));
    changed(session);
    const opened = files.open();
    files.question?.('save');
    await opened;
    expect(session.job.title).toBe('Mill');
  });
});
