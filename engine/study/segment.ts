// Parts of an assembled year, and the same network with other plant: what lets a study run many cases
// without assembling anew. Arrays are shared with the year, never copied.
import type { LinkGroup, Plant, Problem, Series, Start } from '../network/index.ts';

/** Steps `from` to `from + count` of a problem, as a problem of its own. */
export function segmentOf(problem: Problem, from: number, count: number, start: Start): Problem {
  if (from < 0 || count < 1 || from + count > problem.stepCount)
    throw new Error(
      `steps ${from} to ${from + count} lie outside the ${problem.stepCount} there are`,
    );
  const { network } = problem;
  return {
    ...problem,
    stepCount: count,
    start,
    series: problem.series.map((series) => cutSeries(series, from, count)),
    network: { ...network, links: network.links.map((group) => shifted(group, from)) },
  };
}

function cutSeries({ name, hold, values }: Series, from: number, count: number): Series {
  if (hold === 'step') return { name, hold, values: values.subarray(from, from + count) };
  if (hold === 'linear') return { name, hold, values: values.subarray(from, from + count + 1) };
  return { name, hold, values: values.subarray(2 * from, 2 * (from + count)) };
}

/** Laws that read their own hourly values count steps from the start of the year. */
function shifted(group: LinkGroup, from: number): LinkGroup {
  if (group.law !== 'function' || from === 0) return group;
  const { conductanceWPerK } = group;
  return {
    ...group,
    conductanceWPerK: (k, fromC, toC, step) => conductanceWPerK(k, fromC, toC, step + from),
  };
}

/** What becomes of one plant. */
export interface PlantChange {
  /** Greatest power; where the plant is not available it stays 0. */
  readonly maxW?: number;
  /** One set-point for good; −Infinity switches a heater off, Infinity a chiller. */
  readonly setPointC?: number;
}

/** The same problem with some plants changed, by their place in the network. */
export function withPlants(problem: Problem, changes: ReadonlyMap<number, PlantChange>): Problem {
  const series = [...problem.series];
  const add = (name: string, values: Float64Array, hold: Series['hold']) =>
    series.push({ name, hold, values }) - 1;
  const plants = problem.network.plants.map((plant, p): Plant => {
    const change = changes.get(p);
    if (!change) return plant;
    const { maxW, setPointC } = change;
    const available = problem.series[plant.maxSeries].values;
    return {
      ...plant,
      maxSeries:
        maxW === undefined
          ? plant.maxSeries
          : add(
              `${plant.name}, power of the study`,
              available.map((w) => (w > 0 ? maxW : 0)),
              'step',
            ),
      setPointSeries:
        setPointC === undefined
          ? plant.setPointSeries
          : add(
              `${plant.name}, set-point of the study`,
              new Float64Array(problem.stepCount).fill(setPointC),
              'step',
            ),
    };
  });
  return { ...problem, series, network: { ...problem.network, plants } };
}
