// Lengths and indices of a problem's arrays.

import type { Breach } from './check.ts';
import type { LinkGroup, MeterTerm, Problem, Series } from './problem.ts';

/** Arrays of a link group that hold one entry a link, by name. */
function columns(group: LinkGroup): [string, ArrayLike<number>][] {
  switch (group.law) {
    case 'constant':
      return [['conductanceWPerK', group.conductanceWPerK]];
    case 'scaled':
      return [
        ['conductanceWPerK', group.conductanceWPerK],
        ['series', group.series],
      ];
    case 'buoyant':
      return [
        ['warmerFrom', group.warmerFrom],
        ['coolerFrom', group.coolerFrom],
        ['baseSeries', group.baseSeries],
        ['baseWPerK', group.baseWPerK],
      ];
    case 'mixed-film':
      return [
        ['areaM2', group.areaM2],
        ['warmerFrom', group.warmerFrom],
        ['coolerFrom', group.coolerFrom],
        ['forcedSeries', group.forcedSeries],
        ['roughness', group.roughness],
      ];
    case 'radiant':
      return [['exchangeAreaM2', group.exchangeAreaM2]];
    case 'function':
      return [];
    default:
      return group satisfies never;
  }
}

/** Breaches of lengths and of node, series, link and plant numbers. */
export function checkIndices(problem: Problem): Breach[] {
  const { network, series, stepCount, start, meters } = problem;
  const n = network.nodeNames.length;
  const breaches: Breach[] = [];
  const say = (text: string, nodes: readonly string[] = []) => breaches.push({ text, nodes });
  const length = (what: string, array: ArrayLike<number>, want: number) => {
    if (array.length !== want) say(`${what}: ${array.length} values, expected ${want}`);
  };
  const within = (what: string, array: ArrayLike<number>, low: number, high: number) => {
    for (let k = 0; k < array.length; k++) {
      if (Number.isInteger(array[k]) && array[k] >= low && array[k] < high) continue;
      say(`${what}: entry ${k} is ${array[k]}, expected ${low} to ${high - 1}`);
    }
  };
  const nodes = (what: string, array: ArrayLike<number>) => within(what, array, 0, n);
  const drivers = (what: string, array: ArrayLike<number>, low = -1) =>
    within(what, array, low, series.length);

  if (!(problem.stepS > 0 && problem.stepS < Infinity)) say(`step of ${problem.stepS} s`);
  if (!(Number.isInteger(stepCount) && stepCount >= 0)) say(`${stepCount} steps`);
  if (!(Number.isInteger(problem.stepsPerRecord) && problem.stepsPerRecord > 0)) {
    say(`${problem.stepsPerRecord} steps a record`);
  }
  length('node capacities', network.capacityJPerK, n);
  length('boundary series', network.boundarySeries, n);
  drivers('boundary series', network.boundarySeries);
  for (const s of series) {
    length(`series ${s.name}`, s.values, seriesLength(s.hold, stepCount));
  }
  network.links.forEach((group, g) => {
    const what = `links ${g} (${group.law})`;
    length(`${what} to`, group.to, group.from.length);
    nodes(`${what} from`, group.from);
    nodes(`${what} to`, group.to);
    for (const [name, column] of columns(group))
      length(`${what} ${name}`, column, group.from.length);
    if (group.law === 'scaled') drivers(`${what} series`, group.series, 0);
    if (group.law === 'buoyant') drivers(`${what} base series`, group.baseSeries);
    if (group.law === 'mixed-film') drivers(`${what} forced series`, group.forcedSeries, 0);
    for (let k = 0; k < group.from.length; k++) {
      if (group.from[k] !== group.to[k]) continue;
      const name = network.nodeNames[group.from[k]] ?? '?';
      say(`${what}: link ${k} joins ${name} to itself`, [name]);
    }
  });
  for (const e of network.enclosures) {
    nodes(`enclosure ${e.name}`, e.nodes);
    length(`enclosure ${e.name} exchange areas`, e.exchangeAreaM2, e.nodes.length ** 2);
    if (new Set(e.nodes).size < e.nodes.length) say(`enclosure ${e.name}: a node stands twice`);
  }
  const { directed, sources } = network;
  nodes('directed links from', directed.from);
  nodes('directed links to', directed.to);
  drivers('directed links series', directed.series);
  length('directed links to', directed.to, directed.from.length);
  length('directed links rate', directed.rateWPerK, directed.from.length);
  length('directed links series', directed.series, directed.from.length);
  nodes('sources', sources.node);
  drivers('sources series', sources.series, 0);
  length('sources factor', sources.factor, sources.node.length);
  length('sources series', sources.series, sources.node.length);
  for (const p of network.plants) {
    nodes(`plant ${p.name} sensor`, p.sensorNodes);
    nodes(`plant ${p.name} delivery`, p.deliveryNodes);
    length(`plant ${p.name} sensor weights`, p.sensorWeights, p.sensorNodes.length);
    length(`plant ${p.name} delivery shares`, p.deliveryShares, p.deliveryNodes.length);
    drivers(`plant ${p.name} series`, [p.setPointSeries, p.maxSeries], 0);
  }
  nodes('recorded nodes', problem.recordNodes);
  for (const meter of meters) {
    meter.terms.forEach((term, k) => {
      if (!isThere(problem, term.of))
        say(`meter ${meter.name}: term ${k} (${term.of.kind}) points nowhere`);
    });
  }
  if (start.kind === 'temperatures') {
    length('start temperatures', start.tempC, n);
    network.boundarySeries.forEach((s, i) => {
      if (s < 0 && !Number.isFinite(start.tempC[i])) {
        say(`${network.nodeNames[i]} starts at ${start.tempC[i]} °C`, [network.nodeNames[i]]);
      }
    });
  } else if (!(start.spanSteps > 0 && start.spanSteps <= stepCount)) {
    say(`start-up over ${start.spanSteps} steps, expected 1 to ${stepCount}`);
  }
  return breaches;
}

function isThere(problem: Problem, of: MeterTerm['of']): boolean {
  const { network } = problem;
  const below = (i: number, n: number | undefined) => Number.isInteger(i) && i >= 0 && i < (n ?? 0);
  switch (of.kind) {
    case 'link':
      return below(of.index, network.links[of.group]?.from.length);
    case 'directed':
      return below(of.index, network.directed.from.length);
    case 'source':
      return below(of.index, network.sources.node.length);
    case 'plant':
      return below(of.index, network.plants.length);
    case 'enclosure':
      return below(of.position, network.enclosures[of.enclosure]?.nodes.length);
    case 'storage':
      return below(of.node, network.nodeNames.length);
    default:
      return of satisfies never;
  }
}

/** How many values a series has by its way of holding them. */
function seriesLength(hold: Series['hold'], stepCount: number): number {
  if (hold === 'ramp') return 2 * stepCount;
  return hold === 'linear' ? stepCount + 1 : stepCount;
}
