import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import axe from 'axe-core';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { findBrowser } from '../../../app/host/find-browser.mjs';
import { sampleText, sampleWeather } from '../sample.ts';

// A house is edited in the built window, in a real browser: the findings follow, every step can be
// undone, what is saved is there after a reload, and what was not saved is offered again.

const program = fileURLToPath(new URL('../../../dist/start.js', import.meta.url));
let folder: string;
let host: ChildProcess;
let browser: Browser;
let context: BrowserContext;
let page: Page;
let origin: string;
const house = () => join(folder, 'house.inglenook.json');

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
  folder = mkdtempSync(join(tmpdir(), 'inglenook-edit-'));
  mkdirSync(join(folder, 'weather'));
  writeFileSync(house(), sampleText());
  writeFileSync(join(folder, 'weather/year.csv'), sampleWeather());
  host = spawn(process.execPath, [program, folder, '--window', 'none'], {
    env: { ...process.env, INGLENOOK_DATA: join(folder, 'data') },
  });
  const address = await addressOf(host);
  origin = new URL(address).origin;
  const args = process.getuid?.() === 0 ? ['--no-sandbox'] : [];
  browser = await chromium.launch({ executablePath, args });
  context = await browser.newContext({ viewport: { width: 1280, height: 800 } });
  page = await context.newPage();
  page.on('dialog', (dialog) => void dialog.accept()); // leaving with unsaved work is asked about
  await page.goto(address);
  await open(page);
});

afterAll(async () => {
  await browser?.close();
  if (host?.exitCode === null) host.kill('SIGKILL');
  rmSync(folder, { recursive: true, force: true });
});

async function open(on: Page) {
  await on.getByRole('button', { name: 'house.inglenook.json', exact: true }).click();
  await on.getByRole('complementary', { name: 'Findings' }).waitFor({ timeout: 40_000 });
}

const findings = () => page.getByRole('complementary', { name: 'Findings' });
const heating = async () =>
  Number((await findings().locator('.figure').first().textContent())?.replace(',', ''));
const thickness = () => page.getByRole('textbox', { name: /^Brick, thickness/ });

async function typeThickness(text: string) {
  await thickness().fill(text);
  await thickness().press('Enter');
}

async function wrongs(): Promise<string[]> {
  return page.evaluate(`${axe.source};
    axe.run(document).then(({ violations }) =>
      violations.map((v) => v.id + ': ' + v.nodes.map((n) => n.html.slice(0, 120)).join(' | ')))`);
}

describe('every screen that edits', () => {
  const screens = [
    ['Alt+4', 'Plan'],
    ['Alt+5', 'Room'],
    ['Alt+6', 'Brick with insulation'],
    ['Alt+7', 'Use'],
    ['Alt+8', 'Plant'],
    ['Alt+9', 'Methods'],
  ] as const;
  test.each(screens)(
    '%s (%s) passes axe in both schemes and cuts nothing off',
    async (keys, name) => {
      await page.keyboard.press(keys);
      await expect.poll(() => page.getByRole('heading', { level: 1 }).textContent()).toBe(name);
      for (const [width, height] of [
        [1280, 800],
        [960, 600],
      ] as const) {
        await page.setViewportSize({ width, height });
        for (const colors of ['light', 'dark'] as const) {
          await page.emulateMedia({ colorScheme: colors });
          await expect
            .poll(() => page.evaluate(() => document.documentElement.dataset.scheme))
            .toBe(colors);
          expect(await wrongs(), `${name}, ${width} wide, ${colors}`).toEqual([]);
        }
        const beyond = await page.evaluate(() => {
          const sheet = document.querySelector('main');
          const over = document.documentElement.scrollWidth - innerWidth;
          return Math.max(over, sheet ? sheet.scrollWidth - sheet.clientWidth : 0);
        });
        expect(beyond, `${name} at ${width} runs over by`).toBe(0);
      }
      await page.setViewportSize({ width: 1280, height: 800 });
      await page.emulateMedia({ colorScheme: 'light' });
    },
  );
});

test('a thicker wall: the findings move against the base, undo brings them back, save keeps them', async () => {
  await page.keyboard.press('Alt+6');
  await thickness().waitFor();
  await expect.poll(() => findings().getAttribute('aria-busy'), { timeout: 30_000 }).toBe('false');
  const before = await heating();
  await typeThickness('0,3 m + 5 cm');
  await findings().getByText('Brick 200 to 350 mm, against the house as opened').waitFor();
  await expect.poll(heating, { timeout: 30_000 }).toBeLessThan(before);
  await findings()
    .getByText(`base ${before.toLocaleString('en-GB')}`)
    .waitFor({ timeout: 30_000 });
  await page.keyboard.press('Control+z');
  await expect.poll(() => thickness().inputValue()).toBe('200');
  await expect.poll(heating, { timeout: 30_000 }).toBe(before);
  await page.keyboard.press('Control+y');
  await expect.poll(() => thickness().inputValue()).toBe('350');
  await page.keyboard.press('Control+s');
  await page.getByText('Saved as house.inglenook.json.').waitFor();
  const saved = JSON.parse(readFileSync(house(), 'utf8'));
  expect(saved.constructions[0].layers[1].thicknessM).toBeCloseTo(0.35, 9);
  await page.reload();
  await open(page);
  await page.keyboard.press('Alt+6');
  await expect.poll(() => thickness().inputValue()).toBe('350');
});

