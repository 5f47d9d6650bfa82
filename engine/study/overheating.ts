// Overheating: every room against published criteria, its worst week, what drives it, and which change
// would cure it, found by trial runs.
import type { WeatherYear } from '../../weather/index.ts';
import type { Building } from '../building/index.ts';
import type { RoomHours, Simulation } from '../findings/index.ts';
import { secondCut } from './accuracy.ts';
import type { YearJob, YearResult } from './job.ts';
import {
  adaptiveLimitC,
  hotNightHours,
  type Judged,
  judgeRoom,
  type MethodId,
  methodNames,
  type Verdict,
} from './judge.ts';
import type {
  Overheating,
  OverheatingOptions,
  RoomOverheating,
  TrialResult,
} from './overheating-types.ts';
import { ask, type Study } from './study.ts';
import { type Trial, trials } from './trials.ts';
import { driversOf, worstDays } from './worst-days.ts';

const allMethods = Object.keys(methodNames) as MethodId[];
const mostTogether = 3;

export function* overheating(
  building: Building,
  weather: WeatherYear,
  options: OverheatingOptions,
): Study<Overheating> {
  const [main, ...others] = options.weathers;
  const job = (
    one: Building,
    key: string,
    cut: { stepMinutes: number; refine: number },
  ): YearJob => ({
    kind: 'year',
    building: one,
    weather: key,
    withHours: true,
    ...cut,
  });
  const cut = { stepMinutes: options.stepMinutes, refine: 1 };
  const second = secondCut(options.accuracy, cut);
  const jobs = [job(building, main, cut), ...others.map((key) => job(building, key, cut))];
  if (second) jobs.push(job(building, main, second));
  const runs = yield* ask('year', jobs, 'running the summer', 0, options.trials ? 0.3 : 1);
  const base = simulationIn(runs[0]);
  const again = second ? simulationIn(runs[runs.length - 1]) : null;
  const rooms = building.rooms.map((_, r) =>
    roomOverheating(building, base, again, second?.factor ?? 1, r, options),
  );
  const failing = rooms.filter((room) => room.judged && !room.passed).map((room) => room.room);
  // Trials are compared among themselves: the coarser of the two cuts will do, with the base in it.
  const coarse =
    second && again && second.stepMinutes > cut.stepMinutes
      ? { cut: second, run: again }
      : { cut, run: base };
  const whole = trialResult(['as-it-is'], 'As it is', '', building, coarse.run, options);
  const tried =
    options.trials && failing.length > 0
      ? yield* runTrials(building, new Set(failing), (one) => job(one, main, coarse.cut), options)
      : [];
  const cure = tried.find((one) => one.roomsFailing.length === 0) ?? null;
  return {
    study: 'overheating',
    project: building.name,
    options,
    methods: options.methods.map((method) => methodNames[method]),
    weather: weather.site.name,
    accuracy: second?.method ?? null,
    rooms,
    base: whole,
    trials: tried,
    cure: cure?.id ?? null,
    otherWeathers: others.map((key, i) => {
      const simulation = simulationIn(runs[1 + i]);
      const { roomsFailing } = trialResult([key], key, '', building, simulation, options);
      return { weather: key, place: simulation.findings.weather.place, roomsFailing };
    }),
    notes: notesOf(rooms, options),
    cautions: cautionsOf(rooms, failing, cure, tried.length > 0),
  };
}

function simulationIn(run: YearResult): Simulation {
  if (!run.simulation) throw new Error('a run came back without its hours');
  return run.simulation;
}

const categoryOf = (building: Building, r: number) => building.rooms[r].comfort?.category ?? 'II';
const isJudged = (room: RoomHours) => room.occupied.includes(1);

function roomOverheating(
  building: Building,
  base: Simulation,
  again: Simulation | null,
  factor: number,
  r: number,
  options: OverheatingOptions,
): RoomOverheating {
  const hours = base.rooms[r];
  const found = base.findings.rooms[r];
  const category = categoryOf(building, r);
  const judged = isJudged(hours);
  const judge = (of: Simulation, methods: readonly MethodId[]) =>
    judgeRoom(of.findings.rooms[r], of.rooms[r], category, of.outdoorC, { ...options, methods });
  const second = again && judge(again, options.methods);
  const verdicts = judge(base, options.methods).map(
    (verdict, m): Verdict => ({
      ...verdict,
      criteria: verdict.criteria.map((one, c): Judged => {
        const other = second?.[m].criteria[c];
        const uncertainty = other ? factor * Math.abs(other.found - one.found) : null;
        return {
          ...one,
          uncertainty,
          atLimit: uncertainty !== null && Math.abs(one.by) <= uncertainty,
        };
      }),
    }),
  );
  const limitC = adaptiveLimitC(base.outdoorC, category);
  const rest = allMethods.filter((method) => !options.methods.includes(method));
  const passed = verdicts.every((verdict) => verdict.passed);
  return {
    room: found.id,
    name: found.name,
    judged,
    verdicts: judged ? verdicts : [],
    wouldFail: judged
      ? judge(base, rest).flatMap((verdict) => (verdict.passed ? [] : [verdict.method]))
      : [],
    passed: judged && passed,
    highestOperativeC: found.operativeTemperatureC.max,
    highestAt: found.operativeTemperatureC.maxAt,
    hoursAboveBand: found.hoursAboveBand,
    degreeHoursAbove: found.degreeHoursAbove,
    hotNightHours: hotNightHours(hours.operativeC),
    worst: judged ? worstDays(base, hours, limitC) : null,
    drivers: judged ? driversOf(hours, limitC) : null,
  };
}

