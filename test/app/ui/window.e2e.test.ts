import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import axe from 'axe-core';
import { type Browser, chromium, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { findBrowser } from '../../../app/host/find-browser.mjs';
import { sampleText, sampleWeather } from '../sample.ts';

// The built window in a real browser: every sheet, in both colour schemes and at the widths it is
// drawn for, judged by axe-core (WCAG 2 A and AA, and its best practices), and used by keyboard alone.

const program = fileURLToPath(new URL('../../../dist/start.js', import.meta.url));
let folder: string;
let host: ChildProcess;
let browser: Browser;
let page: Page;

function addressOf(child: ChildProcess): Promise<string> {
  return new Promise((found, failed) => {
    let text = '';
    const take = (part: Buffer) => {
      text += part.toString();
      const address = /http:\/\/\S+/.exec(text)?.[0];
      if (address) found(address);
    };
    child.stdout?.on('data', take);
    child.stderr?.on('data', take);
    child.on('exit', (status) => failed(new Error(`ended with ${status}: ${text}`)));
  });
}

beforeAll(async () => {
  const executablePath = findBrowser();
  if (!executablePath) throw new Error('No browser: see "npm test" for how to get one.');
  if (!existsSync(program)) throw new Error('Not built: run "npm run build".');
  folder = mkdtempSync(join(tmpdir(), 'inglenook-ui-'));
  mkdirSync(join(folder, 'weather'));
  writeFileSync(join(folder, 'house.inglenook.json'), sampleText());
  writeFileSync(join(folder, 'weather/year.csv'), sampleWeather());
  host = spawn(process.execPath, [program, folder, '--window', 'none'], {
    env: { ...process.env, INGLENOOK_DATA: join(folder, 'data') },
  });
  const address = await addressOf(host);
  const args = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  browser = await chromium.launch({ executablePath, args });
  page = await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage();
  await page.goto(address);
  await page.getByRole('heading', { level: 1 }).waitFor();
});

afterAll(async () => {
  await browser?.close();
  if (host?.exitCode === null) host.kill('SIGKILL');
  rmSync(folder, { recursive: true, force: true });
});

const title = () => page.getByRole('heading', { level: 1 }).textContent();

/** What axe-core finds wrong with the page as it stands, as lines. */
async function wrongs(): Promise<string[]> {
  return page.evaluate(`${axe.source};
    axe.run(document).then(({ violations }) =>
      violations.map((v) => v.id + ': ' + v.nodes.map((n) => n.html.slice(0, 120)).join(' | ')))`);
}

async function scheme(name: 'light' | 'dark') {
  await page.emulateMedia({ colorScheme: name });
  await expect.poll(() => page.evaluate(() => document.documentElement.dataset.scheme)).toBe(name);
}

test('the welcome sheet passes in light and in dark', async () => {
  for (const name of ['light', 'dark'] as const) {
    await scheme(name);
    expect(await wrongs()).toEqual([]);
  }
});

test('a project in the folder is listed and opens by keyboard into its findings', async () => {
  await page.getByRole('button', { name: 'house.inglenook.json', exact: true }).focus();
  await page.keyboard.press('Enter');
  await page.getByRole('complementary', { name: 'Findings' }).waitFor({ timeout: 40_000 });
  expect(await title()).toBe('Whole house');
});

describe('every sheet', () => {
  const sheets = [
    ['Alt+1', 'Site and weather'],
    ['Alt+2', 'Whole house'],
    ['Alt+3', 'Room'],
  ] as const;

  test.each(sheets)(
    'opened by %s (%s) passes in both schemes and cuts nothing off',
    async (keys, name) => {
      await page.keyboard.press(keys);
      await expect.poll(title).toBe(name);
      for (const [width, height] of [
        [1440, 900],
        [1280, 800],
        [960, 600],
      ] as const) {
        await page.setViewportSize({ width, height });
        for (const colors of ['light', 'dark'] as const) {
          await scheme(colors);
          expect(await wrongs(), `${name}, ${width} wide, ${colors}`).toEqual([]);
        }
        const beyond = await page.evaluate(() => {
          const sheet = document.querySelector('main');
          const over = document.documentElement.scrollWidth - innerWidth;
          return Math.max(over, sheet ? sheet.scrollWidth - sheet.clientWidth : 0);
        });
        expect(beyond, `${name} at ${width} runs over by`).toBe(0);
      }
      await page.setViewportSize({ width: 1440, height: 900 });
      await scheme('light');
    },
  );
});

test('the command field, the shortcuts and a menu pass too', async () => {
  await page.keyboard.press('Control+k');
  expect(await wrongs()).toEqual([]);
  await page.keyboard.press('Escape');
  await page.keyboard.press('?');
  await page.getByRole('dialog', { name: 'Shortcuts' }).waitFor();
  expect(await wrongs()).toEqual([]);
  await page.keyboard.press('Escape');
  await page.getByRole('menuitem', { name: 'View' }).focus();
  await page.keyboard.press('ArrowDown');
  await page.getByRole('menu', { name: 'View' }).waitFor();
  expect(await wrongs()).toEqual([]);
  await page.keyboard.press('Escape');
});

test('F6 goes round the regions of the window', async () => {
  const region = () =>
    page.evaluate(() => (document.activeElement as HTMLElement | null)?.dataset.region);
  await page.getByRole('button', { name: /Find or do/ }).focus();
  const round: unknown[] = [];
  for (let i = 0; i < 4; i++) {
    await page.keyboard.press('F6');
    round.push(await region());
  }
  expect(round).toEqual(['side', 'sheet', 'findings', 'side']);
});

test('the pointer over the week tells the heat of that hour, and leaving it tells the year again', async () => {
  await page.keyboard.press('Alt+3');
  const week = page.getByRole('slider', { name: /Hour of the week/ });
  await week.waitFor();
  await week.hover({ position: { x: 300, y: 80 } });
  await expect.poll(() => page.getByRole('heading', { name: 'Heat in this hour' }).count()).toBe(1);
  await page.mouse.move(20, 600);
  await expect.poll(() => page.getByRole('heading', { name: 'Heat in this hour' }).count()).toBe(0);
});

test('colours chosen in the window outlast its closing', async () => {
  await page.keyboard.press('Control+k');
  await page.keyboard.type('dark');
  await page.keyboard.press('Enter');
  await page.reload();
  await expect
    .poll(() => page.evaluate(() => document.documentElement.dataset.scheme))
    .toBe('dark');
});
