/** Whether keys of a single letter or mark do something: those who speak to the machine may need them off (WCAG 2.1.4). */
const KEY = 'skewback.single-keys';

class SingleKeys {
  #on = $state(localStorage.getItem(KEY) !== 'off');

  get on(): boolean {
    return this.#on;
  }

  set on(on: boolean) {
    this.#on = on;
    localStorage.setItem(KEY, on ? 'on' : 'off');
  }
}

export const singleKeys = new SingleKeys();
