import type { Drafts } from '../../app/host.ts';
import { handleOf, reference } from './handles.ts';
import { store } from './store.ts';

/** Unsaved work, kept by the browser. */
export const browserDrafts: Drafts = {
  async keep({ id, title, file }, bytes) {
    const handle = file === null ? null : handleOf(file);
    const draft = { id, title, fileName: file?.name ?? null, handle, keptAt: new Date().toISOString(), bytes };
    try {
      await (await store()).put('drafts', draft);
      return { kind: 'done', value: null };
    } catch (error) {
      const full = error instanceof DOMException && error.name === 'QuotaExceededError';
      const because = full ? 'there is no room left' : 'the browser keeps nothing for this page';
      return { kind: 'failed', reason: `A draft cannot be kept: ${because}.` };
    }
  },
  async list() {
    const drafts = await (await store()).getAll('drafts').catch(() => []);
    return drafts
      .map(({ id, title, fileName, handle, keptAt, bytes }) => ({
        ...{ id, title, keptAt, bytes },
        file: fileName === null ? null : reference(fileName, handle),
      }))
      .sort((a, b) => b.keptAt.localeCompare(a.keptAt));
  },
  async discard(id) {
    await (await store()).delete('drafts', id);
  },
};
