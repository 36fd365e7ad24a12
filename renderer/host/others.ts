/** Other tabs with the same file: they ask and tell one another over a channel that the browser gives one origin. */
import type { FileRef, Unlisten } from '../../app/host.ts';
import { handleOf } from './handles.ts';

interface Word {
  /** `opened` asks for an answer, `also` is the answer, `closed` needs none. */
  readonly kind: 'opened' | 'also' | 'closed';
  readonly from: string;
  readonly handle: FileSystemFileHandle;
}

/** Tells at once and after each change whether another tab has the file. Files that cannot be written again are nobody's. */
export function watchOthers(file: FileRef, listener: (others: boolean) => void): Unlisten {
  const handle = handleOf(file);
  if (handle === null) return () => undefined;
  const own = crypto.randomUUID();
  const others = new Set<string>();
  const channel = new BroadcastChannel('skewback.files');
  const say = (kind: Word['kind']): void => channel.postMessage({ kind, from: own, handle } satisfies Word);
  channel.onmessage = ({ data }: MessageEvent<Word>) => {
    void handle.isSameEntry(data.handle).then((same) => {
      if (!same) return;
      if (data.kind === 'closed') others.delete(data.from);
      else others.add(data.from);
      if (data.kind === 'opened') say('also');
      listener(others.size > 0);
    });
  };
  const leave = (): void => say('closed');
  addEventListener('pagehide', leave);
  say('opened');
  return () => {
    removeEventListener('pagehide', leave);
    leave();
    channel.close();
  };
}
