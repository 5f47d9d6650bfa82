import { emptyMemory, type Findings, type Simulation, simulate } from '../../engine/index.ts';
import { readKernel, writeFolderWhole } from '../disk/index.ts';
import { type Accuracy, accuracyOf, accuracyText } from './accuracy.ts';
import { textOf } from './arguments.ts';
import type { Command, Given } from './command.ts';
import { findingsText } from './findings-text.ts';
import { resultFiles } from './hourly-csv.ts';
import { type OpenProject, type OpenWeather, openModel, weatherFor } from './inputs.ts';
import {
  nodalCsv,
  nodalResults,
  nodalText,
  type OpenNodal,
  refuseForNodal,
  runNodal,
} from './nodal.ts';
import { need, WrongUsage } from './stop.ts';
import type { Terminal } from './terminal.ts';
import { readingOf, readingOptions } from './weather-reading.ts';
import { withOptions } from './with-options.ts';

const stepsMinutes = [1, 2, 3, 4, 5, 6, 10, 12, 15, 20, 30, 60];

function stepOf(text: string | null): number {
  if (text === null) return 15;
  const step = Number(text);
  if (stepsMinutes.includes(step)) return step;
  throw new WrongUsage(
    `simulate: --step: found "${text}", expected minutes that divide the hour: ${stepsMinutes.join(', ')}.`,
  );
}

interface Fineness {
  readonly stepMinutes: number;
  readonly refine: number;
}

function run(
  { building }: OpenProject,
  { year }: OpenWeather,
  fineness: Fineness,
  readMs: number,
  terminal: Terminal,
): Simulation {
  const steps = simulate(building, year, {
    ...fineness,
    readMs,
    memory: emptyMemory(readKernel()),
    nowMs: () => performance.now(),
  });
  let step = steps.next();
  while (!step.done) {
    terminal.progress(step.value.done, step.value.what);
    step = steps.next();
  }
  terminal.endProgress();
  return step.value;
}

async function simulateNodal(nodal: OpenNodal, given: Given, terminal: Terminal): Promise<void> {
  refuseForNodal('simulate', given, [
    'option',
    'weather',
    ...Object.keys(readingOptions),
    'step',
    'check-accuracy',
  ]);
  const run = runNodal(nodal, terminal);
  const results = nodalResults(nodal, run);
  const json = JSON.stringify(results, null, 2);
  const folder = textOf(given, 'out');
  if (folder !== null) {
    const files = new Map([
      ['results.json', `${json}\n`],
      ['records.csv', nodalCsv(nodal, run)],
    ]);
    need(await writeFolderWhole(folder, files));
    terminal.note(`Written to ${folder}: results.json and records.csv.`);
  }
  terminal.print(given.json ? json : nodalText(results));
}

export const simulateCommand: Command = {
  name: 'simulate',
  operand: 'PROJECT',
  summary:
    'Runs the year: energy, peaks and hours outside the comfort band; or a plain nodal model.',
  options: {
    weather: { value: 'FILE', help: "a weather table instead of the project's" },
    ...readingOptions,
    option: { value: 'NAME', help: 'with options of the project, by id or name, parted by commas' },
    step: { value: 'MIN', help: 'step in minutes, a divisor of 60; 15 without it' },
    json: { help: 'one JSON document on standard output' },
    out: { value: 'DIR', help: 'also write findings.json and the hours of each room (CSV) there' },
    'check-accuracy': { help: 'run again with half the step and twice the nodes; show the change' },
    progress: { help: 'tell how far it is even where standard error is no terminal' },
  },
  examples: [
    'inglenook simulate house.inglenook.json',
    'inglenook simulate house.inglenook.json --weather cold-year.csv --json > cold.json',
    'inglenook simulate house.inglenook.json --option thicker-walls',
    'inglenook simulate house.inglenook.json --out results --check-accuracy',
  ],
  async run(operand, given, terminal) {
    const started = performance.now();
    const base = await openModel(operand);
    if ('model' in base) return simulateNodal(base, given, terminal);
    const { project, notes } = await withOptions(base, textOf(given, 'option'));
    const stepMinutes = stepOf(textOf(given, 'step'));
    const weather = await weatherFor(
      project,
      textOf(given, 'weather'),
      readingOf('simulate', given),
    );
    const readMs = performance.now() - started;

    const simulation = run(project, weather, { stepMinutes, refine: 1 }, readMs, terminal);
    const assumptions = [...notes, ...weather.notes, ...simulation.findings.assumptions];
    const findings: Findings = { ...simulation.findings, assumptions };
    let accuracy: Accuracy | null = null;
    if (given['check-accuracy']) {
      const fineness = { stepMinutes: stepMinutes / 2, refine: 2 };
      const finer = run(project, weather, fineness, 0, terminal);
      accuracy = accuracyOf(findings, finer.findings);
    }
    const document = accuracy ? { ...findings, accuracy } : findings;

    const folder = textOf(given, 'out');
    if (folder !== null) {
      need(await writeFolderWhole(folder, resultFiles(simulation, document)));
      terminal.note(
        `Written to ${folder}: findings.json and ${simulation.rooms.length} room file(s).`,
      );
    }
    if (given.json) return terminal.print(JSON.stringify(document, null, 2));
    terminal.print(findingsText(findings));
    if (accuracy) terminal.print(`\n${accuracyText(findings, accuracy)}`);
  },
};
