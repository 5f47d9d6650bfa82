// Base and options side by side: each figure, its difference from the base with the numerical
// uncertainty of that difference, what changed, and what it costs and saves.
import type { Fault } from '../../weather/index.ts';
import type { Building, Economics } from '../building/index.ts';
import type { Findings, SpaceFindings } from '../findings/index.ts';
import { type AccuracyCheck, secondCut } from './accuracy.ts';
import type { Json } from './change-path.ts';
import { changeText, uValueChanges } from './change-text.ts';
import { type Measure, netPresentValue, simplePaybackYears } from './economics.ts';
import { type FigureName, type Figures, figuresOf } from './figures.ts';
import type { YearJob, YearResult } from './job.ts';
import { optionBuilding } from './options.ts';
import { ask, type Study } from './study.ts';

/** One column of the comparison: the base, an option, or several options together. */
export interface ComparedCase {
  readonly id: string;
  readonly name: string;
  readonly note: string;
  readonly options: readonly string[];
  readonly building: Building;
  readonly changes: readonly string[];
  /** U-values that follow from the changes. */
  readonly consequences: readonly string[];
  /** Null where an option's cost is not given. */
  readonly measures: readonly Measure[] | null;
}

/**
 * The base, each of its options, and the combinations asked for.
 *
 * @param document the base as read from its file
 * @param combinations ids of options to take together, in order
 * @returns cases that can be run, and every fault of those that cannot
 */
export function comparedCases(
  building: Building,
  document: Json,
  file: string,
  combinations: readonly (readonly string[])[] = [],
): { readonly cases: readonly ComparedCase[]; readonly faults: readonly Fault[] } {
  const faults: Fault[] = [];
  const base: ComparedCase = {
    id: 'base',
    name: 'Base',
    note: '',
    options: [],
    building,
    changes: [],
    consequences: [],
    measures: [],
  };
  const cases = [base];
  const sets = [...building.options.map((option) => [option.id]), ...combinations];
  for (const ids of sets) {
    const options = ids.flatMap((id) => building.options.find((option) => option.id === id) ?? []);
    if (options.length < ids.length) {
      const missing = ids.filter((id) => !options.some((option) => option.id === id));
      faults.push({
        file,
        place: { path: 'options' },
        found: `no option ${missing.map((id) => `"${id}"`).join(', ')}`,
        expected: `ids out of ${building.options.map((option) => option.id).join(', ') || 'none'}`,
        mend: 'Name options by their id.',
      });
      continue;
    }
    const made = optionBuilding(document, options, file);
    if (!made.ok) {
      faults.push(...made.faults);
      continue;
    }
    const measures = options.flatMap(({ measureCost, lifetimeYears }) =>
      measureCost === undefined
        ? []
        : [{ cost: measureCost, lifetimeYears: lifetimeYears ?? Number.POSITIVE_INFINITY }],
    );
    cases.push({
      id: ids.join('+'),
      name: options.map((option) => option.name).join(' + '),
      note: options
        .map((option) => option.note)
        .filter((note) => note !== '')
        .join(' '),
      options: ids,
      building: made.value.building,
      changes: made.value.lines.map((line) => changeText(document, line)),
      consequences: uValueChanges(building, made.value.building),
      measures: measures.length === options.length ? measures : null,
    });
  }
  return { cases, faults };
}

export interface CompareOptions {
  readonly stepMinutes: number;
  readonly accuracy: AccuracyCheck;
  /** Name of the weather that a building asks for (options may change it). */
  readonly weatherOf: (building: Building) => string;
}

/** Money, in the project's currency. */
export interface CaseEconomy {
  readonly measureCost: number;
  readonly savingPerYear: number;
  /** Null: the measure does not pay back, it saves nothing. */
  readonly simplePaybackYears: number | null;
  readonly netPresentValue: number;
  /** From the numerical uncertainty of the saving; prices and costs have their own. */
  readonly netPresentValueUncertainty: number | null;
}

export interface CaseResult {
  readonly id: string;
  readonly name: string;
  readonly note: string;
  readonly options: readonly string[];
  readonly changes: readonly string[];
  readonly consequences: readonly string[];
  readonly building: Figures;
  /** Rooms by their id; one that the base has not has no difference. */
  readonly rooms: readonly {
    readonly id: string;
    readonly name: string;
    readonly figures: Figures;
  }[];
  readonly heatingByMonthKWh: readonly number[];
  readonly coolingByMonthKWh: readonly number[];
  /** Null for the base, and where prices or the measure's cost are not given. */
  readonly economy: CaseEconomy | null;
  readonly cautions: readonly string[];
  readonly assumptions: readonly string[];
  readonly relativeBalanceResidual: number;
}

export interface Comparison {
  readonly study: 'compare';
  readonly project: string;
  readonly stepMinutes: number;
  readonly currency: string;
  readonly economics: Economics;
  /** How the uncertainty of differences was found; null where it was not asked for. */
  readonly accuracy: string | null;
  /** The base first. */
  readonly cases: readonly CaseResult[];
  readonly notes: readonly string[];
}

