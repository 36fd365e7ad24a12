/**
 * Serves the page where its server cannot be reached. Each build brings this file anew, with the list of its own files
 * before it; the files are kept together, whole and verified, or not at all. A page that can reach its server always
 * gets what the server has now. The page kept by an earlier build goes when no window uses it any more.
 */

/** SHA-256 of each file of the build in hexadecimal, by its path; written by the build. */
declare const BUILT_FILES: Readonly<Record<string, string>>;

interface Extendable extends Event {
  waitUntil(work: Promise<unknown>): void;
}

interface Fetching extends Extendable {
  readonly request: Request;
  respondWith(response: Promise<Response>): void;
}

interface Scope {
  readonly clients: { claim(): Promise<void> };
  addEventListener(kind: 'install' | 'activate', listener: (event: Extendable) => void): void;
  addEventListener(kind: 'fetch', listener: (event: Fetching) => void): void;
}

const scope = self as unknown as Scope;
const PREFIX = 'skewback-page-';
const PAGE = 'index.html';
/** Names with a fingerprint: their content never changes. */
const FINGERPRINTED = 'assets/';

const addressOf = (path: string): string => new URL(path, self.location.href).href;

const hexadecimal = (digest: ArrayBuffer): string =>
  [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('');

/** One cache a build, named by all its fingerprints. */
async function cacheName(): Promise<string> {
  const text = new TextEncoder().encode(JSON.stringify(BUILT_FILES));
  return PREFIX + hexadecimal(await crypto.subtle.digest('SHA-256', text)).slice(0, 16);
}

async function keepAll(): Promise<void> {
  const name = await cacheName();
  const cache = await caches.open(name);
  try {
    await Promise.all(Object.entries(BUILT_FILES).map(([path, print]) => keep(cache, path, print)));
  } catch (error) {
    await caches.delete(name);
    throw error;
  }
}

/** @throws where the server has another file by now: this build is then not kept */
async function keep(cache: Cache, path: string, print: string): Promise<void> {
  const address = addressOf(path);
  const response = await fetch(address, { cache: 'no-cache' });
  const bytes = await response.clone().arrayBuffer();
  if (!response.ok || hexadecimal(await crypto.subtle.digest('SHA-256', bytes)) !== print)
    throw new Error(`${path} is of another build`);
  await cache.put(address, response);
}

async function dropOthers(): Promise<void> {
  const own = await cacheName();
  const names = await caches.keys();
  const others = names.filter((name) => name.startsWith(PREFIX) && name !== own);
  await Promise.all(others.map((name) => caches.delete(name)));
}

async function kept(address: string): Promise<Response | undefined> {
  return (await caches.open(await cacheName())).match(address);
}

async function fromKeptFirst(request: Request, address: string): Promise<Response> {
  return (await kept(address)) ?? fetch(request);
}

async function fromServerFirst(request: Request, address: string): Promise<Response> {
  try {
    return await fetch(request);
  } catch (error) {
    const response = await kept(address);
    if (response === undefined) throw error;
    return response;
  }
}

scope.addEventListener('install', (event) => event.waitUntil(keepAll()));
scope.addEventListener('activate', (event) => event.waitUntil(dropOthers().then(() => scope.clients.claim())));
scope.addEventListener('fetch', (event) => {
  const { request } = event;
  const base = addressOf('./');
  if (request.method !== 'GET' || !request.url.startsWith(base)) return;
  const path = request.mode === 'navigate' ? PAGE : request.url.slice(base.length);
  if (BUILT_FILES[path] === undefined) return;
  const answer = path.startsWith(FINGERPRINTED) ? fromKeptFirst : fromServerFirst;
  event.respondWith(answer(request, addressOf(path)));
});
