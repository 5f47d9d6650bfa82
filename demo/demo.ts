// The demo from end to end: invented weather, invented house, findings in words, tables and pictures.
import { join, relative, resolve } from 'node:path';
import { findingsText } from '../app/cli/findings-text.ts';
import { resultFiles } from '../app/cli/hourly-csv.ts';
import { openModel, weatherFor } from '../app/cli/inputs.ts';
import { type NodalResults, nodalResults, runNodal } from '../app/cli/nodal.ts';
import { explain, type Streams } from '../app/cli/run-cli.ts';
import { need, WrongUsage } from '../app/cli/stop.ts';
import { type Terminal, terminal } from '../app/cli/terminal.ts';
import { writeFolderWhole } from '../app/disk/index.ts';
import { reportPage, summaryChapters } from '../app/report/index.ts';
import { version } from '../app/version.ts';
import { type Building, type Simulation, simulate } from '../engine/index.ts';
import type { WeatherYear } from '../weather/index.ts';
import { reportFonts } from './font.ts';
import { loftTankWords, solarWallWords } from './nodal-words.ts';
import { type Places, projectName } from './places.ts';
import { writeDemoWeather } from './weather-file.ts';

function run(
  building: Building,
  year: WeatherYear,
  notes: readonly string[],
  readMs: number,
  speak: Terminal,
): Simulation {
  const steps = simulate(building, year, { readMs, nowMs: () => performance.now() });
  let turn = steps.next();
  while (!turn.done) {
    speak.progress(turn.value.done, turn.value.what);
    turn = steps.next();
  }
  speak.endProgress();
  const { findings } = turn.value;
  const assumptions = [...notes, ...findings.assumptions];
  return { ...turn.value, findings: { ...findings, assumptions } };
}

async function nodal(file: string, speak: Terminal): Promise<NodalResults> {
  const opened = await openModel(file);
  if (!('model' in opened)) throw new WrongUsage(`${file} is no nodal model.`);
  return nodalResults(opened, runNodal(opened, speak));
}

async function demo(places: Places, madeOn: string, speak: Terminal): Promise<void> {
  const shown = (path: string) => relative('', path) || resolve(path);
  await writeDemoWeather(places);
  const started = performance.now();
  const project = await openModel(join(places.demo, projectName));
  if ('model' in project) throw new WrongUsage(`${projectName} is no project.`);
  const weather = await weatherFor(project, null);
  const readMs = performance.now() - started;
  const simulation = run(project.building, weather.year, weather.notes, readMs, speak);

  const input = { simulation, building: project.building, version, madeOn };
  const files = resultFiles(simulation, simulation.findings);
  files.set('summary.html', reportPage(input, summaryChapters, await reportFonts()));
  need(await writeFolderWhole(places.out, files));

  const loft = await nodal(join(places.demo, 'loft-tank.network.json'), speak);
  const wall = await nodal(join(places.demo, 'solar-wall.network.json'), speak);

  speak.print(findingsText(simulation.findings));
  speak.print(`\nTwo nodal models\n${loftTankWords(loft)}\n${solarWallWords(wall)}`);
  speak.print(`
Everything here is invented: house, town and weather.
  ${shown(join(places.out, 'summary.html'))}  the same with drawings; open it in a browser
  ${shown(places.out)}  findings.json, the hours of each room (room-….csv), the weather
  npm start  opens the window`);
}

/** Runs the demo and gives its exit status, with messages as the command line has them. */
export async function runDemo(places: Places, madeOn: string, streams: Streams): Promise<number> {
  try {
    await demo(places, madeOn, terminal(streams.out, streams.err, false));
    return 0;
  } catch (error) {
    return explain(error, streams);
  }
}
