import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { pageFile } from '../page/page.ts';

export interface Serving {
  /** Such as `http://127.0.0.1:4785/`. */
  readonly address: string;
  close(): Promise<void>;
}

/** This machine and no other. */
const LOOPBACK = '127.0.0.1';

/**
 * Serves the built page to browsers on this machine.
 * @param root folder of the built page
 * @param port 0 takes any that is free
 * @throws the system's error where the port cannot be had
 */
export async function servePage(root: string, port: number): Promise<Serving> {
  const server = createServer((request, response) => {
    answer(root, server, request, response).catch(() => {
      response.destroy();
    });
  });
  await new Promise<void>((listening, refused) => {
    server.once('error', refused);
    server.listen(port, LOOPBACK, listening);
  });
  return {
    address: `http://${LOOPBACK}:${portOf(server)}/`,
    close: () =>
      new Promise((closed) => {
        server.close(() => closed());
        server.closeAllConnections();
      }),
  };
}

const portOf = (server: Server): number => (server.address() as AddressInfo).port;

async function answer(root: string, server: Server, request: IncomingMessage, response: ServerResponse): Promise<void> {
  // A page elsewhere can point a name of its own at this machine; only these names are ours.
  const port = portOf(server);
  if (![`${LOOPBACK}:${port}`, `localhost:${port}`].includes(request.headers.host ?? '')) {
    response.writeHead(421, { 'content-type': 'text/plain' }).end('This server answers to its own name only.\n');
    return;
  }
  if (request.method !== 'GET' && request.method !== 'HEAD') {
    response.writeHead(405, { allow: 'GET, HEAD' }).end();
    return;
  }
  const path = (request.url ?? '/').split(/[?#]/, 1)[0] ?? '/';
  const { status, headers, body } = await pageFile(root, path, request.headers['if-none-match']);
  response.writeHead(status, status === 304 ? headers : { ...headers, 'content-length': body.length });
  response.end(request.method === 'HEAD' || status === 304 ? undefined : body);
}
