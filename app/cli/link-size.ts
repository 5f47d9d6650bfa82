// A link's conductance for a table: what the law gives at 20 °C, 1 K apart, with the year's mean of
// whatever drives it. A run evaluates the law itself at every step.

import { type LinkGroup, type Problem, seriesMean } from '../../engine/index.ts';

const stefanBoltzmannWPerM2K4 = 5.670374419e-8; // CODATA 2018, exact in the SI of 2019
const referenceK = 293.15;

/** The year's mean of a series by its index (0 for none), computed when it is first asked for. */
export function yearMeans(problem: Problem): (series: number) => number {
  const means = new Map<number, number>();
  return (series) => {
    if (series < 0) return 0;
    const known = means.get(series);
    if (known !== undefined) return known;
    const mean = seriesMean(problem.series[series], 0, problem.stepCount);
    means.set(series, mean);
    return mean;
  };
}

export function linkSizeWPerK(
  group: LinkGroup,
  k: number,
  mean: (series: number) => number,
): number {
  switch (group.law) {
    case 'constant':
      return group.conductanceWPerK[k];
    case 'scaled':
      return group.conductanceWPerK[k] * mean(group.series[k]);
    case 'buoyant': {
      const base = group.baseWPerK[k] * mean(group.baseSeries[k]);
      return base + group.warmerFrom[k] * (1 + group.softeningK2) ** (group.exponent / 2);
    }
    case 'mixed-film': {
      const natural = group.warmerFrom[k];
      const both = Math.hypot(natural, mean(group.forcedSeries[k]));
      return group.areaM2[k] * (natural + group.roughness[k] * (both - natural));
    }
    case 'radiant':
      return 4 * stefanBoltzmannWPerM2K4 * group.exchangeAreaM2[k] * referenceK ** 3;
    case 'function':
      return group.conductanceWPerK(k, 21, 20, 0);
  }
}
