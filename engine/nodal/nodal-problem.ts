// A nodal model, already checked, as the solver's Problem.
import type { NumberTable } from '../../weather/index.ts';
import type { LinkGroup, Meter, Plant, Problem, Series, Start } from '../network/index.ts';
import { columnSeries } from './columns.ts';
import type { Driven, NodalModel } from './schema.ts';

type Link = NodalModel['links'][number];

/** @param table the model's table; null only where the model names no column */
export function nodalProblem(model: NodalModel, table: NumberTable | null): Problem {
  const { time } = model;
  const number = new Map(model.nodes.map((node, i) => [node.id, i]));
  const nodeOf = (id: string): number => number.get(id) ?? -1; // the solver's check names a −1
  const series: Series[] = [];
  const known = new Map<string, number>();
  const seriesOf = (value: Driven): number => {
    const key = typeof value === 'number' ? String(value) : `column ${value.column}`;
    const found = known.get(key);
    if (found !== undefined) return found;
    if (typeof value === 'number')
      series.push({
        name: key,
        hold: 'step',
        values: new Float64Array(time.stepCount).fill(value),
      });
    else if (table) series.push(columnSeries(model, table, value.column));
    else throw new Error('the parser let a column without a table pass');
    known.set(key, series.length - 1);
    return series.length - 1;
  };
  const columnOf = (column: string | undefined) => seriesOf(column === undefined ? 1 : { column });
  const boundarySeries = Int32Array.from(model.nodes, (node) =>
    'boundaryC' in node ? seriesOf(node.boundaryC) : -1,
  );
  const directed = model.directedLinks;
  const links = linkGroups(model.links, nodeOf, seriesOf);
  const network: Problem['network'] = {
    nodeNames: model.nodes.map((node) => node.name ?? node.id),
    capacityJPerK: Float64Array.from(model.nodes, (node) =>
      'capacityJPerK' in node ? node.capacityJPerK : 0,
    ),
    boundarySeries,
    links,
    enclosures: [],
    directed: {
      from: Int32Array.from(directed, (link) => nodeOf(link.from)),
      to: Int32Array.from(directed, (link) => nodeOf(link.to)),
      rateWPerK: Float64Array.from(
        directed,
        (link) => link.massFlowKgPerS * link.specificHeatJPerKgK,
      ),
      series: Int32Array.from(directed, (link) =>
        link.column === undefined ? -1 : columnOf(link.column),
      ),
    },
    sources: {
      node: Int32Array.from(model.sources, (source) => nodeOf(source.node)),
      factor: Float64Array.from(model.sources, (source) => source.powerW),
      series: Int32Array.from(model.sources, (source) => columnOf(source.column)),
    },
    plants: model.controls.map(
      (control): Plant => ({
        name: control.name ?? control.id,
        kind: control.kind,
        sensorNodes: Int32Array.of(nodeOf(control.sensor)),
        sensorWeights: Float64Array.of(1),
        deliveryNodes: Int32Array.of(nodeOf(control.node)),
        deliveryShares: Float64Array.of(1),
        setPointSeries: seriesOf(control.setPointC),
        maxSeries: seriesOf(control.maxW ?? Number.POSITIVE_INFINITY),
        bandK: control.bandK,
      }),
    ),
  };
  return {
    network,
    stepS: time.stepS,
    stepCount: time.stepCount,
    series,
    start: startOf(model),
    stepsPerRecord: time.stepsPerRecord,
    recordNodes: Int32Array.from(model.nodes.keys()),
    meters: metersOf(model, links),
  };
}

/** `steady` repeats nothing: one step is the whole span, so the march begins in its steady state. */
function startOf(model: NodalModel): Start {
  if (model.time.start === 'steady')
    return { kind: 'periodic', spanSteps: 1, toleranceK: Number.POSITIVE_INFINITY, maxPasses: 0 };
  return {
    kind: 'temperatures',
    tempC: Float64Array.from(model.nodes, (node) => ('startC' in node ? (node.startC ?? 20) : 20)),
  };
}

