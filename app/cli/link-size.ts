// A link's conductance for a table: what the law gives at 20 °C, 1 K apart, with the year's mean of
// whatever drives it. A run evaluates the law itself at every step.

import { type LinkGroup, type Problem, seriesMean } from '../../engine/index.ts';

const stefanBoltzmannWPerM2K4 = 5.670374419e-8; // CODATA 2018, exact in the SI of 2019
const referenceK = 293.15;

export function linkSizeWPerK(problem: Problem, group: LinkGroup, k: number): number {
  const mean = (series: number) => (series < 0 ? 0 : seriesMean(problem.series[series]));
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
