import { request as httpRequest } from 'node:http';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { makeHandlers } from '../../../app/host/handlers.ts';
import { type Loopback, startLoopback } from '../../../app/host/loopback/loopback.ts';
import { type Desk, layDesk } from './desk.ts';

let desk: Desk;
let host: Loopback;
beforeEach(async () => {
  desk = layDesk();
  host = await startLoopback({
    handlers: makeHandlers(desk.shell),
    pageFolder: desk.at('page'),
    report: () => {},
    bodyLimitBytes: 10_000,
  });
});
afterEach(async () => {
  await host.close();
  desk.clear();
});

interface Answer {
  readonly status: number;
  readonly headers: Readonly<Record<string, string | string[] | undefined>>;
  readonly body: string;
}

/** As raw as it gets: fetch would mend the path and refuse to set some headers. */
function ask(path: string, headers: Record<string, string> = {}, body?: string): Promise<Answer> {
  const { hostname, port } = new URL(host.origin);
  return new Promise((done, failed) => {
    const sent = httpRequest(
      { hostname, port, path, headers, method: body === undefined ? 'GET' : 'POST' },
      (response) => {
        let text = '';
        response.setEncoding('utf8');
        response.on('data', (part: string) => {
          text += part;
        });
        response.on('end', () =>
          done({ status: response.statusCode ?? 0, headers: response.headers, body: text }),
        );
      },
    );
    sent.on('error', failed);
    sent.end(body);
  });
}

async function cookie(): Promise<string> {
  const { pathname, search } = new URL(host.startAddress);
  const opened = await ask(`${pathname}${search}`);
  return String(opened.headers['set-cookie']).split(';')[0] ?? '';
}
const json = { 'content-type': 'application/json' };

test('the start address is good once, and leaves a clean address and a closed cookie', async () => {
  const { pathname, search } = new URL(host.startAddress);
  const first = await ask(`${pathname}${search}`);
  expect(first.status).toBe(303);
  expect(first.headers.location).toBe('/');
  const set = String(first.headers['set-cookie']);
  expect(set).toMatch(/HttpOnly/);
  expect(set).toMatch(/SameSite=Strict/);
  expect((await ask(`${pathname}${search}`)).status).toBe(403);
});

test('the token has 256 random bits and a wrong one opens nothing', async () => {
  const token = new URL(host.startAddress).searchParams.get('token') ?? '';
  expect(Buffer.from(token, 'base64url')).toHaveLength(32);
  expect((await ask(`/?token=${'A'.repeat(token.length)}`)).status).toBe(403);
  expect((await ask('/?token=')).status).toBe(403);
  expect((await ask(`/?token=${token}`)).status).toBe(303); // a wrong try does not burn it
});

test('without the cookie there is neither page nor answer', async () => {
  for (const headers of [{}, { cookie: 'inglenook=guess' }, { cookie: ';;=;' }]) {
    expect((await ask('/', headers)).status).toBe(401);
    expect((await ask('/a.js', headers)).status).toBe(401);
    const call = await ask('/rpc/appInfo', { ...headers, ...json, origin: host.origin }, '{}');
    expect(call.status).toBe(401);
  }
});

test('another host name is refused, so that no site can bend its own name to this address', async () => {
  expect((await ask('/', { host: 'example.org', cookie: await cookie() })).status).toBe(421);
  expect((await ask('/', { host: 'localhost' })).status).toBe(421);
});

test('another origin is refused even with the cookie, and a call needs its own', async () => {
  const held = await cookie();
  expect((await ask('/', { cookie: held, origin: 'http://example.org' })).status).toBe(403);
  const call = (headers: Record<string, string>) =>
    ask('/rpc/appInfo', { cookie: held, ...json, ...headers }, '{}');
  expect((await call({ origin: 'null' })).status).toBe(403);
  expect((await call({})).status).toBe(403);
  expect((await call({ origin: host.origin })).status).toBe(200);
});

test('a call is JSON, whole, and within the limit', async () => {
  const own = { cookie: await cookie(), origin: host.origin };
  expect((await ask('/rpc/appInfo', { ...own, 'content-type': 'text/plain' }, '{}')).status).toBe(
    415,
  );
  expect((await ask('/rpc/appInfo', own, '{}')).status).toBe(415);
  expect((await ask('/rpc/appInfo', { ...own, ...json }, '{"a":')).status).toBe(400);
  const long = JSON.stringify({ path: 'x'.repeat(20_000) });
  expect((await ask('/rpc/openProject', { ...own, ...json }, long)).status).toBe(413);
  expect((await ask('/rpc/appInfo', own)).status).toBe(405);
  expect((await ask('/', { ...own, ...json }, '{}')).status).toBe(405);
});

test('the page carries the nonce of its own policy, a new one each time', async () => {
  const headers = { cookie: await cookie() };
  const nonces = new Set<string>();
  for (let i = 0; i < 3; i++) {
    const page = await ask('/', headers);
    const policy = String(page.headers['content-security-policy']);
    const nonce = /'nonce-([^']+)'/.exec(policy)?.[1] ?? 'none';
    expect(page.body).toContain(`content="${nonce}"`);
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain("script-src 'self';");
    expect(policy).not.toContain('unsafe');
    nonces.add(nonce);
  }
  expect(nonces.size).toBe(3);
});

test('every answer, a refusal too, carries the closed set of headers', async () => {
  const held = await cookie();
  for (const answer of [
    await ask('/', { cookie: held }),
    await ask('/'),
    await ask('/none.js', { cookie: held }),
  ]) {
    expect(answer.headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'no-referrer',
      'cross-origin-opener-policy': 'same-origin',
      'cross-origin-embedder-policy': 'require-corp',
      'cross-origin-resource-policy': 'same-origin',
      'cache-control': 'no-store',
    });
  }
});

test('nothing outside the page folder is served, however the path is written', async () => {
  const headers = { cookie: await cookie() };
  expect((await ask('/a.js', headers)).status).toBe(200);
  for (const path of [
    '/../secret.js',
    '/..%2fsecret.js',
    '/%2e%2e/secret.js',
    '/..%5csecret.js',
    '/a.js%00',
    '/%',
    '//secret.js',
    '/notes.md',
    '/none.js',
  ]) {
    expect((await ask(path, headers)).status, path).toBe(404);
  }
});

test('a request line that is no path of ours is refused', async () => {
  const headers = { cookie: await cookie() };
  for (const path of ['@example.org/', '.example.org/', 'http://example.org/', ':1/']) {
    expect((await ask(path, headers)).status, path).toBe(400);
  }
});

test('it listens on this machine only', () => {
  expect(host.origin).toMatch(/^http:\/\/127\.0\.0\.1:\d+$/);
});
