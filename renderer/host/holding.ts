import type { Holding } from '../session/autosave.svelte.ts';

/** The browser's locks: they go when their page goes, however it goes. */
export const browserHolding: Holding = {
  hold(name) {
    let release = (): void => undefined;
    const held = new Promise<void>((resolve) => (release = resolve));
    void navigator.locks.request(name, () => held);
    return () => release();
  },
  async held() {
    const { held = [] } = await navigator.locks.query();
    return new Set(held.map(({ name = '' }) => name));
  },
};
