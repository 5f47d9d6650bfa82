// A sweep: one year for every point of a sample, in batches, so that rows can be written as they come
// and a sweep that was stopped goes on where it was.
import { type Fault, faultText, type Parsed } from '../../weather/index.ts';
import type { Building } from '../building/index.ts';
import { changeAt, type Json } from './change-path.ts';
import { type FigureName, figureKinds } from './figures.ts';
import type { YearJob } from './job.ts';
import { optionBuilding } from './options.ts';
import { gridPoints, sobolPoints } from './sampling.ts';
import {
  type ElementaryEffects,
  morrisEffects,
  morrisPoints,
  paretoFront,
  type VarianceShares,
  variancePoints,
  varianceShares,
} from './sensitivity.ts';
import { ask, type Study } from './study.ts';
import { gridCount, type Parameter, type Sweep } from './sweep-file.ts';

/** One run of a sweep. */
export interface SweepRow {
  readonly index: number;
  /** Values by parameter id. */
  readonly values: Readonly<Record<string, Json>>;
  readonly figures: Readonly<Partial<Record<FigureName, number>>>;
  /** Why there are no figures. */
  readonly fault?: string;
}

export interface SweepPoint {
  readonly index: number;
  /** Place in the unit cube, where the sample has one. */
  readonly unit: readonly number[];
  readonly values: Readonly<Record<string, Json>>;
}

/** What an input means to a figure; which of the two depends on the sample. */
export interface Influence {
  readonly parameter: string;
  readonly figure: FigureName;
  readonly effects?: ElementaryEffects;
  readonly shares?: VarianceShares;
}

export interface SweepResult {
  readonly study: 'sweep';
  readonly project: string;
  readonly name: string;
  readonly sweep: Sweep;
  readonly rows: readonly SweepRow[];
  /** Indices of rows that no other row beats in the figures of `front`; null where none was asked for. */
  readonly front: readonly number[] | null;
  readonly influences: readonly Influence[];
  readonly notes: readonly string[];
}

/** All points of the sample, in order. */
export function sweepPoints(sweep: Sweep): SweepPoint[] {
  const { parameters, sample } = sweep;
  const inputs = parameters.length;
  if (sample.kind === 'grid')
    return gridPoints(parameters.map(gridCount)).map((places, index) => ({
      index,
      unit: [],
      values: valuesAt(parameters, (parameter, p) => gridValue(parameter, places[p])),
    }));
  const units =
    sample.kind === 'low-discrepancy'
      ? sobolPoints(sample.runs, inputs)
      : sample.kind === 'elementary-effects'
        ? morrisPoints(sample.trajectories, inputs, sample.levels, sample.seed)
        : variancePoints(sample.runs, inputs);
  return units.map((unit, index) => ({
    index,
    unit,
    values: valuesAt(parameters, (parameter, p) => unitValue(parameter, unit[p])),
  }));
}

const valuesAt = (
  parameters: readonly Parameter[],
  of: (parameter: Parameter, p: number) => Json,
): Record<string, Json> =>
  Object.fromEntries(parameters.map((parameter, p) => [parameter.id, of(parameter, p)]));

function gridValue(parameter: Parameter, place: number): Json {
  if ('steps' in parameter) {
    const { from, to, steps } = parameter;
    return from + ((to - from) * place) / (steps - 1);
  }
  return 'values' in parameter ? parameter.values[place] : parameter.options[place];
}

function unitValue(parameter: Parameter, x: number): Json {
  if ('steps' in parameter) return parameter.from + (parameter.to - parameter.from) * x;
  const count = gridCount(parameter);
  return gridValue(parameter, Math.min(count - 1, Math.floor(x * count)));
}

/** The building at a point. */
export function buildingAt(
  base: Building,
  document: Json,
  sweep: Sweep,
  point: SweepPoint,
  file: string,
): Parsed<Building> {
  let changed = document;
  const faults: Fault[] = [];
  const options: Building['options'] = [];
  for (const parameter of sweep.parameters) {
    const value = point.values[parameter.id];
    if ('options' in parameter) {
      const ids = value === 'base' ? [] : String(value).split('+');
      options.push(...ids.flatMap((id) => base.options.find((option) => option.id === id) ?? []));
      continue;
    }
    for (const path of parameter.paths) {
      const next = changeAt(changed, path, value);
      if (next.ok) changed = next.document;
      else
        faults.push({
          file,
          place: { path },
          found: next.found,
          expected: next.expected,
          mend: 'Two parameters take hold of the same part: let one of them go.',
        });
    }
  }
  if (faults.length > 0) return { ok: false, faults };
  const made = optionBuilding(changed, options, file);
  return made.ok ? { ok: true, value: made.value.building } : made;
}

