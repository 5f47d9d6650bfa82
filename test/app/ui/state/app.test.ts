import { expect, test, vi } from 'vitest';
import type { Desk } from '../../../../app/ui/desk/index.ts';
import {
  asksForSite,
  createApp,
  type RunYear,
  type Watch,
} from '../../../../app/ui/state/index.ts';
import { type Fault, readWeather } from '../../../../weather/index.ts';
import { makeSimulation } from '../fixture.ts';

const weather = { file: 'table.csv', text: 'a' };
const project = { file: 'house.inglenook.json', text: '{}', weather };
const simulation = makeSimulation(240);

function desk(change: Partial<Desk> = {}): Desk {
  return {
    openProject: async () => project,
    openWeather: async () => ({ file: 'other.csv', text: 'b' }),
    recent: async () => [],
    openRecent: async () => project,
    demo: async () => project,
    ...change,
  };
}

const succeed: RunYear = async () => ({ ok: true, simulation });

/** A run that waits until it is told how to end. */
function heldRun() {
  const calls: { watch: Watch; end: (value: Awaited<ReturnType<RunYear>>) => void }[] = [];
  const run: RunYear = (_input, watch) =>
    new Promise((end, fail) => {
      calls.push({ watch, end });
      watch.signal.addEventListener('abort', () => fail(watch.signal.reason));
    });
  return { run, calls };
}

test('opening a project runs it and shows the whole house with its first room chosen', async () => {
  const app = createApp(desk(), succeed);
  await app.openProject();
  await vi.waitFor(() => expect(app.store.getState().simulation).toBe(simulation));
  const state = app.store.getState();
  expect([state.screen, state.roomId, state.run.kind]).toEqual(['house', 'living', 'idle']);
});

test('a project without a weather table waits for one and is not run', async () => {
  const run = vi.fn(succeed);
  const app = createApp(desk({ openProject: async () => ({ ...project, weather: null }) }), run);
  await app.openProject();
  expect(run).not.toHaveBeenCalled();
  await app.openWeather();
  // A coarse answer comes first, then the one at the engine's own step.
  await vi.waitFor(() =>
    expect(run.mock.calls.map(([{ stepMinutes }]) => stepMinutes)).toEqual([60, undefined]),
  );
});

test('a weather table that was read first is used by the project opened after it', async () => {
  const run = vi.fn(succeed);
  const app = createApp(desk({ openProject: async () => ({ ...project, weather: null }) }), run);
  await app.openWeather();
  await app.openProject();
  expect(run.mock.calls[0]?.[0].weather.file).toBe('other.csv');
});

test('faults of the input are kept, all of them, and the last result stays', async () => {
  const faults: Fault[] = [1, 2].map((row) => ({
    file: 'table.csv',
    place: { row, column: 'ghi' },
    found: 'x',
    expected: 'a number',
    mend: 'Give one.',
  }));
  let isRefused = false;
  const app = createApp(desk(), async () =>
    isRefused ? { ok: false, faults } : { ok: true, simulation },
  );
  await app.openProject();
  await vi.waitFor(() => expect(app.store.getState().simulation).not.toBeNull());
  isRefused = true;
  await app.openWeather();
  await vi.waitFor(() => expect(app.store.getState().run).toEqual({ kind: 'refused', faults }));
  expect(app.store.getState().simulation).toBe(simulation);
  expect(app.store.getState().isStale).toBe(true);
});

test('a cancelled run says so and leaves no half result', async () => {
  const { run, calls } = heldRun();
  const app = createApp(desk(), run);
  await app.openProject();
  calls[0]?.watch.onProgress(0.4, 'running the year');
  expect(app.store.getState().run).toMatchObject({ kind: 'running', share: 0.4 });
  app.cancel();
  await vi.waitFor(() => expect(app.store.getState().run.kind).toBe('cancelled'));
  expect(app.store.getState().simulation).toBeNull();
});

test('a newer run takes the place of the older one, whose answer is not used', async () => {
  const { run, calls } = heldRun();
  const app = createApp(desk(), run);
  await app.openProject();
  await app.openWeather();
  expect(calls).toHaveLength(2);
  expect(calls[0]?.watch.signal.aborted).toBe(true);
  calls[0]?.watch.onProgress(0.9, 'late');
  expect(app.store.getState().run).toMatchObject({ share: 0 });
  calls[1]?.end({ ok: true, simulation });
  await vi.waitFor(() => expect(calls).toHaveLength(3)); // the full step follows the coarse one
  calls[2]?.end({ ok: true, simulation });
  await vi.waitFor(() => expect(app.store.getState().run.kind).toBe('idle'));
});

test('a run that breaks off gives its reason and keeps the project', async () => {
  const app = createApp(desk(), async () => {
    throw new Error('the run diverged at step 7 at "living air"');
  });
  await app.openProject();
  await vi.waitFor(() =>
    expect(app.store.getState().run).toEqual({
      kind: 'broken',
      reason: 'the run diverged at step 7 at "living air"',
    }),
  );
  expect(app.store.getState().project?.file).toBe(project.file);
});

test('a file that cannot be opened leaves what was open, with a notice', async () => {
  const app = createApp(desk(), succeed);
  await app.openProject();
  await vi.waitFor(() => expect(app.store.getState().simulation).not.toBeNull());
  const broken = createApp(
    desk({ openProject: () => Promise.reject(new Error('The disk is gone.')) }),
    succeed,
    app.store.getState(),
  );
  await broken.openProject();
  expect(broken.store.getState().notice).toBe('Not opened. The disk is gone.');
  expect(broken.store.getState().project?.file).toBe(project.file);
});

test('closing the project keeps the colours and drops the rest', async () => {
  const app = createApp(desk(), succeed, { scheme: 'dark' });
  await app.openProject();
  app.closeProject();
  const state = app.store.getState();
  expect([state.scheme, state.project, state.screen]).toEqual(['dark', null, 'welcome']);
});

test('a table without a site asks for one; other faults do not', async () => {
  const headings = 'time,dryBulbC,relativeHumidity,windMPerS,ghiWPerM2';
  const read = readWeather(`${headings}\n2023-01-01 00:00,4,0.8,2,0\n`, { file: 'table.csv' });
  if (read.ok) throw new Error('one row is no year');
  const stateWith = (faults: readonly Fault[]) => ({
    ...createApp(desk(), succeed).store.getState(),
    run: { kind: 'refused' as const, faults },
  });
  const siteFaults = read.faults.filter(({ mend }) => mend.includes('site'));
  expect(siteFaults.length).toBeGreaterThan(0);
  expect(asksForSite(stateWith(siteFaults))).toBe(true);
  const others: Fault[] = [
    {
      file: 'a',
      place: { path: 'rooms[0].name' },
      found: '',
      expected: 'a name',
      mend: 'Name it.',
    },
  ];
  expect(asksForSite(stateWith(others))).toBe(false);
});
