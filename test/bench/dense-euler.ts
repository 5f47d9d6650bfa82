// The straightforward program to measure against: dense implicit Euler with ml-matrix, one LU a step,
// film coefficients from the state before. For one room of the family with plant; nothing is eliminated.

import { LuDecomposition, Matrix } from 'ml-matrix';
import type { Problem } from '../../engine/network/index.ts';

export interface DenseRun {
  readonly heatingKWh: number;
  readonly coolingKWh: number;
  readonly steps: number;
}

/** @param steps how many of the problem's steps are taken, from the first */
export function denseEuler(problem: Problem, steps: number): DenseRun {
  const { network, stepS, series } = problem;
  const n = network.nodeNames.length;
  const place = new Int32Array(n).fill(-1);
  let size = 0;
  for (let i = 0; i < n; i++) if (network.boundarySeries[i] < 0) place[i] = size++;
  const tempC = problem.start.kind === 'temperatures' ? Float64Array.from(problem.start.tempC) : [];
  const [heater, chiller] = network.plants;
  const air = heater.sensorNodes[0];
  let heatingJ = 0;
  let coolingJ = 0;
  for (let k = 0; k < steps; k++) {
    for (let i = 0; i < n; i++) {
      if (place[i] < 0) tempC[i] = series[network.boundarySeries[i]].values[k];
    }
    const a = Matrix.zeros(size, size);
    const b = Matrix.zeros(size, 2); // the drivers, and 1 W into the air
    const put = (i: number, j: number, g: number) => {
      if (place[i] < 0) return;
      a.set(place[i], place[i], a.get(place[i], place[i]) + g);
      if (place[j] >= 0) a.set(place[i], place[j], a.get(place[i], place[j]) - g);
      else b.set(place[i], 0, b.get(place[i], 0) + g * tempC[j]);
    };
    for (let i = 0; i < n; i++) {
      if (place[i] < 0) continue;
      const c = network.capacityJPerK[i] / stepS;
      a.set(place[i], place[i], a.get(place[i], place[i]) + c);
      b.set(place[i], 0, b.get(place[i], 0) + c * tempC[i]);
    }
    for (const group of network.links) {
      for (let l = 0; l < group.from.length; l++) {
        const [i, j] = [group.from[l], group.to[l]];
        let g = 0;
        if (group.law === 'constant') g = group.conductanceWPerK[l];
        else if (group.law === 'scaled') {
          g = group.conductanceWPerK[l] * series[group.series[l]].values[k];
        } else if (group.law === 'buoyant') {
          const z = (tempC[i] - tempC[j]) ** 2 + group.softeningK2;
          const s = group.baseSeries[l];
          const base = s < 0 ? 0 : group.baseWPerK[l] * series[s].values[k];
          g = base + group.warmerFrom[l] * z ** (group.exponent / 2);
        } else throw new Error(`the family has no ${group.law} links`);
        put(i, j, g);
        put(j, i, g);
      }
    }
    const { sources } = network;
    sources.node.forEach((node, s) => {
      const watts = sources.factor[s] * series[sources.series[s]].values[k];
      b.set(place[node], 0, b.get(place[node], 0) + watts);
    });
    b.set(place[air], 1, 1);
    const x = new LuDecomposition(a).solve(b);
    const floating = x.get(place[air], 0);
    const perW = x.get(place[air], 1);
    const at = (s: number) => series[s].values[k];
    const heat = Math.min(at(heater.maxSeries), (at(heater.setPointSeries) - floating) / perW);
    const cool = Math.min(at(chiller.maxSeries), (floating - at(chiller.setPointSeries)) / perW);
    const watts = Math.max(0, heat) - Math.max(0, cool);
    heatingJ += Math.max(0, heat) * stepS;
    coolingJ += Math.max(0, cool) * stepS;
    for (let i = 0; i < n; i++) {
      if (place[i] >= 0) tempC[i] = x.get(place[i], 0) + watts * x.get(place[i], 1);
    }
  }
  return { heatingKWh: heatingJ / 3.6e6, coolingKWh: coolingJ / 3.6e6, steps };
}
