import { chmodSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { hasScreen, openAppWindow } from '../../../app/host/app-window.ts';
import { electronProgram } from '../../../app/host/electron-program.ts';
import { findBrowser } from '../../../app/host/find-browser.mjs';
import { dataFolder } from '../../../app/host/recent.ts';
import { startOptions } from '../../../app/host/start-options.ts';
import { type Desk, layDesk } from './desk.ts';

let desk: Desk;
beforeEach(() => {
  desk = layDesk();
});
afterEach(() => desk.clear());

/** A program in a folder of its own, for a PATH. */
function program(name: string, text: string): string {
  mkdirSync(desk.at('bin'), { recursive: true });
  const path = desk.at(`bin/${name}`);
  writeFileSync(path, `#!/bin/sh\n${text}\n`);
  chmodSync(path, 0o755);
  return path;
}

describe('the command line', () => {
  test('names a folder, a project in its folder, or the current folder', () => {
    expect(startOptions([], desk.work)).toMatchObject({ folder: desk.work, project: null });
    expect(startOptions(['work'], desk.root)).toMatchObject({ folder: desk.work, project: null });
    expect(startOptions(['house.inglenook.json'], desk.work)).toMatchObject({
      folder: desk.work,
      project: desk.at('work/house.inglenook.json'),
    });
  });

  test('says what is wrong with it', () => {
    expect(startOptions(['none'], desk.root)).toContain('found nothing at this path');
    expect(startOptions(['--window', 'tv'], desk.root)).toContain('found "tv", expected electron');
    expect(startOptions(['--port', '70000'], desk.root)).toContain('from 0 to 65535');
    expect(startOptions(['--prot', '1'], desk.root)).toContain('--prot');
    expect(startOptions(['work', 'demo'], desk.root)).toContain('found 2');
  });
});

describe('finding a browser', () => {
  test('takes the first known name on the PATH', () => {
    const path = program('google-chrome', 'exit 0');
    expect(findBrowser({ PATH: desk.at('bin') }, 'linux')).toBe(path);
    const better = program('chromium', 'exit 0');
    expect(findBrowser({ PATH: desk.at('bin') }, 'linux')).toBe(better);
  });

  test('the one that the user named wins, and a wrong name is not passed over', () => {
    program('chromium', 'exit 0');
    const own = program('my-browser', 'exit 0');
    const env = { PATH: desk.at('bin') };
    expect(findBrowser({ ...env, INGLENOOK_BROWSER: own }, 'linux')).toBe(own);
    expect(findBrowser({ ...env, INGLENOOK_BROWSER: 'my-browser' }, 'linux')).toBe(own);
    expect(findBrowser({ ...env, INGLENOOK_BROWSER: '/no/such' }, 'linux')).toBe(null);
  });

  test('a file that cannot be run is no browser', () => {
    chmodSync(program('chromium', ''), 0o644);
    expect(findBrowser({ PATH: desk.at('bin') }, 'linux')).toBe(null);
    expect(findBrowser({}, 'linux')).toBe(null);
  });
});

describe('the window', () => {
  test('gets the address and a profile of its own, which goes when it does', async () => {
    const browser = program('chromium', `printf '%s\\n' "$@" > ${desk.at('arguments')}`);
    const window = await openAppWindow(browser, 'http://127.0.0.1:1/?token=x');
    await window.closed;
    const args = readFileSync(desk.at('arguments'), 'utf8').trim().split('\n');
    expect(args[0]).toBe('--app=http://127.0.0.1:1/?token=x');
    const profile = args.find((arg) => arg.startsWith('--user-data-dir='))?.split('=')[1] ?? '';
    expect(profile).not.toBe('');
    expect(existsSync(profile)).toBe(false);
  });

  test('is closed from here when the program ends', async () => {
    const window = await openAppWindow(program('chromium', 'exec sleep 60'), 'http://127.0.0.1:1/');
    const at = performance.now();
    await window.close();
    expect(performance.now() - at).toBeLessThan(5000);
  });

  test('a browser that cannot be started counts as closed', async () => {
    await (await openAppWindow(desk.at('bin/none'), 'http://127.0.0.1:1/')).closed;
  });

  test('needs a screen', () => {
    expect(hasScreen({}, 'linux')).toBe(false);
    expect(hasScreen({ DISPLAY: ':0' }, 'linux')).toBe(true);
    expect(hasScreen({ WAYLAND_DISPLAY: 'wayland-0' }, 'linux')).toBe(true);
    expect(hasScreen({}, 'darwin')).toBe(true);
  });
});

test("Electron's program counts only where its file is, and looking does not fetch it", () => {
  mkdirSync(desk.at('node_modules/electron/dist'), { recursive: true });
  const folder = desk.at('node_modules/electron');
  const from = desk.at('start.js');
  writeFileSync(`${folder}/package.json`, '{"name":"electron","version":"1.0.0"}');
  expect(electronProgram(from)).toBe(null);
  writeFileSync(`${folder}/path.txt`, 'electron');
  expect(electronProgram(from)).toBe(null);
  writeFileSync(`${folder}/dist/electron`, '');
  expect(electronProgram(from)).toBe(`${folder}/dist/electron`);
});

test('the list of recent files lies where the system keeps such things', () => {
  expect(dataFolder({ INGLENOOK_DATA: '/d' }, 'linux')).toBe('/d');
  expect(dataFolder({ XDG_DATA_HOME: '/x' }, 'linux')).toBe('/x/inglenook');
  expect(dataFolder({}, 'darwin')).toMatch(/Library\/Application Support\/Inglenook$/);
});
