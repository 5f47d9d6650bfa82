import { type ChildProcess, spawn, spawnSync } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { type Browser, chromium, type Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { findBrowser } from '../../../app/host/find-browser.mjs';
import { sampleText, sampleWeather } from '../sample.ts';

// The built program as a person starts it: the loopback host in its own process, the page in a real
// browser, a project named on the command line.

const program = fileURLToPath(new URL('../../../dist/start.js', import.meta.url));
let folder: string;
let host: ChildProcess;
let address = '';
let browser: Browser;
let page: Page;
/** Everything that the page complained of; a breach of the security policy lands here too. */
const complaints: string[] = [];

/** The first match in what a program prints, or its early end as an error. */
function printed(child: ChildProcess, wanted: RegExp): Promise<string> {
  return new Promise((found, failed) => {
    let text = '';
    const take = (part: Buffer) => {
      text += part.toString();
      const match = wanted.exec(text);
      if (match) found(match[0]);
    };
    child.stdout?.on('data', take);
    child.stderr?.on('data', take);
    child.on('exit', (status) => failed(new Error(`ended with ${status}: ${text}`)));
  });
}

beforeAll(async () => {
  const path = findBrowser();
  if (!path) throw new Error('No browser: see "npm test" for how to get one.');
  if (!existsSync(program)) throw new Error('Not built: run "npm run build".');
  folder = mkdtempSync(join(tmpdir(), 'inglenook-e2e-'));
  mkdirSync(join(folder, 'weather'));
  writeFileSync(join(folder, 'house.inglenook.json'), sampleText());
  writeFileSync(join(folder, 'weather/year.csv'), sampleWeather());
  host = spawn(
    process.execPath,
    [program, join(folder, 'house.inglenook.json'), '--window', 'none'],
    { env: { ...process.env, INGLENOOK_DATA: join(folder, 'data') } },
  );
  address = await printed(host, /http:\/\/\S+/);
  browser = await chromium.launch({
    executablePath: path,
    args: process.getuid?.() === 0 ? ['--no-sandbox'] : [],
  });
  page = await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage();
  page.on('console', (message) => {
    if (['error', 'warning'].includes(message.type())) complaints.push(message.text());
  });
  page.on('pageerror', (error) => complaints.push(String(error)));
  await page.goto(address);
});

afterAll(async () => {
  await browser?.close();
  if (host?.exitCode === null) host.kill('SIGKILL');
  rmSync(folder, { recursive: true, force: true });
});

test('the address bar is clean, and the page stands alone in its process', async () => {
  expect(new URL(page.url()).search).toBe('');
  expect(await page.evaluate(() => globalThis.crossOriginIsolated)).toBe(true);
});

test('the project named on the command line is opened and shows what the command line computes', async () => {
  const project = join(folder, 'house.inglenook.json');
  const cli = fileURLToPath(new URL('../../../dist/cli.js', import.meta.url));
  const { stdout } = spawnSync(process.execPath, [cli, 'simulate', project, '--json'], {
    encoding: 'utf8',
  });
  const heatingKWh = Math.round(JSON.parse(stdout).building.heatingKWh).toLocaleString('en');
  const text = () => page.locator('body').textContent();
  await expect.poll(text, { timeout: 30_000 }).toContain(heatingKWh);
  expect(await text()).toContain('house.inglenook.json');
});

test('nothing broke the policy, and the page complained of nothing', () => {
  expect(complaints).toEqual([]);
});

test('scripts written into the page do not run', async () => {
  const ran = await page.evaluate(() => {
    const script = document.createElement('script');
    script.textContent = 'globalThis.strangerRan = true';
    document.body.append(script);
    return 'strangerRan' in globalThis;
  });
  expect(ran).toBe(false);
  await expect(
    page.evaluate(() => fetch('http://127.0.0.1:9/').then(() => 'sent')),
  ).rejects.toThrow();
});

test('a second visitor, with or without the used address, gets nothing', async () => {
  const other = await (await browser.newContext()).newPage();
  expect((await other.goto(address))?.status()).toBe(403);
  expect((await other.goto(new URL('/', address).href))?.status()).toBe(401);
  await other.context().close();
});

test('the host ends at once when it is told to', async () => {
  const ended = once(host, 'exit');
  const at = performance.now();
  host.kill('SIGTERM');
  expect((await ended)[0]).toBe(0);
  expect(performance.now() - at).toBeLessThan(5000);
});
