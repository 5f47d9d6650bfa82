// The file that says what a sweep runs: parameters, sample, figures.
import { z } from 'zod';
import type { Fault, Parsed } from '../../weather/index.ts';
import { type Building, schemaFaults } from '../building/index.ts';
import { changeAt, type Json } from './change-path.ts';
import { figureNames } from './figures.ts';
import { optionBuilding } from './options.ts';
import { mostSobolDimensions } from './sampling.ts';
import { mostVarianceInputs } from './sensitivity.ts';

const id = z
  .string()
  .regex(/^[a-z0-9][a-z0-9-]{0,59}$/, 'an id of lower-case letters, digits and hyphens');
const common = { id, name: z.string().max(200).optional() };
const paths = z.array(z.string().min(1)).min(1);

const parameterSchema = z.union([
  /** A number from one end to the other; `steps` points of it where the sample is a grid. */
  z.strictObject({
    ...common,
    paths,
    from: z.number(),
    to: z.number(),
    steps: z.int().gte(2).lte(1000).default(5),
  }),
  /** A list of values, of any kind that the field takes. */
  z.strictObject({ ...common, paths, values: z.array(z.json()).min(1).max(1000) }),
  /** One of the project's options, or several joined by "+", or "base". */
  z.strictObject({ ...common, options: z.array(z.string().min(1)).min(1).max(1000) }),
]);

const sampleSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('grid') }),
  z.strictObject({ kind: z.literal('low-discrepancy'), runs: z.int().gte(1).lte(100_000) }),
  z.strictObject({
    kind: z.literal('elementary-effects'),
    trajectories: z.int().gte(2).lte(1000).default(10),
    levels: z.union([z.literal(4), z.literal(6), z.literal(8)]).default(4),
    seed: z.int().gte(1).default(1),
  }),
  z.strictObject({ kind: z.literal('variance-shares'), runs: z.int().gte(4).lte(10_000) }),
]);

export const sweepSchema = z.strictObject({
  format: z.literal('inglenook-sweep'),
  version: z.literal(1),
  name: z.string().max(200),
  parameters: z.array(parameterSchema).min(1).max(50),
  sample: sampleSchema,
  figures: z
    .array(z.enum(figureNames))
    .min(1)
    .default(['heatingKWh', 'coolingKWh', 'hoursAboveBand']),
  /** Two figures or more that are set against each other; less is better. */
  front: z.array(z.enum(figureNames)).min(2).optional(),
  stepMinutes: z.literal([1, 2, 3, 4, 5, 6, 10, 12, 15, 20, 30, 60]).default(30),
});

export type Sweep = z.infer<typeof sweepSchema>;
export type Parameter = Sweep['parameters'][number];

const mostRuns = 200_000;

/** Text of a sweep file → sweep that fits the project, or every fault. */
export function parseSweep(
  text: string,
  file: string,
  building: Building,
  document: Json,
): Parsed<Sweep> {
  const fault = (path: string, found: string, expected: string, mend: string): Fault => ({
    file,
    place: { path },
    found,
    expected,
    mend,
  });
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch {
    return {
      ok: false,
      faults: [fault('', 'text that is not JSON', 'a sweep in JSON', 'Mend the mistake there.')],
    };
  }
  const parsed = sweepSchema.safeParse(json);
  if (!parsed.success) return { ok: false, faults: schemaFaults(parsed.error, json, file) };
  const sweep = parsed.data;
  const faults = sweep.parameters.flatMap((parameter, p) =>
    parameterFaults(parameter, `parameters[${p}]`, file, building, document),
  );
  const ids = sweep.parameters.map((parameter) => parameter.id);
  for (const [p, one] of ids.entries())
    if (ids.indexOf(one) !== p)
      faults.push(fault(`parameters[${p}].id`, `"${one}" again`, 'ids that differ', 'Rename one.'));
  const runs = runCount(sweep);
  if (runs > mostRuns)
    faults.push(
      fault(
        'sample',
        `${runs} runs`,
        `at most ${mostRuns}`,
        'Take fewer values, or a low-discrepancy sample.',
      ),
    );
  const most =
    sweep.sample.kind === 'variance-shares'
      ? mostVarianceInputs
      : sweep.sample.kind === 'low-discrepancy'
        ? mostSobolDimensions
        : Number.POSITIVE_INFINITY;
  if (ids.length > most)
    faults.push(
      fault(
        'parameters',
        `${ids.length} parameters`,
        `at most ${most} for this sample`,
        'Screen them by elementary effects first.',
      ),
    );
  return faults.length > 0 ? { ok: false, faults } : { ok: true, value: sweep };
}

