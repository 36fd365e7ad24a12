import { readFile, realpath, stat } from 'node:fs/promises';
import { extname, join, sep } from 'node:path';
import { PAGE_HEADERS } from './policy.ts';

/** What a shell answers when the page asks for one of its files. */
export interface PageAnswer {
  readonly status: 200 | 304 | 404;
  readonly headers: Readonly<Record<string, string>>;
  readonly body: Uint8Array;
}

const MEDIA_TYPES: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.mjs': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.jpg': 'image/jpeg',
  '.ico': 'image/x-icon',
  '.woff2': 'font/woff2',
  '.woff': 'font/woff',
  '.ttf': 'font/ttf',
  '.wasm': 'application/wasm',
  '.skewback': 'application/x-skewback',
  '.txt': 'text/plain; charset=utf-8',
  '.webmanifest': 'application/manifest+json',
};

/** Names that the build gives a fingerprint, so that their content never changes. */
const FINGERPRINTED = /^[/]assets[/].+-[\w-]{8}[.]\w+$/;

/**
 * The built page in `root`, file by file, for whichever shell serves it. Answers for plain files under `root` only,
 * links out of it refused.
 * @param urlPath path of the address, percent-encoded, query taken off; `/` is the page itself
 * @param knownTag the `if-none-match` header of the request, if there was one
 */
export async function pageFile(root: string, urlPath: string, knownTag?: string): Promise<PageAnswer> {
  const path = await fileFor(root, urlPath === '/' ? '/index.html' : urlPath);
  if (path === null) return notFound();
  const { mtimeMs, size } = await stat(path);
  const tag = `"${Math.round(mtimeMs).toString(36)}-${size.toString(36)}"`;
  const headers = {
    ...PAGE_HEADERS,
    'content-type': MEDIA_TYPES[extname(path).toLowerCase()] ?? 'application/octet-stream',
    'cache-control': FINGERPRINTED.test(urlPath) ? 'max-age=31536000, immutable' : 'no-cache',
    etag: tag,
  };
  if (knownTag === tag) return { status: 304, headers, body: new Uint8Array() };
  return { status: 200, headers, body: await readFile(path) };
}

/** The file on disk, or null where the address names none under `root`. */
async function fileFor(root: string, urlPath: string): Promise<string | null> {
  let decoded: string;
  try {
    decoded = decodeURIComponent(urlPath);
  } catch {
    return null;
  }
  if (!decoded.startsWith('/') || /[\0\\]/.test(decoded)) return null;
  try {
    const inside = (await realpath(root)) + sep;
    const path = await realpath(join(root, decoded));
    return path.startsWith(inside) && (await stat(path)).isFile() ? path : null;
  } catch {
    return null;
  }
}

function notFound(): PageAnswer {
  const headers = { ...PAGE_HEADERS, 'content-type': 'text/plain; charset=utf-8', 'cache-control': 'no-store' };
  return { status: 404, headers, body: new TextEncoder().encode('There is nothing at this address.\n') };
}