export interface SweepOptions {
  readonly file: string;
  readonly weatherOf: (building: Building) => string;
  /** Rows that an earlier start has left. */
  readonly known?: ReadonlyMap<number, SweepRow>;
  /** Runs asked for at once. */
  readonly batch: number;
  /** Hears of new rows, in order. */
  readonly onRows?: (rows: readonly SweepRow[]) => void;
}

export function* runSweep(
  base: Building,
  document: Json,
  sweep: Sweep,
  options: SweepOptions,
): Study<SweepResult> {
  const points = sweepPoints(sweep);
  const rows = new Map<number, SweepRow>(options.known ?? []);
  const left = points.filter((point) => !rows.has(point.index));
  const before = points.length - left.length;
  for (let from = 0; from < left.length; from += options.batch) {
    const batch = left.slice(from, from + options.batch);
    const made = batch.map((point) => ({
      point,
      building: buildingAt(base, document, sweep, point, options.file),
    }));
    const jobs = made.flatMap(({ building }): YearJob[] =>
      building.ok
        ? [
            {
              kind: 'year',
              building: building.value,
              weather: options.weatherOf(building.value),
              stepMinutes: sweep.stepMinutes,
              refine: 1,
              withHours: false,
            },
          ]
        : [],
    );
    const at = (done: number) => (before + done) / points.length;
    const results = yield* ask(
      'year',
      jobs,
      `running the sweep, ${points.length} runs`,
      at(from),
      at(from + batch.length),
    );
    let next = 0;
    const fresh = made.map(({ point, building }): SweepRow => {
      const { index, values } = point;
      if (!building.ok)
        return { index, values, figures: {}, fault: building.faults.map(faultText).join(' ') };
      const space = results[next++].findings.building;
      const figures = Object.fromEntries(
        wanted(sweep).map((name) => [name, figureKinds[name].of(space)]),
      );
      return { index, values, figures };
    });
    for (const row of fresh) rows.set(row.index, row);
    options.onRows?.(fresh);
  }
  const ordered = points.flatMap((point) => rows.get(point.index) ?? []);
  return sweepResult(base, sweep, points, ordered);
}

/** Figures to report, those of the front among them. */
function wanted(sweep: Sweep): FigureName[] {
  return [...new Set([...sweep.figures, ...(sweep.front ?? [])])];
}

function sweepResult(
  base: Building,
  sweep: Sweep,
  points: readonly SweepPoint[],
  rows: readonly SweepRow[],
): SweepResult {
  const failed = rows.filter((row) => row.fault !== undefined);
  const notes: string[] = [];
  if (failed.length > 0)
    notes.push(
      `${failed.length} of ${rows.length} runs could not be made: ${failed[0].fault} Keep the sweep inside what the project allows.`,
    );
  const missing = wanted(sweep).filter((name) => rows.every((row) => !isKnown(row.figures[name])));
  if (missing.length > 0)
    notes.push(
      `No figures for ${missing.map((name) => figureKinds[name].label.toLowerCase()).join(', ')}: costs and CO₂ need energy carriers in the project.`,
    );
  const { front } = sweep;
  const best =
    front && paretoFront(rows.map((row) => front.map((name) => row.figures[name] ?? Number.NaN)));
  return {
    study: 'sweep',
    project: base.name,
    name: sweep.name,
    sweep,
    rows,
    front: best ? rows.filter((_, i) => best[i]).map((row) => row.index) : null,
    influences: failed.length === 0 ? influencesOf(sweep, points, rows) : [],
    notes:
      failed.length > 0 && sweep.sample.kind !== 'grid' && sweep.sample.kind !== 'low-discrepancy'
        ? [...notes, 'What matters cannot be told while runs are missing.']
        : notes,
  };
}

const isKnown = (value: number | null | undefined): value is number =>
  typeof value === 'number' && Number.isFinite(value);

function influencesOf(
  sweep: Sweep,
  points: readonly SweepPoint[],
  rows: readonly SweepRow[],
): Influence[] {
  const { parameters, sample } = sweep;
  const inputs = parameters.length;
  return wanted(sweep).flatMap((figure): Influence[] => {
    const values = rows.map((row) => row.figures[figure] ?? Number.NaN);
    if (!values.every(isKnown)) return [];
    if (sample.kind === 'elementary-effects')
      return morrisEffects(
        points.map((point) => point.unit),
        values,
        inputs,
      ).map((effects, p) => ({ parameter: parameters[p].id, figure, effects }));
    if (sample.kind === 'variance-shares')
      return varianceShares(values, sample.runs, inputs).map((shares, p) => ({
        parameter: parameters[p].id,
        figure,
        shares,
      }));
    return [];
  });
}
