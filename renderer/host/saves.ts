import type { FileRef, KeptSaves } from '../../app/host.ts';
import { store } from './store.ts';

/** As many as one would look through. */
const MOST = 10;

const keyOf = ({ folder, name }: FileRef): string => `${folder}/${name}`;

/** The last saves of each file by its folder and name; where nothing can be kept, there are none. */
export const keptSaves: KeptSaves = {
  async keep(file, bytes) {
    const writing = (await store()).transaction('saves', 'readwrite');
    await writing.store.add({ file: keyOf(file), savedAt: new Date().toISOString(), bytes });
    const keys = await writing.store.index('file').getAllKeys(keyOf(file));
    await Promise.all(keys.slice(0, -MOST).map((key) => writing.store.delete(key)));
    await writing.done;
  },
  async list(file) {
    const saves = await (await store()).getAllFromIndex('saves', 'file', keyOf(file));
    return saves.map(({ savedAt, bytes }) => ({ savedAt, bytes })).reverse();
  },
};
