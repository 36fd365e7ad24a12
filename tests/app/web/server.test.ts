import fs from 'node:fs/promises';
import { request } from 'node:http';
import { networkInterfaces, tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { servePage, type Serving } from '../../../app/web/server.ts';

let folder: string;
let serving: Serving;
let port: number;

beforeAll(async () => {
  folder = await fs.mkdtemp(join(tmpdir(), 'skewback-web-'));
  const root = join(folder, 'renderer');
  await fs.mkdir(join(root, 'assets'), { recursive: true });
  await fs.writeFile(join(root, 'index.html'), '<!doctype html>page');
  await fs.writeFile(join(root, 'assets', 'main-a1B2c3D4.js'), 'export {};');
  await fs.writeFile(join(root, 'two words.svg'), '<svg/>');
  await fs.writeFile(join(folder, 'secret.txt'), 'secret');
  await fs.symlink(join(folder, 'secret.txt'), join(root, 'link.txt'));
  serving = await servePage(root, 0);
  port = Number(new URL(serving.address).port);
});
afterAll(async () => {
  await serving.close();
  await fs.rm(folder, { recursive: true, force: true });
});

interface Answer {
  readonly status: number;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
  readonly body: string;
}

/** A request with its path as it stands; `fetch` would tidy it first. */
function ask(path: string, headers: Record<string, string> = {}, method = 'GET'): Promise<Answer> {
  return new Promise((answered, failed) => {
    request({ host: '127.0.0.1', port, path, method, headers }, (response) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk));
      response.on('end', () =>
        answered({ status: response.statusCode!, headers: response.headers, body: Buffer.concat(chunks).toString() }),
      );
    })
      .on('error', failed)
      .end();
  });
}

describe('the loopback server', () => {
  test('serves the page at its address, held to its own files', async () => {
    const page = await ask('/');
    expect(page).toMatchObject({ status: 200, body: '<!doctype html>page' });
    expect(page.headers['content-type']).toBe('text/html; charset=utf-8');
    expect(page.headers['content-security-policy']).toContain("default-src 'none'; script-src 'self'");
    expect(page.headers['x-content-type-options']).toBe('nosniff');
    expect(page.headers['cache-control']).toBe('no-cache');
  });

  test('serves a module as one, to be kept by its fingerprint', async () => {
    const { headers } = await ask('/assets/main-a1B2c3D4.js?v=1');
    expect(headers['content-type']).toBe('text/javascript; charset=utf-8');
    expect(headers['cache-control']).toContain('immutable');
  });

  test('serves a name with a space', async () => {
    expect(await ask('/two%20words.svg')).toMatchObject({ status: 200, body: '<svg/>' });
  });

  test('does not send again what the browser has', async () => {
    const { headers } = await ask('/');
    const again = await ask('/', { 'if-none-match': String(headers['etag']) });
    expect(again).toMatchObject({ status: 304, body: '' });
  });

  test('answers HEAD without the body', async () => {
    const head = await ask('/', {}, 'HEAD');
    expect(head).toMatchObject({ status: 200, body: '' });
    expect(head.headers['content-length']).toBe('19');
  });

  test.each([
    '/../secret.txt',
    '/assets/../../secret.txt',
    '/%2e%2e/secret.txt',
    '/..%2fsecret.txt',
    '/%5c..%5csecret.txt',
    '/link.txt',
    '/assets',
    '/nothing.js',
    '/%00',
    '/%E0%A4%A',
    '//secret.txt',
  ])('gives nothing at %s', async (path) => {
    const answer = await ask(path);
    expect(answer.status).toBe(404);
    expect(answer.body).not.toContain('secret');
    expect(answer.headers['content-security-policy']).toContain("default-src 'none'");
  });

  test.each(['evil.example', 'evil.example:80', '127.0.0.1', 'localhost.evil.example'])(
    'does not answer to the name %s',
    async (host) => {
      expect(await ask('/', { host })).toMatchObject({ status: 421 });
    },
  );

  test('answers to localhost', async () => {
    expect((await ask('/', { host: `localhost:${port}` })).status).toBe(200);
  });

  test.each(['POST', 'PUT', 'DELETE', 'OPTIONS'])('refuses %s', async (method) => {
    expect((await ask('/', {}, method)).status).toBe(405);
  });

  test('is not to be had from another machine', async () => {
    const others = Object.values(networkInterfaces())
      .flatMap((addresses) => addresses ?? [])
      .filter(({ internal, family }) => !internal && family === 'IPv4');
    expect(new URL(serving.address).hostname).toBe('127.0.0.1');
    for (const { address } of others) await expect(fetch(`http://${address}:${port}/`)).rejects.toThrow();
  });

  test('says so when the port is taken', async () => {
    await expect(servePage(folder, port)).rejects.toMatchObject({ code: 'EADDRINUSE' });
  });
});
