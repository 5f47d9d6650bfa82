// Drivers held at their means for good: the surroundings in which a decay is a sum of exponentials.
import {
  type LinkGroup,
  type Problem,
  type Series,
  type Start,
  seriesMean,
} from '../network/index.ts';

/** The problem for `count` steps with every driver at its mean over steps `from` to `to`. */
export function heldProblem(
  problem: Problem,
  from: number,
  to: number,
  count: number,
  start: Start,
): Problem {
  const level = (series: Series): Series => ({
    name: series.name,
    hold: 'step',
    values: new Float64Array(count).fill(seriesMean(series, from, to)),
  });
  const middle = Math.floor((from + to) / 2);
  const held = (group: LinkGroup): LinkGroup => {
    if (group.law !== 'function') return group;
    const { conductanceWPerK } = group;
    return {
      ...group,
      conductanceWPerK: (k, fromC, toC) => conductanceWPerK(k, fromC, toC, middle),
    };
  };
  return {
    ...problem,
    stepCount: count,
    start,
    series: problem.series.map(level),
    network: { ...problem.network, links: problem.network.links.map(held) },
  };
}
