import { app, type Session } from 'electron';

/** The page's own address. */
export const PAGE_SCHEME = 'app';
export const PAGE_ORIGIN = `${PAGE_SCHEME}://skewback`;

/** Addresses that lead nowhere outside: the page's files, and what it makes itself. */
const INSIDE = new Set([`${PAGE_SCHEME}:`, 'blob:', 'data:', 'devtools:']);

/** Whether a request stays within the program. */
function staysInside(url: string): boolean {
  return URL.canParse(url) && INSIDE.has(new URL(url).protocol);
}

/** No page but ours, no window but ours, no permission, nothing from the network. */
export function lockDown(session: Session): void {
  session.setPermissionRequestHandler((_contents, permission, answer) => answer(isHarmless(permission)));
  session.setPermissionCheckHandler((_contents, permission) => isHarmless(permission));
  session.webRequest.onBeforeRequest((details, answer) => answer({ cancel: !staysInside(details.url) }));
  // The word lists of the spelling checker would be fetched.
  session.setSpellCheckerEnabled(false);
  app.on('web-contents-created', (_event, contents) => {
    contents.on('will-navigate', (event) => event.preventDefault());
    contents.on('will-redirect', (event) => event.preventDefault());
    contents.on('will-attach-webview', (event) => event.preventDefault());
    contents.setWindowOpenHandler(() => ({ action: 'deny' }));
  });
}

/** Copying figures out, by the person's own gesture. */
const isHarmless = (permission: string): boolean => permission === 'clipboard-sanitized-write';
