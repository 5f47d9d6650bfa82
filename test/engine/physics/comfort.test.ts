import { describe, expect, test } from 'vitest';
import {
  airSpeedRaiseK,
  americanAdaptiveBand,
  europeanAdaptiveBand,
  nextRunningMeanC,
  weekRunningMeanC,
  yearRunningMeansC,
} from '../../../engine/physics/adaptive-comfort.ts';
import { bandExceedance } from '../../../engine/physics/band-exceedance.ts';
import {
  type AsymmetryKind,
  dissatisfiedByAsymmetry,
  dissatisfiedByFloor,
  dissatisfiedByStratification,
  draughtRate,
} from '../../../engine/physics/local-discomfort.ts';
import {
  airShare,
  meanRadiantByPowersC,
  meanRadiantC,
  operativeC,
  radiantFromGlobeForcedC,
  radiantFromGlobeStillC,
  weightedOperativeC,
} from '../../../engine/physics/operative-temperature.ts';
import { metWPerM2 } from '../../../engine/physics/people-gains.ts';
import {
  cloM2KPerW,
  operativeForVoteC,
  predictedDissatisfied,
  predictedMeanVote,
} from '../../../engine/physics/pmv.ts';
import {
  caseName,
  expectCase,
  inputNumber,
  inputNumbers,
  inputText,
  type ReferenceCase,
  referenceCases,
} from '../../reference/cases.ts';

const file = '01-comfort.json';
const percent = (share: number) => 100 * share;
let seen = 0;
/** A test for each case of a pattern. */
function each(ids: RegExp, check: (one: ReferenceCase, number: (key: string) => number) => void) {
  for (const one of referenceCases(file, ids)) {
    seen++;
    test(caseName(one), () => check(one, (key) => inputNumber(one, key)));
  }
}

describe('PMV and PPD', () => {
  each(/^pmv-(iso7730|calc)/, (one, number) => {
    const vote = predictedMeanVote({
      airC: number('ta'),
      meanRadiantC: number('tr'),
      airMPerS: number('va'),
      relativeHumidity: number('rh') / 100,
      metabolicWPerM2: number('met') * metWPerM2,
      workWPerM2: number('work_met') * metWPerM2,
      clothingM2KPerW: number('clo') * cloM2KPerW,
    });
    const more = 'tcl' in one.expected && {
      tcl: vote.clothingC,
      hc: vote.convectiveWPerM2K,
      fcl: vote.clothingAreaFactor,
      pa: vote.vapourPa,
    };
    expectCase(one, { pmv: vote.pmv, ppd: percent(vote.ppd), ...more });
  });
  each(/^pmv-inverse-/, (one, number) => {
    const person = {
      airMPerS: number('va'),
      relativeHumidity: number('rh') / 100,
      metabolicWPerM2: number('met') * metWPerM2,
      workWPerM2: 0,
      clothingM2KPerW: number('clo') * cloM2KPerW,
    };
    expectCase(one, {
      operative: inputNumbers(one, 'targets').map((v) => operativeForVoteC(v, person)),
    });
  });
  each(/^ppd-/, (one) => {
    expectCase(one, {
      ppd: inputNumbers(one, 'pmv').map((v) => percent(predictedDissatisfied(v))),
    });
  });
});

describe('local discomfort', () => {
  each(/^draught-/, (one, number) => {
    expectCase(one, { dr: percent(draughtRate(number('ta'), number('va'), number('tu') / 100)) });
  });
  each(/^vertical-dt$/, (one) => {
    const shares = inputNumbers(one, 'dt_vertical').map(dissatisfiedByStratification);
    expectCase(one, { pd: shares.map(percent) });
  });
  each(/^floor-temp$/, (one) => {
    expectCase(one, { pd: inputNumbers(one, 'floor').map((t) => percent(dissatisfiedByFloor(t))) });
  });
  each(/^asymmetry-/, (one) => {
    const kind = inputText(one, 'kind').replace('_', ' ') as AsymmetryKind;
    expectCase(one, {
      pd: inputNumbers(one, 'asym').map((d) => percent(dissatisfiedByAsymmetry(kind, d))),
    });
  });
});