test('what a file held before it was saved can be seen and gone back to', async () => {
  await page.keyboard.press('Control+k');
  await page.keyboard.type('earlier');
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Earlier versions' });
  await dialog.getByRole('button', { name: /^until/ }).click();
  await dialog.getByText('constructions[brick-wall].layers').waitFor();
  expect(await wrongs()).toEqual([]);
  await dialog.getByRole('button', { name: 'Go back to it' }).click();
  await expect.poll(() => thickness().inputValue()).toBe('200');
  await page.keyboard.press('Control+z');
  await expect.poll(() => thickness().inputValue()).toBe('350');
});

test('work that was not saved is offered again after the page broke off', async () => {
  await typeThickness('123');
  await expect.poll(() => existsSync(join(folder, 'data/drafts')), { timeout: 20_000 }).toBe(true);
  await expect
    .poll(() => page.evaluate(() => document.querySelector('.document-state')?.textContent ?? ''))
    .toBe('not saved');
  await page.waitForTimeout(1500); // a draft is written a second after the last edit
  await page.reload();
  const lost = page.getByRole('region', { name: 'Unsaved work' });
  await lost.waitFor({ timeout: 20_000 });
  expect(await wrongs()).toEqual([]);
  await lost.getByRole('button', { name: 'Open it' }).click();
  await page.getByText('Opened as it was before it was lost.').waitFor();
  await page.keyboard.press('Alt+6');
  await expect.poll(() => thickness().inputValue()).toBe('123');
  expect(JSON.parse(readFileSync(house(), 'utf8')).constructions[0].layers[1].thicknessM).toBe(
    0.35,
  );
});

test('a second tab on the same file is told, and so is the first', async () => {
  const second = await context.newPage();
  await second.goto(origin);
  await open(second);
  for (const one of [second, page]) {
    await one.getByText('open in another window too').waitFor({ timeout: 20_000 });
  }
  await second.close();
});

test('opening something else asks about unsaved work, and staying keeps it', async () => {
  await page.keyboard.press('Alt+n');
  const dialog = page.getByRole('dialog', { name: 'Unsaved changes' });
  await dialog.waitFor();
  expect(await wrongs()).toEqual([]);
  await dialog.getByRole('button', { name: 'Stay here' }).click();
  await expect.poll(() => thickness().inputValue()).toBe('123');
  await page.keyboard.press('Alt+n');
  await dialog.getByRole('button', { name: 'Drop the changes' }).click();
  await page.getByRole('button', { name: 'Draw room' }).waitFor();
});

test('rooms are drawn with the pointer, moved by their shared wall, and undone to the first', async () => {
  const rooms = page.locator('.plan-room');
  await page.getByRole('button', { name: 'Draw room' }).click();
  const first = await rooms.first().boundingBox();
  if (!first) throw new Error('the first room is not drawn');
  const metre = first.width / 5;
  await page.mouse.move(first.x + first.width, first.y);
  await page.mouse.down();
  await page.mouse.move(first.x + first.width + metre, first.y + metre);
  await page.mouse.move(first.x + first.width + 3 * metre, first.y + first.height, { steps: 4 });
  await page.mouse.up();
  const width = (name: string) => page.getByRole('textbox', { name: `${name}, width, m` });
  await expect.poll(() => width('Room 2').inputValue()).toBe('3');
  // The wall between them moves both rooms: 5 + 3 m stay 8 m.
  const second = await rooms.nth(1).boundingBox();
  if (!second) throw new Error('the second room is not drawn');
  const shownMetre = second.width / 3;
  await page.mouse.move(second.x, second.y + second.height / 2);
  await page.mouse.down();
  await page.mouse.move(second.x - shownMetre / 2, second.y + second.height / 2);
  await page.mouse.move(second.x - shownMetre, second.y + second.height / 2, { steps: 4 });
  await page.mouse.up();
  await expect.poll(() => width('Room 2').inputValue()).toBe('4');
  expect(await width('Room').inputValue()).toBe('4');
  await page.getByRole('button', { name: 'North wall of Room 2' }).click();
  await page.getByRole('table', { name: 'Windows of Room 2' }).waitFor();
  expect(await wrongs()).toEqual([]);
  for (let i = 0; i < 3; i++) await page.keyboard.press('Control+z');
  await expect.poll(() => rooms.count()).toBe(1);
  expect(await width('Room').inputValue()).toBe('5');
});
