import { cleanup, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import type { Desk } from '../../../app/ui/desk/index.ts';
import { type AppState, createApp, type RunYear } from '../../../app/ui/state/index.ts';
import { Window } from '../../../app/ui/window.tsx';
import type { Fault } from '../../../weather/index.ts';
import { makeSimulation } from './fixture.ts';

const simulation = makeSimulation();
const project = {
  file: 'house.inglenook.json',
  text: '{}',
  weather: { file: 'table.csv', text: '' },
};
const desk: Desk = {
  openProject: async () => project,
  openWeather: async () => project.weather,
  recent: async () => [],
  openRecent: async () => project,
  demo: async () => project,
};
const succeed: RunYear = async () => ({ ok: true, simulation });

afterEach(cleanup);

async function openBedroom(user: ReturnType<typeof userEvent.setup>) {
  const side = within(screen.getByRole('navigation', { name: 'Project' }));
  await user.click(await side.findByRole('button', { name: /^Bedroom/ }));
}

function open(run: RunYear = succeed, start: Partial<AppState> = {}) {
  const app = createApp(desk, run, start);
  render(<Window app={app} />);
  return { app, user: userEvent.setup() };
}

async function openExample(run: RunYear = succeed) {
  const opened = open(run);
  await opened.user.click(screen.getByRole('button', { name: /Open the example house/ }));
  return opened;
}

test('the welcome sheet has one filled button and says where results end', () => {
  open();
  expect(screen.getByRole('heading', { level: 1 }).textContent).toMatch(/How warm/);
  expect(document.querySelectorAll('.is-filled')).toHaveLength(1);
  expect(screen.getByText(/ask a licensed practitioner/)).toBeTruthy();
});

test('the example opens on the whole house, with the heating of the year in the findings', async () => {
  await openExample();
  expect((await screen.findByRole('heading', { level: 1 })).textContent).toBe('Whole house');
  const findings = screen.getByRole('complementary', { name: 'Findings' });
  const kWh = Math.round(simulation.findings.building.heatingKWh).toLocaleString('en-GB');
  expect(within(findings).getByText(kWh)).toBeTruthy();
});

test('arrow keys move along the tabs and rank the rooms by the finding chosen', async () => {
  const { user } = await openExample();
  (await screen.findByRole('tab', { name: 'Heating' })).focus();
  await user.keyboard('{ArrowRight}{ArrowRight}{ArrowRight}');
  expect(screen.getByRole('tab', { selected: true }).textContent).toBe('Hours above band');
  const table = screen.getByRole('table', { name: /Occupied hours above the band|ranked/ });
  const rows = within(table)
    .getAllByRole('rowheader')
    .map((cell) => cell.textContent);
  expect(rows.at(-1)).toBe('Hall');
  expect(rows[0]).toBe('Study under the roof');
});

test('a room is opened from the side bar and its heat is told in words', async () => {
  const { user } = await openExample();
  await openBedroom(user);
  expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Bedroom');
  expect(screen.getByText(/Into the room: .*kWh.*Out of the room, or stored:/)).toBeTruthy();
});

test('a drawing can be read as a table', async () => {
  const { user } = await openExample();
  await user.click(await screen.findByRole('button', { name: /Table of Month by month/ }));
  const table = within(screen.getByRole('region', { name: 'Month by month, data' }));
  expect(table.getAllByRole('row')).toHaveLength(13);
});

test('arrows in the week move the pinned hour, and Escape lets go', async () => {
  const { user, app } = await openExample();
  await openBedroom(user);
  screen.getByRole('slider', { name: /Hour of the week/ }).focus();
  await user.keyboard('{ArrowRight}');
  const first = app.store.getState().mark?.hour ?? 0;
  expect(app.store.getState().mark?.isPinned).toBe(true);
  await user.keyboard('{Shift>}{ArrowRight}{/Shift}{PageUp}');
  expect(app.store.getState().mark?.hour).toBe(Math.max(0, first + 24 - 168));
  expect(screen.getByText('Heat in this hour')).toBeTruthy();
  await user.keyboard('{Escape}');
  expect(app.store.getState().mark).toBeNull();
});

test('the command field finds a room and opens it', async () => {
  const { user } = await openExample();
  await screen.findByRole('tab', { name: 'Heating' });
  await user.keyboard('{Control>}k{/Control}');
  await user.type(screen.getByRole('combobox', { name: 'Find or do' }), 'study{Enter}');
  expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Study under the roof');
});

const fault: Fault = {
  file: 'table.csv',
  place: { row: 4017, column: 'dhiWPerM2' },
  found: '"n/a"',
  expected: 'a number from 0 to 1500',
  mend: 'Give the value.',
};

test('faults are listed together with place, found, expected and mend', async () => {
  const wall: Fault = { ...fault, file: 'house.inglenook.json', place: { path: 'rooms[2].name' } };
  await openExample(async () => ({ ok: false, faults: [fault, wall] }));
  const list = within(await screen.findByRole('region', { name: 'Faults' }));
  for (const text of ['row 4,017, column dhiWPerM2', 'rooms[2].name']) {
    expect(list.getByText(text)).toBeTruthy();
  }
  expect(list.getAllByText('"n/a"')).toHaveLength(2);
  expect(list.getAllByText('Give the value.')).toHaveLength(2);
});

test('a run that takes longer shows how far it is and can be cancelled', async () => {
  const { user } = await openExample(
    (_input, watch) =>
      new Promise((_end, fail) => {
        watch.onProgress(0.25, 'running the year');
        watch.signal.addEventListener('abort', () => fail(watch.signal.reason));
      }),
  );
  const bar = await screen.findByRole('progressbar');
  expect(bar.getAttribute('aria-valuenow')).toBe('25');
  await user.click(screen.getByRole('button', { name: 'Cancel' }));
  expect(await screen.findByText(/Cancelled. Nothing was changed./)).toBeTruthy();
});

test('old figures stay readable and are called old while a new run is under way', async () => {
  const { app } = await openExample();
  await screen.findByRole('tab', { name: 'Heating' });
  app.set({ isStale: true });
  expect(await screen.findByText('From before the last change')).toBeTruthy();
  expect(document.querySelectorAll('.findings .is-stale')).toHaveLength(1);
});

test('the site dialog refuses a latitude beyond the pole and gives a good site to the run', async () => {
  const run = vi.fn(succeed);
  const { user } = open(run, { project, weather: project.weather, dialog: 'site' });
  const dialog = within(screen.getByRole('dialog', { name: 'Site of the table' }));
  const type = async (label: string, text: string) => {
    await user.clear(dialog.getByLabelText(label));
    await user.type(dialog.getByLabelText(label), text);
  };
  await type('Latitude', '95');
  expect(dialog.getByText(/Enter .90 to 90/)).toBeTruthy();
  await type('Latitude', '51,5');
  await type('Longitude', '-0.5');
  await type('Elevation', '20');
  await type('Clock', '0');
  await user.click(dialog.getByRole('button', { name: 'Use this site' }));
  expect(run.mock.calls[0]?.[0].site).toMatchObject({ latitudeDeg: 51.5, longitudeDeg: -0.5 });
});
