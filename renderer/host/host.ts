import type { Host } from '../../app/host.ts';
import { browserHost } from './browser.ts';

/** The desktop where the page runs in it, else the browser itself. */
export const host: Host = window.skewbackHost ?? browserHost;