function trialResult(
  parts: readonly string[],
  name: string,
  what: string,
  building: Building,
  run: Simulation,
  options: OverheatingOptions,
): TrialResult {
  const judged = run.rooms.flatMap((hours, r) =>
    isJudged(hours)
      ? [
          {
            room: hours.id,
            verdicts: judgeRoom(
              run.findings.rooms[r],
              hours,
              categoryOf(building, r),
              run.outdoorC,
              options,
            ),
          },
        ]
      : [],
  );
  const rooms = judged.map(({ room, verdicts }) => ({
    room,
    criteria: verdicts.flatMap((verdict) => verdict.criteria),
  }));
  return {
    id: parts.join('+'),
    name,
    what,
    parts,
    roomsFailing: judged.flatMap(({ room, verdicts }) =>
      verdicts.every((verdict) => verdict.passed) ? [] : [room],
    ),
    severity: rooms.reduce(
      (sum, { criteria }) =>
        sum + criteria.reduce((all, one) => all + Math.max(0, one.by) / one.limit, 0),
      0,
    ),
    heatingKWh: run.findings.building.heatingKWh,
    rooms,
  };
}

/** From the best: fewest rooms that fail, then the least left above the limits. */
const better = (a: TrialResult, b: TrialResult) =>
  a.roomsFailing.length - b.roomsFailing.length || a.severity - b.severity;

function* runTrials(
  building: Building,
  rooms: ReadonlySet<string>,
  job: (building: Building) => YearJob,
  options: OverheatingOptions,
): Study<TrialResult[]> {
  const useful = trials.flatMap((trial) => {
    const changed = trial.apply(building, rooms);
    return changed ? [{ trial, changed }] : [];
  });
  const runs = yield* ask(
    'year',
    useful.map(({ changed }) => job(changed)),
    'trying single changes',
    0.3,
    0.8,
  );
  const singles = useful
    .map(({ trial, changed }, i) => ({
      trial,
      result: trialResult(
        [trial.id],
        trial.name,
        trial.what,
        changed,
        simulationIn(runs[i]),
        options,
      ),
    }))
    .sort((a, b) => better(a.result, b.result));
  const results = singles.map((one) => one.result);
  if (results.length === 0 || results[0].roomsFailing.length === 0) return results;
  // No single change is enough: the best ones together, one more at a time.
  for (let count = 2; count <= Math.min(mostTogether, singles.length); count++) {
    const together: readonly Trial[] = singles.slice(0, count).map((one) => one.trial);
    const changed = together.reduce<Building>(
      (now, trial) => trial.apply(now, rooms) ?? now,
      building,
    );
    const at = 0.8 + (0.2 * (count - 2)) / (mostTogether - 1);
    const [run] = yield* ask('year', [job(changed)], 'trying changes together', at, at + 0.1);
    const result = trialResult(
      together.map((trial) => trial.id),
      together.map((trial) => trial.name).join(' + '),
      together.map((trial) => trial.what).join(' '),
      changed,
      simulationIn(run),
      options,
    );
    results.push(result);
    if (result.roomsFailing.length === 0) break;
  }
  return results;
}

function notesOf(rooms: readonly RoomOverheating[], options: OverheatingOptions): string[] {
  const notes: string[] = [];
  const empty = rooms.filter((room) => !room.judged).map((room) => room.name);
  if (empty.length > 0) notes.push(`No occupied hours, so not judged: ${empty.join(', ')}.`);
  if (options.methods.includes('din-4108-2'))
    notes.push(
      `DIN 4108-2: region ${options.region}; ${options.dwelling ? 'dwelling, every hour of the year' : 'other than dwelling, occupied hours'}.`,
    );
  for (const method of allMethods) {
    const names = rooms.filter((room) => room.wouldFail.includes(method)).map((room) => room.name);
    if (names.length > 0)
      notes.push(
        `Not in the chosen set, but by ${methodNames[method]} these would fail: ${names.join(', ')}.`,
      );
  }
  return notes;
}

function cautionsOf(
  rooms: readonly RoomOverheating[],
  failing: readonly string[],
  cure: TrialResult | null,
  tried: boolean,
): string[] {
  if (failing.length === 0) return [];
  const names = rooms.filter((room) => failing.includes(room.room)).map((room) => room.name);
  const list = [
    `Heat: ${names.join(', ')} overheat by the criteria chosen. Infants, the old and the ill are at risk well below these limits; follow local rules and guidance.`,
  ];
  if (tried && !cure)
    list.push(
      'None of the changes tried, alone or together, cures every room: look at the glass area, the use, or cooling.',
    );
  return list;
}
