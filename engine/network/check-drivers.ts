// Values of a problem: capacities, conductances, exchange areas and the drivers they are scaled by.

import type { Breach } from './check.ts';
import type { LinkGroup, Problem } from './problem.ts';

/** Enclosure exchange areas may differ from their mirror image by this share, from rounding. */
const mirrorShare = 1e-9;

/** Columns that must be 0 or more and finite. */
function amounts(group: LinkGroup): [string, Float64Array][] {
  switch (group.law) {
    case 'constant':
    case 'scaled':
      return [['conductance', group.conductanceWPerK]];
    case 'buoyant':
      return [
        ['warmer coefficient', group.warmerFrom],
        ['cooler coefficient', group.coolerFrom],
        ['base conductance', group.baseWPerK],
      ];
    case 'mixed-film':
      return [
        ['area', group.areaM2],
        ['warmer coefficient', group.warmerFrom],
        ['cooler coefficient', group.coolerFrom],
        ['roughness', group.roughness],
      ];
    case 'radiant':
      return [['exchange area', group.exchangeAreaM2]];
    case 'function':
      return [];
    default:
      return group satisfies never;
  }
}

/** Breaches of values: NaN, negative, asymmetric; series that scale a conductance must not be negative. */
export function checkDrivers(problem: Problem): Breach[] {
  const { network, series } = problem;
  const names = network.nodeNames;
  const breaches: Breach[] = [];
  const say = (text: string, nodes: readonly string[] = []) => breaches.push({ text, nodes });

  // Set-points and greatest powers may be infinite; what drives flows may not.
  const finite = new Set<number>([
    ...network.boundarySeries,
    ...network.sources.series,
    ...network.directed.series,
  ]);
  const scaling = new Set<number>(network.directed.series);
  for (const group of network.links) {
    if (group.law === 'scaled') for (const s of group.series) scaling.add(s);
    if (group.law === 'buoyant') for (const s of group.baseSeries) scaling.add(s);
    if (group.law === 'mixed-film') for (const s of group.forcedSeries) scaling.add(s);
  }
  series.forEach((s, i) => {
    const infinite = !finite.has(i) && !scaling.has(i);
    const least = scaling.has(i) ? 0 : -Infinity;
    const bad = s.values.findIndex(
      (v) => !(infinite ? !Number.isNaN(v) : Number.isFinite(v)) || v < least,
    );
    if (bad >= 0) {
      const want = least === 0 ? '0 or more' : 'a number';
      say(`series ${s.name}: ${s.values[bad]} at step ${bad}, expected ${want}`);
    }
  });
  names.forEach((name, i) => {
    if (network.boundarySeries[i] >= 0) return;
    const c = network.capacityJPerK[i];
    if (!(c >= 0 && c < Infinity)) say(`${name}: capacity ${c} J/K, expected 0 or more`, [name]);
  });
  network.links.forEach((group, g) => {
    for (const [what, column] of amounts(group)) {
      column.forEach((v, k) => {
        if (v >= 0 && v < Infinity) return;
        const ends = [names[group.from[k]], names[group.to[k]]];
        say(
          `links ${g} (${group.law}), ${ends.join(' to ')}: ${what} ${v}, expected 0 or more`,
          ends,
        );
      });
    }
    if (group.law === 'mixed-film' || group.law === 'buoyant') {
      if (!(group.exponent >= 0 && group.exponent <= 3))
        say(`links ${g}: exponent ${group.exponent}`);
    }
    if (group.law === 'buoyant' && !(group.softeningK2 >= 0)) {
      say(`links ${g}: softening ${group.softeningK2} K²`);
    }
  });
  network.directed.rateWPerK.forEach((v, k) => {
    if (v >= 0 && v < Infinity) return;
    const ends = [names[network.directed.from[k]], names[network.directed.to[k]]];
    say(`directed link ${ends.join(' to ')}: rate ${v} W/K, expected 0 or more`, ends);
  });
  network.sources.factor.forEach((v, k) => {
    const name = names[network.sources.node[k]];
    if (!Number.isFinite(v)) say(`source at ${name}: factor ${v}`, [name]);
  });
  for (const e of network.enclosures) {
    const n = e.nodes.length;
    const largest = e.exchangeAreaM2.reduce(
      (m, v, k) => (k % (n + 1) === 0 ? m : Math.max(m, v)),
      0,
    );
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < i; j++) {
        const a = e.exchangeAreaM2[i * n + j];
        const b = e.exchangeAreaM2[j * n + i];
        const pair = [names[e.nodes[i]], names[e.nodes[j]]];
        if (!(a >= -mirrorShare * largest && a < Infinity)) {
          say(`enclosure ${e.name}, ${pair.join(' to ')}: exchange area ${a} m²`, pair);
        } else if (!(Math.abs(a - b) <= mirrorShare * largest)) {
          say(
            `enclosure ${e.name}, ${pair.join(' to ')}: ${a} m² one way, ${b} m² the other`,
            pair,
          );
        }
      }
    }
  }
  return breaches;
}
