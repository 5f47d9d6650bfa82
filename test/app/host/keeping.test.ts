import { mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { type Bridge, client, dispatch } from '../../../app/bridge/index.ts';
import { makeHandlers } from '../../../app/host/handlers.ts';
import { versionsKept } from '../../../app/host/versions.ts';
import { goneAfterMs } from '../../../app/host/windows.ts';
import { type Desk, layDesk } from './desk.ts';

// What keeps work from being lost, asked over the bridge, with a clock that the test moves.

let desk: Desk;
let clockMs: number;
const first = 'window-aaaa';
const second = 'window-bbbb';

beforeEach(() => {
  desk = layDesk();
  clockMs = 1_700_000_000_000;
});
afterEach(() => desk.clear());

/** A run of the program: what it remembers is its own, its files are shared. */
function program(): Bridge {
  const handlers = makeHandlers(desk.shell, () => clockMs);
  return client(async (name, input) => structuredClone(await dispatch(handlers, name, input)));
}
const house = () => desk.at('work/house.inglenook.json');

describe('earlier versions', () => {
  test('what a file held is kept at each save, the latest first, and can be read again', async () => {
    const bridge = program();
    for (const text of ['{"n":1}\n', '{"n":2}\n']) {
      clockMs += 1000;
      await bridge.saveProject({ path: house(), name: 'house', text, replaces: 'anything' });
    }
    const versions = await bridge.listVersions({ path: house() });
    expect(versions).toHaveLength(2);
    const texts = [];
    for (const { id } of versions)
      texts.push((await bridge.readVersion({ path: house(), id })).text);
    expect(texts).toEqual(['{"n":1}\n', '{"name":"house"}\n']);
  });

  test(`no more than ${versionsKept} are kept, and saves in one millisecond lose none`, async () => {
    const bridge = program();
    for (let n = 0; n < versionsKept + 3; n++) {
      await bridge.saveProject({
        path: house(),
        name: 'h',
        text: `{"n":${n}}`,
        replaces: 'anything',
      });
    }
    const versions = await bridge.listVersions({ path: house() });
    expect(versions).toHaveLength(versionsKept);
    expect(new Set(versions.map(({ id }) => id)).size).toBe(versionsKept);
  });

  test('an id that is no number reads nothing', async () => {
    const bridge = program();
    await expect(bridge.readVersion({ path: house(), id: '../../recent' })).rejects.toThrow(
      'no longer kept',
    );
  });
});

describe('a second window', () => {
  test('on the same file both are told, also from another run of the program', async () => {
    const [one, two] = [program(), program()];
    expect(await one.watchProject({ window: first, path: house() })).toMatchObject({ others: 0 });
    expect(await two.watchProject({ window: second, path: house() })).toMatchObject({ others: 1 });
    expect(await one.watchProject({ window: first, path: house() })).toMatchObject({ others: 1 });
    await two.watchProject({ window: second, path: null });
    expect(await one.watchProject({ window: first, path: house() })).toMatchObject({ others: 0 });
  });

  test('is forgotten once it has been silent', async () => {
    const bridge = program();
    await bridge.watchProject({ window: second, path: house() });
    clockMs += goneAfterMs + 1;
    expect(await bridge.watchProject({ window: first, path: house() })).toMatchObject({
      others: 0,
    });
  });

  test('a file that another program writes has another digest', async () => {
    const bridge = program();
    const opened = await bridge.openProject({ path: house() });
    const watch = () => bridge.watchProject({ window: first, path: house() });
    expect((await watch()).sha256).toBe(opened?.sha256);
    writeFileSync(house(), '{"name":"other"}\n');
    expect((await watch()).sha256).not.toBe(opened?.sha256);
  });
});

describe('drafts', () => {
  const draft = (window: string, text: string) => ({
    id: 'draft-0001',
    window,
    path: house(),
    name: 'house.inglenook.json',
    weatherPath: null,
    replaces: null,
    text,
  });

  test('the draft of a living window is offered to no other; that of a lost one is', async () => {
    const [one, two] = [program(), program()];
    await one.watchProject({ window: first, path: house() });
    await one.keepDraft(draft(first, '{"n":1}'));
    await one.keepDraft(draft(first, '{"n":2}'));
    expect(await two.listDrafts({ window: second })).toEqual([]);
    // A page that was reloaded is the same window.
    expect(await one.listDrafts({ window: first })).toHaveLength(1);
    clockMs += goneAfterMs + 1;
    const [found] = await two.listDrafts({ window: second });
    expect(found).toMatchObject({ name: 'house.inglenook.json', path: house() });
    expect((await two.readDraft({ id: found?.id ?? '' }))?.text).toBe('{"n":2}');
    await two.dropDraft({ id: 'draft-0001' });
    expect(await two.readDraft({ id: 'draft-0001' })).toBeNull();
  });

  test('a spoilt draft does not hide the others, and no half-written file stays', async () => {
    const bridge = program();
    mkdirSync(desk.at('data/drafts'), { recursive: true });
    writeFileSync(desk.at('data/drafts/spoilt-1.json'), '{"window":');
    await bridge.keepDraft(draft(first, '{}'));
    expect(await bridge.listDrafts({ window: second })).toHaveLength(1);
    expect(readdirSync(desk.at('data/drafts')).sort()).toEqual([
      'draft-0001.json',
      'spoilt-1.json',
    ]);
    expect(readFileSync(desk.at('data/drafts/spoilt-1.json'), 'utf8')).toBe('{"window":');
  });
});