export function* compare(
  cases: readonly ComparedCase[],
  options: CompareOptions,
): Study<Comparison> {
  const { stepMinutes } = options;
  const job = (one: ComparedCase, cut: { stepMinutes: number; refine: number }): YearJob => ({
    kind: 'year',
    building: one.building,
    weather: options.weatherOf(one.building),
    withHours: false,
    ...cut,
  });
  const second = secondCut(options.accuracy, { stepMinutes, refine: 1 });
  const jobs = cases.map((one) => job(one, { stepMinutes, refine: 1 }));
  if (second) jobs.push(...cases.map((one) => job(one, second)));
  const results = yield* ask('year', jobs, 'running base and options', 0, 1);
  const first = results.slice(0, cases.length);
  const again = results.slice(cases.length);
  const [base] = cases;
  const { energy, economics } = base.building;
  return {
    study: 'compare',
    project: base.building.name,
    stepMinutes,
    currency: energy.currency,
    economics,
    accuracy: second?.method ?? null,
    cases: cases.map((one, c) =>
      caseResult(
        one,
        economics,
        first[c],
        first[0],
        second ? [again[c], again[0]] : null,
        second?.factor ?? 1,
      ),
    ),
    notes: notesOf(cases),
  };
}

function notesOf(cases: readonly ComparedCase[]): string[] {
  const [base] = cases;
  const notes: string[] = [];
  if (base.building.energy.carriers.length === 0)
    notes.push(
      'No energy carriers are given, so there is no final energy, cost or CO₂: add "energy" to the project.',
    );
  const unpriced = cases.filter((one) => one.measures === null).map((one) => one.name);
  if (unpriced.length > 0)
    notes.push(`No payback without the cost of the measure (measureCost): ${unpriced.join(', ')}.`);
  return notes;
}

function caseResult(
  one: ComparedCase,
  economics: Economics,
  run: YearResult,
  base: YearResult,
  again: readonly [YearResult, YearResult] | null,
  factor: number,
): CaseResult {
  const { findings } = run;
  const secondOf = (of: (f: Findings) => SpaceFindings | undefined) => {
    const pair = again && ([of(again[0].findings), of(again[1].findings)] as const);
    return pair?.[0] && pair[1] ? { ofCase: pair[0], ofBase: pair[1] } : null;
  };
  const building = figuresOf(
    findings.building,
    base.findings.building,
    secondOf((f) => f.building),
    factor,
  );
  return {
    id: one.id,
    name: one.name,
    note: one.note,
    options: one.options,
    changes: one.changes,
    consequences: one.consequences,
    building,
    rooms: findings.rooms.map((room) => {
      const find = (f: Findings) => f.rooms.find((other) => other.id === room.id);
      const before = find(base.findings) ?? room;
      return {
        id: room.id,
        name: room.name,
        figures: figuresOf(room, before, secondOf(find), factor),
      };
    }),
    heatingByMonthKWh: findings.building.heatingByMonthKWh,
    coolingByMonthKWh: findings.building.coolingByMonthKWh,
    economy: one.id === 'base' ? null : economyOf(one, building, economics),
    cautions: findings.cautions,
    assumptions: findings.assumptions,
    relativeBalanceResidual: findings.quality.relativeBalanceResidual,
  };
}

function economyOf(one: ComparedCase, figures: Figures, economics: Economics): CaseEconomy | null {
  const { cost } = figures;
  if (!cost || one.measures === null) return null;
  const measureCost = one.measures.reduce((sum, measure) => sum + measure.cost, 0);
  const savingPerYear = -cost.difference;
  const isSaving = cost.uncertainty === null || savingPerYear > cost.uncertainty;
  return {
    measureCost,
    savingPerYear,
    simplePaybackYears: isSaving ? simplePaybackYears(measureCost, savingPerYear) : null,
    netPresentValue: netPresentValue(one.measures, savingPerYear, economics),
    netPresentValueUncertainty:
      cost.uncertainty === null ? null : netPresentValue([], cost.uncertainty, economics),
  };
}

/** What cases can be put in order by. */
export type SortKey = FigureName | 'netPresentValue' | 'simplePaybackYears' | 'name';

/** The base first, then the rest from least to most (net present value from most to least). */
export function sortedCases(cases: readonly CaseResult[], key: SortKey): CaseResult[] {
  const value = (one: CaseResult): number => {
    if (key === 'netPresentValue')
      return -(one.economy?.netPresentValue ?? Number.NEGATIVE_INFINITY);
    if (key === 'simplePaybackYears')
      return one.economy?.simplePaybackYears ?? Number.POSITIVE_INFINITY;
    return key === 'name' ? 0 : (one.building[key]?.value ?? Number.POSITIVE_INFINITY);
  };
  const [base, ...rest] = cases;
  const ordered = rest.toSorted((a, b) =>
    key === 'name' ? a.name.localeCompare(b.name) : Math.sign(value(a) - value(b)) || 0,
  );
  return [base, ...ordered];
}
