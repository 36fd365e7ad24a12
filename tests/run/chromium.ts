import { existsSync } from 'node:fs';

/** The browser that component and end-to-end tests drive. */
export const CHROMIUM = process.env['SKEWBACK_CHROMIUM'] ?? '/usr/bin/chromium';

/** Headless, off the network, and able to run as root in a container. */
export const CHROMIUM_FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--no-first-run',
];

/** Whether that browser is on this machine. */
export function chromiumIsHere(): boolean {
  return existsSync(CHROMIUM);
}
