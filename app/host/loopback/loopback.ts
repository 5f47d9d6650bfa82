// The host for an ordinary browser: serves the built page and the bridge on this machine's own address
// only, and treats everything that arrives as a stranger's until it has shown the session's cookie.

import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import { dispatch, type Handlers } from '../../bridge/index.ts';
import { pageFile } from '../page/page-file.ts';
import { newNonce, pageHeaders } from '../page/policy.ts';
import { newSession } from './session.ts';

export interface LoopbackOptions {
  readonly handlers: Handlers;
  /** The built page. */
  readonly pageFolder: string;
  /** Hears of faults of the program. */
  readonly report: (error: unknown) => void;
  /** 0 for any free one. */
  readonly port?: number;
  readonly bodyLimitBytes?: number;
}

export interface Loopback {
  /** Opens the window, once. */
  readonly startAddress: string;
  readonly origin: string;
  close(): Promise<void>;
}

/** The whole body as text, or null when it is longer than the limit. */
async function bodyText(request: IncomingMessage, limitBytes: number): Promise<string | null> {
  const parts: Uint8Array[] = [];
  let bytes = 0;
  for await (const part of request as AsyncIterable<Uint8Array>) {
    bytes += part.length;
    if (bytes > limitBytes) return null;
    parts.push(part);
  }
  return Buffer.concat(parts).toString('utf8');
}

export async function startLoopback(options: LoopbackOptions): Promise<Loopback> {
  const { handlers, pageFolder, report, bodyLimitBytes = 70_000_000 } = options;
  const session = newSession();
  let own = ''; // host:port, known once the server listens

  function end(response: ServerResponse, status: number, text: string, headers = {}) {
    response.writeHead(status, {
      ...pageHeaders(newNonce()),
      'content-type': 'text/plain; charset=utf-8',
      ...headers,
    });
    response.end(text);
  }

  async function call(request: IncomingMessage, response: ServerResponse, name: string) {
    if (request.headers.origin !== `http://${own}`) return end(response, 403, 'Wrong origin.');
    const type = request.headers['content-type']?.split(';')[0]?.trim();
    if (type !== 'application/json') return end(response, 415, 'JSON only.');
    const text = await bodyText(request, bodyLimitBytes);
    if (text === null) {
      return end(response, 413, 'Too long.', { connection: 'close' });
    }
    let input: unknown;
    try {
      input = JSON.parse(text);
    } catch {
      return end(response, 400, 'Not JSON.');
    }
    const answer = await dispatch(handlers, name, input, report);
    end(response, 200, JSON.stringify(answer), { 'content-type': 'application/json' });
  }

  async function answer(request: IncomingMessage, response: ServerResponse) {
    // A name other than ours in the Host header: some site has bent its own name to this address.
    if (request.headers.host !== own) return end(response, 421, 'Wrong host.');
    const { origin } = request.headers;
    if (origin !== undefined && origin !== `http://${own}`)
      return end(response, 403, 'Wrong origin.');
    // Put together, not resolved: "//name" would be read as another host.
    const address = `http://${own}${request.url}`;
    if (!URL.canParse(address)) return end(response, 400, 'Not an address.');
    const url = new URL(address);
    if (url.host !== own) return end(response, 400, 'Not an address.');

    const token = url.searchParams.get('token');
    if (request.method === 'GET' && url.pathname === '/' && token !== null) {
      const cookie = session.open(token);
      if (cookie === null)
        return end(response, 403, 'This address was good once. Start the program again.');
      return end(response, 303, '', { location: '/', 'set-cookie': cookie });
    }
    if (!session.holds(request.headers.cookie)) {
      return end(response, 401, 'Open the address that the program printed.');
    }
    if (url.pathname.startsWith('/rpc/')) {
      if (request.method !== 'POST') return end(response, 405, 'POST only.', { allow: 'POST' });
      return call(request, response, url.pathname.slice('/rpc/'.length));
    }
    if (request.method !== 'GET') return end(response, 405, 'GET only.', { allow: 'GET' });
    const nonce = newNonce();
    const file = await pageFile(pageFolder, url.pathname, nonce);
    if (file === null) return end(response, 404, 'Not here.');
    response.writeHead(200, { ...pageHeaders(nonce), 'content-type': file.type });
    response.end(file.body);
  }

  const server = createServer((request, response) => {
    answer(request, response).catch((error: unknown) => {
      report(error);
      if (!response.headersSent) end(response, 500, 'The host failed.');
      else response.destroy();
    });
  });
  await new Promise<void>((ready, failed) => {
    server.once('error', failed);
    server.listen(options.port ?? 0, '127.0.0.1', ready);
  });
  own = `127.0.0.1:${(server.address() as AddressInfo).port}`;
  return {
    origin: `http://${own}`,
    startAddress: `http://${own}/?token=${session.token}`,
    close: () =>
      new Promise((closed) => {
        server.close(() => closed());
        server.closeAllConnections();
      }),
  };
}