describe('operative and radiant temperature', () => {
  each(/^operative-ashrae-/, (one, number) => {
    const share = airShare(number('va'));
    expectCase(one, { weight_air: share, top: operativeC(number('ta'), number('tr'), share) });
  });
  each(/^operative-weighted-/, (one, number) => {
    const top = weightedOperativeC(number('ta'), number('tr'), number('hc'), number('hr'));
    expectCase(one, { top });
  });
  each(/^globe-/, (one, number) => {
    const [tg, ta, d, e] = ['tg', 'ta', 'diameter', 'emissivity'].map(number);
    const tr =
      inputText(one, 'convection') === 'forced'
        ? radiantFromGlobeForcedC(tg, ta, number('va'), d, e)
        : radiantFromGlobeStillC(tg, ta, d, e);
    expectCase(one, { tr });
  });
  each(/^mrt-/, (one) => {
    const weights = inputNumbers(one, 'areas' in one.inputs ? 'areas' : 'factors');
    const temps = inputNumbers(one, 'temps');
    expectCase(one, {
      tr_linear: meanRadiantC(weights, temps),
      tr_fourth: meanRadiantByPowersC(weights, temps),
    });
  });
});

describe('adaptive bands', () => {
  each(/^adaptive-en-/, (one, number) => {
    const [i, ii, iii] = (['I', 'II', 'III'] as const).map((c) =>
      europeanAdaptiveBand(number('t_rm'), c),
    );
    expectCase(one, {
      t_comfort: i?.comfortC,
      upper_I: i?.highC,
      lower_I: i?.lowC,
      upper_II: ii?.highC,
      lower_II: ii?.lowC,
      upper_III: iii?.highC,
      lower_III: iii?.lowC,
    });
  });
  each(/^adaptive-ashrae-/, (one, number) => {
    const [most, nearly] = ([80, 90] as const).map((a) => americanAdaptiveBand(number('t_rm'), a));
    expectCase(one, {
      t_comfort: most?.comfortC,
      upper_80: most?.highC,
      lower_80: most?.lowC,
      upper_90: nearly?.highC,
      lower_90: nearly?.lowC,
    });
  });
  each(/^adaptive-airspeed-/, (one, number) => {
    expectCase(one, { delta: airSpeedRaiseK(number('air_speed')) });
  });
  each(/^running-mean-7day-/, (one) => {
    expectCase(one, { t_rm: weekRunningMeanC(inputNumbers(one, 'daily_means')) });
  });
  each(/^running-mean-recursion-/, (one, number) => {
    let running = number('start_rm');
    const series = inputNumbers(one, 'daily_series').map((day) => {
      running = nextRunningMeanC(day, running, number('alpha'));
      return running;
    });
    expectCase(one, { t_rm_series: series });
  });

  test('the methods say nothing outside their range of outdoor temperatures', () => {
    expect(europeanAdaptiveBand(9.99, 'II')).toBeNull();
    expect(europeanAdaptiveBand(30.01, 'II')).toBeNull();
    expect(americanAdaptiveBand(33.51, 80)).toBeNull();
    expect(americanAdaptiveBand(Number.NaN, 80)).toBeNull();
  });

  test('still air raises no limit', () => {
    expect(airSpeedRaiseK(0.59)).toBe(0);
  });

  test('a year that repeats starts where it ended', () => {
    const daily = Float64Array.from(
      { length: 365 },
      (_, d) => 10 - 8 * Math.cos((2 * Math.PI * d) / 365),
    );
    const means = yearRunningMeansC(daily);
    expect(means[0]).toBeCloseTo(nextRunningMeanC(daily[364], means[364]), 12);
    // From scratch: the weighted sum of all the days before day 0, α^k·(1 − α).
    let sum = 0;
    for (let k = 0; k < 365; k++) sum += 0.2 * 0.8 ** k * daily[364 - k];
    expect(means[0]).toBeCloseTo(sum, 9);
    const even = yearRunningMeansC(new Float64Array(365).fill(12.5));
    for (const m of even) expect(m).toBeCloseTo(12.5, 12);
  });
});

describe('hours outside a band', () => {
  each(/^exceedance-/, (one, number) => {
    const top = inputNumbers(one, 'top');
    const even = (v: number) => new Float64Array(top.length).fill(v);
    const found = bandExceedance(
      top,
      even(number('lower')),
      even(number('upper')),
      inputNumbers(one, 'occupied'),
    );
    expectCase(one, {
      hours_above: found.hoursAbove,
      hours_below: found.hoursBelow,
      degree_hours_above: found.degreeHoursAbove,
      degree_hours_below: found.degreeHoursBelow,
      percent_outside: percent(found.shareOutside),
    });
  });
  test('a room never occupied is never outside', () => {
    expect(bandExceedance([40], [20], [26], [0]).shareOutside).toBe(0);
  });
});

test('every comfort case of the reference was tested', () => {
  expect(seen).toBe(referenceCases(file).length);
});
