// Plants: shares, bounds, and set-points that contradict each other.

import type { Breach } from './check.ts';
import { isPair } from './plant-units.ts';
import type { Problem } from './problem.ts';

const sumSlack = 1e-9;

export function checkPlants(problem: Problem): Breach[] {
  const { network, series } = problem;
  const names = network.nodeNames;
  const breaches: Breach[] = [];
  const isFixed = (v: number) => network.boundarySeries[v] >= 0;
  network.plants.forEach((p, i) => {
    const nodes = [...new Set([...p.sensorNodes, ...p.deliveryNodes])].map((v) => names[v]);
    const say = (text: string) => breaches.push({ text: `plant ${p.name}: ${text}`, nodes });
    const sum = (list: Float64Array) => list.reduce((a, b) => a + b, 0);
    if (!(Math.abs(sum(p.sensorWeights) - 1) <= sumSlack)) {
      say(`sensor weights add up to ${sum(p.sensorWeights)}, expected 1`);
    }
    if (!(Math.abs(sum(p.deliveryShares) - 1) <= sumSlack)) {
      say(`delivery shares add up to ${sum(p.deliveryShares)}, expected 1`);
    }
    if (p.sensorWeights.some((w) => w < 0) || p.deliveryShares.some((w) => w < 0)) {
      say('a negative weight or share');
    }
    if (p.sensorNodes.every(isFixed)) say('the sensor reads boundaries only');
    if (p.deliveryNodes.some(isFixed)) say('delivers to a boundary');
    if (!(p.bandK >= 0 && p.bandK < Infinity)) say(`proportional band of ${p.bandK} K`);
    const most = series[p.maxSeries].values;
    const bad = most.findIndex((v) => !(v >= 0) || (p.bandK > 0 && v === Infinity));
    if (bad >= 0) say(`greatest power ${most[bad]} W at step ${bad}`);
    const set = series[p.setPointSeries].values;
    const off = p.kind === 'heater' ? -Infinity : Infinity;
    const wrong = set.indexOf(-off);
    if (wrong >= 0) say(`set-point ${set[wrong]} at step ${wrong}`);
    for (let j = i + 1; j < network.plants.length; j++) {
      const other = network.plants[j];
      if (!isPair(p, other)) continue;
      const [heater, chiller] = p.kind === 'heater' ? [p, other] : [other, p];
      const heat = series[heater.setPointSeries].values;
      const cool = series[chiller.setPointSeries].values;
      const clash = heat.findIndex((v, k) => v > cool[Math.min(k, cool.length - 1)]);
      if (clash >= 0) {
        say(
          `heats to ${heat[clash]} °C while ${other.name} keeps ${cool[clash]} °C at step ${clash}`,
        );
      }
    }
  });
  return breaches;
}
