import { expect, test } from 'vitest';
import type { Bridge } from '../../../../app/bridge/index.ts';
import { bridgeDesk, sortFiles, weatherNamed } from '../../../../app/ui/desk/index.ts';

test('dropped files are told apart by their ending', async () => {
  const files = [new File(['t'], 'year.csv'), new File(['{}'], 'house.inglenook.json')];
  const sorted = await sortFiles(files);
  expect(sorted.project).toEqual({ file: 'house.inglenook.json', text: '{}' });
  expect(sorted.weather).toEqual({ file: 'year.csv', text: 't' });
});

test('the weather table that a project names is found, and nonsense names none', () => {
  expect(weatherNamed('{"weather":{"file":"year.csv"}}')).toBe('year.csv');
  expect(weatherNamed('{"weather":{}}')).toBeNull();
  expect(weatherNamed('not json')).toBeNull();
});

const projectFile = {
  path: '/home/me/house.inglenook.json',
  name: 'house.inglenook.json',
  text: '{"weather":{"file":"year.csv"}}',
  sha256: '0'.repeat(64),
};
const info = {
  version: '0.1.0',
  shell: 'electron' as const,
  hasDialogs: true,
  folders: [],
  versions: {},
  startWith: null,
};
const asked: unknown[] = [];
const bridge = {
  openProject: async () => projectFile,
  readWeather: async (input: unknown) => {
    asked.push(input);
    throw new Error('year.csv is not there.');
  },
} as unknown as Bridge;

test('a table that cannot be read leaves the project open and says why', async () => {
  const opened = await bridgeDesk(bridge, info).openProject();
  expect(asked).toEqual([{ path: 'year.csv', projectPath: projectFile.path }]);
  expect(opened).toMatchObject({ weather: null, trouble: 'year.csv is not there.' });
});