/** Which group and place each link of the file gets; groups without links stay out. */
function linkGroups(
  links: readonly Link[],
  nodeOf: (id: string) => number,
  seriesOf: (value: Driven) => number,
): LinkGroup[] {
  const ends = (list: readonly Link[]) => ({
    from: Int32Array.from(list, (link) => nodeOf(link.from)),
    to: Int32Array.from(list, (link) => nodeOf(link.to)),
  });
  const groups: LinkGroup[] = [];
  for (const [name, list] of sorted(links)) {
    if (name === 'constant')
      groups.push({
        law: 'constant',
        ...ends(list),
        conductanceWPerK: Float64Array.from(list, (link) =>
          'conductanceWPerK' in link && typeof link.conductanceWPerK === 'number'
            ? link.conductanceWPerK
            : 0,
        ),
      });
    else if (name === 'scaled')
      groups.push({
        law: 'scaled',
        ...ends(list),
        conductanceWPerK: new Float64Array(list.length).fill(1),
        series: Int32Array.from(list, (link) =>
          'conductanceWPerK' in link ? seriesOf(link.conductanceWPerK) : 0,
        ),
      });
    else if (name === 'radiant')
      groups.push({
        law: 'radiant',
        ...ends(list),
        exchangeAreaM2: Float64Array.from(list, (link) =>
          'exchangeAreaM2' in link ? link.exchangeAreaM2 : 0,
        ),
      });
    else
      groups.push({
        law: 'buoyant',
        ...ends(list),
        warmerFrom: Float64Array.from(list, (link) =>
          'buoyantWPerK' in link ? link.buoyantWPerK : 0,
        ),
        coolerFrom: Float64Array.from(list, (link) =>
          'buoyantWPerK' in link ? (link.coolerFromWPerK ?? link.buoyantWPerK) : 0,
        ),
        exponent: Number(name.slice('buoyant '.length)),
        softeningK2: 1e-6,
        baseSeries: new Int32Array(list.length).fill(-1),
        baseWPerK: new Float64Array(list.length),
      });
  }
  return groups;
}

/** Links by law, in the order of the file; buoyant ones by exponent too. */
function sorted(links: readonly Link[]): Map<string, Link[]> {
  const groups = new Map<string, Link[]>();
  for (const link of links) {
    const name = lawOf(link);
    groups.set(name, [...(groups.get(name) ?? []), link]);
  }
  return groups;
}

function lawOf(link: Link): string {
  if ('conductanceWPerK' in link)
    return typeof link.conductanceWPerK === 'number' ? 'constant' : 'scaled';
  if ('exchangeAreaM2' in link) return 'radiant';
  return `buoyant ${link.exponent}`;
}

/** One meter a link, a flow and a control, in the order of the file. */
function metersOf(model: NodalModel, groups: readonly LinkGroup[]): Meter[] {
  const place = new Map<Link, { group: number; index: number }>();
  [...sorted(model.links).values()].forEach((list, group) => {
    list.forEach((link, index) => {
      place.set(link, { group, index });
    });
  });
  if (groups.length !== sorted(model.links).size) throw new Error('a group of links has no meter');
  const label = (link: { name?: string | undefined; from: string; to: string }) =>
    link.name ?? `${link.from} to ${link.to}`;
  return [
    ...model.links.map((link): Meter => {
      const at = place.get(link);
      if (!at) throw new Error('a link is in no group');
      return { name: label(link), terms: [{ sign: 1, of: { kind: 'link', ...at } }] };
    }),
    ...model.directedLinks.map(
      (link, index): Meter => ({
        name: label(link),
        terms: [{ sign: 1, of: { kind: 'directed', index } }],
      }),
    ),
    ...model.controls.map(
      (control, index): Meter => ({
        name: control.name ?? control.id,
        terms: [{ sign: 1, of: { kind: 'plant', index } }],
      }),
    ),
  ];
}