/** How many values a parameter has on a grid. */
export function gridCount(parameter: Parameter): number {
  if ('steps' in parameter) return parameter.steps;
  return 'values' in parameter ? parameter.values.length : parameter.options.length;
}

export function runCount({ parameters, sample }: Sweep): number {
  const inputs = parameters.length;
  switch (sample.kind) {
    case 'grid':
      return parameters.reduce((product, parameter) => product * gridCount(parameter), 1);
    case 'low-discrepancy':
      return sample.runs;
    case 'elementary-effects':
      return sample.trajectories * (inputs + 1);
    case 'variance-shares':
      return sample.runs * (inputs + 2);
    default:
      return sample satisfies never;
  }
}

/** Every value, or both ends of a range, put into the base alone: a sweep must not leave what the project allows. */
function parameterFaults(
  parameter: Parameter,
  where: string,
  file: string,
  building: Building,
  document: Json,
): Fault[] {
  if ('options' in parameter)
    return parameter.options.flatMap((choice, c) =>
      optionFaults(choice, `${where}.options[${c}]`, file, building, document),
    );
  const tried: readonly (readonly [string, Json])[] =
    'values' in parameter
      ? parameter.values.map((value, v) => [`values[${v}]`, value] as const)
      : [['from', parameter.from] as const, ['to', parameter.to] as const];
  return tried.flatMap(([name, value]) => {
    let changed = document;
    for (const [k, path] of parameter.paths.entries()) {
      const next = changeAt(changed, path, value);
      if (!next.ok)
        return name === tried[0][0]
          ? [
              {
                file,
                place: { path: `${where}.paths[${k}]` },
                found: `${path}, where ${next.at} holds ${next.found}`,
                expected: next.expected,
                mend: 'Correct the path: it does not fit the project.',
              },
            ]
          : [];
      changed = next.document;
    }
    return rangeFaults(changed, `${where}.${name}`, file, value);
  });
}

function rangeFaults(document: Json, where: string, file: string, value: Json): Fault[] {
  const made = optionBuilding(document, [], file);
  if (made.ok) return [];
  return made.faults.slice(0, 3).map((one) => ({
    file,
    place: { path: where },
    found: `${JSON.stringify(value)}, with which the project is at fault (${'path' in one.place ? one.place.path : ''}: ${one.found})`,
    expected: one.expected,
    mend: 'Keep the sweep inside what the project allows.',
  }));
}

function optionFaults(
  choice: string,
  where: string,
  file: string,
  building: Building,
  document: Json,
): Fault[] {
  if (choice === 'base') return [];
  const ids = choice.split('+');
  const missing = ids.filter((one) => !building.options.some((option) => option.id === one));
  if (missing.length > 0)
    return [
      {
        file,
        place: { path: where },
        found: `no option ${missing.map((one) => `"${one}"`).join(', ')}`,
        expected: ['base', ...building.options.map((option) => option.id)].join(', '),
        mend: 'Name options of the project by their id.',
      },
    ];
  const options = ids.flatMap((one) => building.options.find((option) => option.id === one) ?? []);
  const made = optionBuilding(document, options, file);
  return made.ok ? [] : [...made.faults];
}
