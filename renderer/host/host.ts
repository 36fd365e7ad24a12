import type { Host } from '../../app/host.ts';
import { browserHost } from './browser.ts';
import { keptSaves } from './saves.ts';

const desktop = window.skewbackHost;

/** The desktop where the page runs in it, else the browser itself. */
export const host: Host = desktop === undefined ? browserHost : { ...desktop, saves: keptSaves };
