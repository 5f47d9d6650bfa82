// A room's summer against the published criteria that a study was asked for.
import type { Criterion, RoomFindings, RoomHours } from '../findings/index.ts';
import { europeanAdaptiveBand, yearRunningMeansC } from '../physics/index.ts';

export type MethodId = 'tm52' | 'tm59' | 'tm59-mechanical' | 'en-16798-1' | 'din-4108-2' | 'band';

/** Criteria by the document that sets them, with their usual names. */
export const methodNames: Readonly<Record<MethodId, string>> = {
  tm52: 'CIBSE TM52:2013',
  tm59: 'CIBSE TM59:2017, naturally ventilated homes',
  'tm59-mechanical': 'CIBSE TM59:2017, mechanically ventilated homes',
  'en-16798-1': 'EN 16798-1:2019, adaptive',
  'din-4108-2': 'DIN 4108-2:2013, degree hours',
  band: "the project's own band",
};

export type ClimateRegion = 'A' | 'B' | 'C';

export interface JudgeOptions {
  readonly methods: readonly MethodId[];
  /** Summer region of DIN 4108-2. */
  readonly region: ClimateRegion;
  /** Dwellings are judged round the clock by DIN 4108-2, other rooms in occupied hours. */
  readonly dwelling: boolean;
  /** Share of occupied hours that the project's own band may be passed in. */
  readonly bandShare: number;
}

/** One criterion with how far it is from its limit. */
export interface Judged extends Criterion {
  readonly method: MethodId;
  /** Found less limit, in its unit; above 0 it fails. */
  readonly by: number;
  /** Numerical uncertainty of `found`; null where not asked for. */
  readonly uncertainty: number | null;
  /** Closer to its limit than the uncertainty. */
  readonly atLimit: boolean;
}

export interface Verdict {
  readonly method: MethodId;
  readonly passed: boolean;
  readonly criteria: readonly Judged[];
}

type Plain = Omit<Judged, 'uncertainty' | 'atLimit'>;

/** Base of the degree hours. Source: DIN 4108-2:2013, Table 9 (from memory) [°C]. */
const regionC = { A: 25, B: 26, C: 27 } as const;
/** Allowed in a year. Source: as above [K·h]. */
const allowedKh = { dwelling: 1200, other: 500 } as const;
/** Deviation from a category that is let pass. Source: EN 16798-2:2019 (from memory) [% of occupied hours]. */
const deviationPercent = 3;

/** All criteria asked for, of one room with occupied hours. */
export function judgeRoom(
  findings: RoomFindings,
  hours: RoomHours,
  category: 'I' | 'II' | 'III',
  outdoorC: Float64Array,
  options: JudgeOptions,
): readonly {
  readonly method: MethodId;
  readonly passed: boolean;
  readonly criteria: readonly Plain[];
}[] {
  return options.methods.map((method) => {
    const criteria = criteriaOf(method, findings, hours, category, outdoorC, options).map(
      (one): Plain => ({ ...one, method, by: one.found - one.limit, met: one.found <= one.limit }),
    );
    const failed = criteria.filter((one) => !one.met).length;
    // TM52 alone lets one of its three criteria go.
    return { method, criteria, passed: method === 'tm52' ? failed < 2 : failed === 0 };
  });
}

function criteriaOf(
  method: MethodId,
  findings: RoomFindings,
  hours: RoomHours,
  category: 'I' | 'II' | 'III',
  outdoorC: Float64Array,
  options: JudgeOptions,
): readonly Omit<Criterion, 'met'>[] {
  const known = (n: number) => findings.overheating?.[n]?.criteria ?? [];
  const { operativeC, occupied } = hours;
  const occupiedHours = findings.occupiedHours;
  switch (method) {
    case 'tm52':
      return known(0);
    case 'tm59':
      return known(1);
    case 'tm59-mechanical':
      return known(2);
    case 'en-16798-1': {
      const limitC = adaptiveLimitC(outdoorC, category);
      let above = 0;
      for (let h = 0; h < operativeC.length; h++)
        if (occupied[h] === 1 && operativeC[h] > limitC[h]) above++;
      return [
        {
          name: `above category ${category}`,
          found: occupiedHours > 0 ? (100 * above) / occupiedHours : 0,
          limit: deviationPercent,
          unit: '% of occupied hours',
        },
      ];
    }
    case 'din-4108-2': {
      const baseC = regionC[options.region];
      let kelvinHours = 0;
      for (let h = 0; h < operativeC.length; h++)
        if (options.dwelling || occupied[h] === 1)
          kelvinHours += Math.max(0, operativeC[h] - baseC);
      return [
        {
          name: `degree hours over ${baseC} °C`,
          found: kelvinHours,
          limit: options.dwelling ? allowedKh.dwelling : allowedKh.other,
          unit: 'K·h a year',
        },
      ];
    }
    case 'band':
      return [
        {
          name: "above the project's band",
          found: occupiedHours > 0 ? (100 * findings.hoursAboveBand) / occupiedHours : 0,
          limit: 100 * options.bandShare,
          unit: '% of occupied hours',
        },
      ];
    default:
      return method satisfies never;
  }
}

/** Running mean of the outdoor air in each hour [°C]. Source: EN 16798-1:2019, α = 0.8. */
export function runningMeansC(outdoorC: Float64Array): Float64Array {
  const daily = Float64Array.from({ length: outdoorC.length / 24 }, (_, d) => {
    let sum = 0;
    for (let h = 24 * d; h < 24 * d + 24; h++) sum += outdoorC[h];
    return sum / 24;
  });
  const means = yearRunningMeansC(daily);
  return outdoorC.map((_, h) => means[Math.floor(h / 24)]);
}

/** Upper adaptive limit in each hour; beyond the method's range that of its nearer end (own rule). */
export function adaptiveLimitC(outdoorC: Float64Array, category: 'I' | 'II' | 'III'): Float64Array {
  return runningMeansC(outdoorC).map(
    (c) => europeanAdaptiveBand(Math.min(30, Math.max(10, c)), category)?.highC ?? Number.NaN,
  );
}

/** Hours from 22:00 to 07:00 above 26 °C in the whole year: what a bedroom's night is judged by. */
export function hotNightHours(operativeC: Float64Array): number {
  let count = 0;
  for (let h = 0; h < operativeC.length; h++)
    if ((h % 24 >= 22 || h % 24 < 7) && operativeC[h] > 26) count++;
  return count;
}
