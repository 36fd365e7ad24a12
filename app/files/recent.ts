import { join } from 'node:path';
import { readWithin } from './read.ts';
import { saveWholeInFolder } from './save.ts';

export interface RecentPath {
  readonly path: string;
  /** ISO 8601, UTC. */
  readonly openedAt: string;
}

/** The files opened or saved before, kept in one small file of the user-data folder. */
export interface RecentPaths {
  /** Latest first. */
  list(): Promise<readonly RecentPath[]>;
  /** Puts the path first. `now` is the time of opening or saving. */
  note(path: string, now: Date): Promise<void>;
  forget(path: string): Promise<void>;
}

const MOST = 12;

/**
 * A list that cannot be read counts as empty, and one that cannot be written is let go: nobody's work hangs on it.
 * @param folder the user-data folder; made when first needed
 */
export function recentPaths(folder: string): RecentPaths {
  const file = join(folder, 'recent.json');
  const list = async (): Promise<readonly RecentPath[]> => {
    const read = await readWithin(file, 1_000_000);
    return read.kind === 'done' ? parsed(new TextDecoder().decode(read.value)) : [];
  };
  // One change after the other, so that two quick ones do not undo each other.
  let last: Promise<unknown> = Promise.resolve();
  const change = (edit: (paths: readonly RecentPath[]) => readonly RecentPath[]): Promise<void> => {
    const changed = last.then(async () => {
      const text = JSON.stringify(edit(await list()), null, 2);
      await saveWholeInFolder(file, new TextEncoder().encode(`${text}\n`));
    });
    last = changed;
    return changed;
  };
  const without = (paths: readonly RecentPath[], path: string): RecentPath[] =>
    paths.filter((one) => one.path !== path);
  return {
    list,
    note: (path, now) =>
      change((paths) => [{ path, openedAt: now.toISOString() }, ...without(paths, path)].slice(0, MOST)),
    forget: (path) => change((paths) => without(paths, path)),
  };
}

function parsed(text: string): readonly RecentPath[] {
  try {
    const value: unknown = JSON.parse(text);
    return Array.isArray(value) ? value.filter(isRecentPath).slice(0, MOST) : [];
  } catch {
    return [];
  }
}

function isRecentPath(value: unknown): value is RecentPath {
  if (typeof value !== 'object' || value === null) return false;
  const { path, openedAt } = value as Partial<Record<keyof RecentPath, unknown>>;
  return typeof path === 'string' && path !== '' && typeof openedAt === 'string';
}
