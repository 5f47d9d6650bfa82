// A plain nodal model on the command line: its table beside it, its run, and what came out.

import { dirname, isAbsolute, join } from 'node:path';
import {
  isNodalModel,
  marchSteps,
  type NodalModel,
  type Problem,
  parseNodalModel,
  parseNodalProblem,
  type Quality,
  type Run,
  steadyState,
} from '../../engine/index.ts';
import { readNumberTable } from '../../weather/index.ts';
import { readText } from '../disk/index.ts';
import type { Given } from './command.ts';
import { csvText } from './csv-text.ts';
import { need, WrongUsage } from './stop.ts';
import { table } from './table.ts';
import type { Terminal } from './terminal.ts';
import { timeConstantsH, timeConstantsText } from './time-constants.ts';

export interface OpenNodal {
  readonly model: NodalModel;
  readonly problem: Problem;
}

/** The nodal model in a text, or null when the text is something else (a project, or not even JSON). */
export async function openNodal(file: string, text: string): Promise<OpenNodal | null> {
  let document: unknown;
  try {
    document = JSON.parse(text);
  } catch {
    return null; // whoever reads it as a project says what is wrong
  }
  if (!isNodalModel(document)) return null;
  const model = need(parseNodalModel(document, file));
  if (!model.table) return { model, problem: need(parseNodalProblem(model, null, file)) };
  const named = model.table.file;
  const path = isAbsolute(named) ? named : join(dirname(file), named);
  const { text: rows } = need(
    await readText(path, { expected: 'a table of numbers', limitBytes: 64_000_000 }),
  );
  const columns = need(readNumberTable(rows, path));
  return { model, problem: need(parseNodalProblem(model, columns, file)) };
}

/** A nodal model brings its own drivers and step: options that set them have no meaning. */
export function refuseForNodal(command: string, given: Given, options: readonly string[]): void {
  const wrong = options.find((name) => given[name] !== undefined);
  if (wrong !== undefined) {
    throw new WrongUsage(`${command}: --${wrong} is for projects; a nodal model states its own.`);
  }
}

export function runNodal({ problem }: OpenNodal, terminal: Terminal): Run {
  const steps = marchSteps(problem, { toleranceK: 1e-6, maxIterations: 50 });
  let turn = steps.next();
  while (!turn.done) {
    const { phase, step, stepCount } = turn.value;
    terminal.progress(phase === 'run' ? step / stepCount : 0, phase);
    turn = steps.next();
  }
  terminal.endProgress();
  const { outcome } = turn.value;
  if (outcome.kind === 'diverged') {
    throw new Error(`the run diverged at step ${outcome.atStep} at "${outcome.node}"`);
  }
  return turn.value;
}

interface NodeResult {
  readonly id: string;
  readonly name: string;
  readonly meanC: number;
  readonly minC: number;
  readonly maxC: number;
  readonly endC: number;
  /** With the drivers held at their means for ever. */
  readonly steadyC: number;
}

interface FlowResult {
  readonly name: string;
  /** From the first node of a link to the second, or the power of a control. */
  readonly meanW: number;
  readonly minW: number;
  readonly maxW: number;
  readonly totalKWh: number;
}

export interface NodalResults {
  readonly model: string;
  readonly recordS: number;
  readonly records: number;
  readonly nodes: readonly NodeResult[];
  readonly flows: readonly FlowResult[];
  /** Slowest first; null where a part hangs on no boundary. */
  readonly timeConstantsH: readonly (number | null)[];
  readonly quality: Quality;
}

/** Column `at` of an array laid out record by record. */
function column(values: Float64Array, at: number, width: number): Float64Array {
  return Float64Array.from({ length: values.length / width }, (_, r) => values[r * width + at]);
}

const mean = (values: Float64Array) => values.reduce((a, b) => a + b, 0) / values.length;
const least = (values: Float64Array) => values.reduce((a, b) => Math.min(a, b));
const most = (values: Float64Array) => values.reduce((a, b) => Math.max(a, b));

export function nodalResults({ model, problem }: OpenNodal, run: Run): NodalResults {
  const recordS = problem.stepS * problem.stepsPerRecord;
  const { meters, recordNodes } = problem;
  const steady = steadyState(
    problem,
    { kind: 'mean', steps: problem.stepCount },
    { toleranceK: 1e-6, maxIterations: 100 },
  );
  return {
    model: model.name,
    recordS,
    records: run.records,
    nodes: model.nodes.map((node, i) => {
      const means = column(run.meanC, i, recordNodes.length);
      return {
        id: node.id,
        name: node.name ?? node.id,
        meanC: mean(means),
        minC: least(means),
        maxC: most(means),
        endC: run.finalC[i],
        steadyC: steady.tempC[i],
      };
    }),
    flows: meters.map((meter, m) => {
      const values = column(run.meterW, m, meters.length);
      return {
        name: meter.name,
        meanW: mean(values),
        minW: least(values),
        maxW: most(values),
        totalKWh: (mean(values) * values.length * recordS) / 3.6e6,
      };
    }),
    timeConstantsH: timeConstantsH(problem),
    quality: run.quality,
  };
}

export function nodalText(results: NodalResults): string {
  const { quality, records, recordS } = results;
  return [
    `${results.model}: ${records} records of ${recordS} s`,
    table<NodeResult>(
      [
        { head: 'Node', of: (row) => row.name },
        { head: 'Mean', unit: '°C', digits: 3, of: (row) => row.meanC },
        { head: 'Least', unit: '°C', digits: 3, of: (row) => row.minC },
        { head: 'Greatest', unit: '°C', digits: 3, of: (row) => row.maxC },
        { head: 'At the end', unit: '°C', digits: 3, of: (row) => row.endC },
        { head: 'Steady', unit: '°C', digits: 3, of: (row) => row.steadyC },
      ],
      results.nodes,
    ),
    table<FlowResult>(
      [
        { head: 'Flow', of: (row) => row.name },
        { head: 'Mean', unit: 'W', digits: 2, of: (row) => row.meanW },
        { head: 'Least', unit: 'W', digits: 2, of: (row) => row.minW },
        { head: 'Greatest', unit: 'W', digits: 2, of: (row) => row.maxW },
        { head: 'Total', unit: 'kWh', digits: 3, of: (row) => row.totalKWh },
      ],
      results.flows,
    ),
    timeConstantsText(results.timeConstantsH, 'at the steady state of the mean drivers'),
    `Energy balance closes to ${quality.relativeBalanceResidual.toExponential(1)} of its throughput; ` +
      `${quality.unconvergedSteps} of ${quality.steps} steps not converged.`,
  ].join('\n\n');
}

/** Every record: means of the nodes, then of the flows. */
export function nodalCsv({ model, problem }: OpenNodal, run: Run): string {
  const recordS = problem.stepS * problem.stepsPerRecord;
  const nodes = problem.recordNodes.length;
  const flows = problem.meters.length;
  const heads = [
    'fromS',
    ...model.nodes.map((node) => `${node.id} (°C)`),
    ...problem.meters.map((meter) => `${meter.name} (W)`),
  ];
  const lines = [heads.map(csvText).join(',')];
  const number = (value: number) => Number(value.toPrecision(9));
  for (let r = 0; r < run.records; r++) {
    const temperatures = run.meanC.subarray(r * nodes, (r + 1) * nodes);
    const powers = run.meterW.subarray(r * flows, (r + 1) * flows);
    lines.push(
      [r * recordS, ...Array.from(temperatures, number), ...Array.from(powers, number)].join(','),
    );
  }
  return `${lines.join('\n')}\n`;
}
