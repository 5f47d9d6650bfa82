import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, symlinkSync, utimesSync, writeFileSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { type Bridge, BridgeError, client, dispatch } from '../../../app/bridge/index.ts';
import { makeHandlers } from '../../../app/host/handlers.ts';
import { startLoopback } from '../../../app/host/loopback/loopback.ts';
import type { Shell } from '../../../app/host/shell.ts';
import { type Desk, layDesk } from './desk.ts';

// The same table of claims over both ways that a call can travel: http to the loopback host, and
// Electron's ipc, for which the structured clone in both directions stands in.

type Connect = (shell: Shell, desk: Desk) => Promise<{ bridge: Bridge; end: () => Promise<void> }>;

const overIpc: Connect = async (shell) => {
  const handlers = makeHandlers(shell);
  const bridge = client(async (name, input) =>
    structuredClone(await dispatch(handlers, name, structuredClone(input))),
  );
  return { bridge, end: async () => {} };
};

const overHttp: Connect = async (shell, desk) => {
  const host = await startLoopback({
    handlers: makeHandlers(shell),
    pageFolder: desk.at('page'),
    report: () => {},
  });
  const opened = await fetch(host.startAddress, { redirect: 'manual' });
  const cookie = opened.headers.get('set-cookie')?.split(';')[0] ?? '';
  const bridge = client(async (name, input) => {
    const response = await fetch(`${host.origin}/rpc/${name}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', cookie, origin: host.origin },
      body: JSON.stringify(input),
    });
    return response.json();
  });
  return { bridge, end: () => host.close() };
};

const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');
const reason = (promise: Promise<unknown>): Promise<BridgeError> =>
  promise.then(
    () => expect.fail('was answered'),
    (error: unknown) => {
      expect(error).toBeInstanceOf(BridgeError);
      return error as BridgeError;
    },
  );

describe.each([
  ['http', overHttp],
  ['ipc', overIpc],
])('over %s', (_, connect) => {
  let desk: Desk;
  let bridge: Bridge;
  let end: () => Promise<void>;
  beforeEach(async () => {
    desk = layDesk();
    ({ bridge, end } = await connect(desk.shell, desk));
  });
  afterEach(async () => {
    await end();
    desk.clear();
  });
  const house = () => desk.at('work/house.inglenook.json');

  test('the window learns who answers and where it may work', async () => {
    expect(await bridge.appInfo({})).toMatchObject({
      version: '1.2.3',
      hasDialogs: false,
      folders: [desk.work],
      startWith: null,
    });
  });

  test('files are listed newest first, the demo with them, other folders not', async () => {
    utimesSync(house(), 1e9, 1e9);
    const names = (await bridge.listFiles({ kind: 'project' })).map((file) => file.name);
    expect(names).toEqual(['demo.inglenook.json', 'house.inglenook.json']);
    expect((await bridge.listFiles({ kind: 'weather' })).map((file) => file.name)).toEqual([
      'year.csv',
    ]);
  });

  test('a project comes with its text and the SHA-256 of its bytes', async () => {
    const text = '{"name":"house"}\n';
    const opened = await bridge.openProject({ path: house() });
    expect(opened).toEqual({
      path: house(),
      name: 'house.inglenook.json',
      text,
      sha256: sha256(text),
    });
    expect((await bridge.recentFiles({})).map((file) => file.path)).toEqual([house()]);
  });

  test('a path outside the folders is refused, straight, by dots or through a link', async () => {
    symlinkSync(desk.at('elsewhere'), desk.at('work/link'));
    for (const path of [
      desk.at('elsewhere/secret.inglenook.json'),
      `${desk.work}/../elsewhere/secret.inglenook.json`,
      desk.at('work/link/secret.inglenook.json'),
    ]) {
      const error = await reason(bridge.openProject({ path }));
      expect(error.kind).toBe('input');
      expect(error.message).toContain('a path outside the folders');
    }
  });

  test('a missing project is the fault of the path, and says so', async () => {
    const error = await reason(bridge.openProject({ path: desk.at('work/none.inglenook.json') }));
    expect(error.kind).toBe('input');
    expect(error.faults[0]).toMatchObject({
      found: 'nothing at this path',
      expected: 'a project file',
    });
  });

  test('a weather table is found from the place of its project', async () => {
    const weather = await bridge.readWeather({ path: 'weather/year.csv', projectPath: house() });
    expect(weather).toMatchObject({
      name: 'year.csv',
      relativePath: 'weather/year.csv',
      text: 'hour,dryBulbC\n0,4\n',
      notes: [],
    });
  });

  test('the demo is there without being asked for by path', async () => {
    expect((await bridge.readDemo({}))?.text).toBe('{"name":"demo"}\n');
  });

  test('a save replaces the file that was read, whole', async () => {
    const opened = await bridge.openProject({ path: house() });
    const saved = await bridge.saveProject({
      path: house(),
      name: 'house',
      text: '{"name":"new"}',
      replaces: opened?.sha256 ?? null,
    });
    expect(saved?.sha256).toBe(sha256('{"name":"new"}'));
    expect(readFileSync(house(), 'utf8')).toBe('{"name":"new"}');
    expect(readdirSync(desk.work).sort()).toEqual(['house.inglenook.json', 'weather']);
  });

  test('a save is refused where another program has changed the file, and may be forced', async () => {
    const opened = await bridge.openProject({ path: house() });
    writeFileSync(house(), '{"name":"theirs"}');
    const save = { path: house(), name: 'house', text: '{"name":"mine"}' };
    const error = await reason(bridge.saveProject({ ...save, replaces: opened?.sha256 ?? null }));
    expect(error.kind).toBe('changed');
    expect(readFileSync(house(), 'utf8')).toBe('{"name":"theirs"}');
    await bridge.saveProject({ ...save, replaces: 'anything' });
    expect(readFileSync(house(), 'utf8')).toBe('{"name":"mine"}');
  });

  test('a new file does not land on one that is there', async () => {
    const save = { name: 'x', text: '{}', replaces: null };
    const error = await reason(bridge.saveProject({ ...save, path: house() }));
    expect(error.message).toContain('already');
    const path = desk.at('work/fresh.inglenook.json');
    expect((await bridge.saveProject({ ...save, path }))?.path).toBe(path);
  });

  test('only project files are written, and only in the folders', async () => {
    const save = { name: 'x', text: '{}', replaces: 'anything' as const };
    const ending = await reason(bridge.saveProject({ ...save, path: desk.at('work/.bashrc') }));
    expect(ending.message).toContain('a name that ends in .inglenook.json');
    for (const path of ['elsewhere/a.inglenook.json', 'demo/demo.inglenook.json']) {
      const error = await reason(bridge.saveProject({ ...save, path: desk.at(path) }));
      expect(error.message).toContain('a path outside the folders');
    }
  });

  test('without dialogs a call without a path is a wrong call', async () => {
    expect((await reason(bridge.openProject({ path: null }))).kind).toBe('call');
  });

  test('an unknown call and a wrong input are refused by name', async () => {
    const loose = bridge as unknown as Record<string, (input: unknown) => Promise<unknown>>;
    expect(loose.toString).not.toBe(undefined);
    const wrong = await reason(loose.openProject?.({ path: 7 }) ?? Promise.resolve());
    expect(wrong.kind).toBe('call');
    expect(wrong.message).toContain('path');
    const more = await reason(loose.appInfo?.({ more: true }) ?? Promise.resolve());
    expect(more.kind).toBe('call');
  });
});

describe('dispatch', () => {
  test('names that every object has are no calls', async () => {
    const desk = layDesk();
    for (const name of ['toString', '__proto__', 'constructor', 'nothing']) {
      const reply = await dispatch(makeHandlers(desk.shell), name, {});
      expect(reply).toMatchObject({ ok: false, error: { kind: 'call' } });
    }
    desk.clear();
  });

  test('a fault of the program is reported to the host and named to the window', async () => {
    const desk = layDesk();
    const heard: unknown[] = [];
    const broken = {
      ...makeHandlers(desk.shell),
      appInfo: () => Promise.reject(new RangeError('a fault of ours')),
    };
    const reply = await dispatch(broken, 'appInfo', {}, (error) => heard.push(error));
    expect(reply).toMatchObject({ ok: false, error: { kind: 'program' } });
    expect(heard).toHaveLength(1);
    desk.clear();
  });
});

describe('with dialogs', () => {
  test('what the user picks may be read and written, and nothing else', async () => {
    const desk = layDesk();
    const secret = desk.at('elsewhere/secret.inglenook.json');
    const shell: Shell = {
      ...desk.shell,
      folders: [],
      dialogs: { pickOpen: async () => secret, pickSave: async () => null },
    };
    const { bridge } = await overIpc(shell, desk);
    await reason(bridge.openProject({ path: secret })); // not picked yet
    const opened = await bridge.openProject({ path: null });
    expect(opened?.path).toBe(secret);
    const save = { path: secret, name: 'x', text: '{}', replaces: opened?.sha256 ?? null };
    expect((await bridge.saveProject(save))?.path).toBe(secret);
    // Closing the dialog is an answer, not a fault.
    expect(await bridge.saveProject({ ...save, path: null })).toBe(null);
    await reason(bridge.openProject({ path: desk.at('work/house.inglenook.json') }));
    // In the next session the file is known from the list of recent ones.
    const later = await overIpc(shell, desk);
    expect((await later.bridge.recentFiles({})).map((file) => file.path)).toEqual([secret]);
    expect((await later.bridge.openProject({ path: secret }))?.path).toBe(secret);
    desk.clear();
  });
});
