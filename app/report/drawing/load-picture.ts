// Load duration: in how many hours of the year a heating power was reached or passed.

import { figure } from '../figures.ts';
import type { Markup } from '../markup.ts';
import { edgeBelow, gridAtLeft } from './edge.ts';
import { linear, roundTicks } from './scale.ts';
import { apart, drawing, path, px, sheet, words } from './svg.ts';

const top = 22;
const height = 150;

/** Largest first: value i was reached or passed in i + 1 hours. */
export const byDuration = (powerW: Float64Array): Float64Array =>
  Float64Array.from(powerW).sort().reverse();

/** Hours with at least that power. */
export const hoursAtLeast = (sorted: Float64Array, powerW: number): number => {
  const at = sorted.findIndex((value) => value < powerW);
  return at < 0 ? sorted.length : at;
};

export interface Load {
  readonly name: 'Heating' | 'Cooling';
  /** By duration. */
  readonly sortedW: Float64Array;
}

/** Points of the falling line: every hour at first, where it is steep, then sparser. */
function points(sorted: Float64Array, x: (h: number) => number, y: (kW: number) => number): string {
  let d = `M${px(x(0))} ${px(y(sorted[0] / 1000))}`;
  for (let h = 0; h < sorted.length; h += h < 48 ? 1 : 12)
    d += `L${px(x(h + 0.5))} ${px(y(sorted[h] / 1000))}`;
  return `${d}L${px(x(sorted.length))} ${px(y((sorted.at(-1) ?? 0) / 1000))}`;
}

export function loadPicture(loads: readonly Load[], hours: number): Markup {
  const x = linear(0, hours, sheet.left, sheet.right);
  const peakKW = Math.max(...loads.map(({ sortedW }) => sortedW[0])) / 1000;
  const ticks = roundTicks(0, Math.max(peakKW, 0.1), 4);
  const y = linear(0, ticks.at(-1) ?? 1, top + height, top);
  const labels = apart(
    loads.map(({ sortedW }) => y(sortedW[0] / 1000) - 5),
    17,
  );
  const curves = loads.map(({ name, sortedW }, i) => {
    const kind = name === 'Heating' ? 'heat' : 'cool';
    const d = points(sortedW, x, y);
    const floor = px(top + height);
    const half = sortedW[0] / 2;
    const halfHours = hoursAtLeast(sortedW, half);
    const label = `${name}: at most ${figure(sortedW[0] / 1000, 1)} kW, half of that or more in ${figure(halfHours)} h`;
    const place = `cx="${px(x(halfHours))}" cy="${px(y(half / 1000))}"`;
    const ring: Markup = { markup: `<circle ${place} r="3.5" class="ring"/>` };
    return [
      path(`${d}V${floor}H${sheet.left}Z`, `under-${kind}`),
      path(d, `load-${kind}`),
      ring,
      words(sheet.left + 12, labels[i] ?? top, label, 'strong'),
    ];
  });
  const kilohours = Array.from({ length: Math.ceil(hours / 1000) }, (_, k) => ({
    from: k * 1000,
    to: Math.min(hours, k * 1000 + 1000),
    label: k === 0 ? '0' : `${figure(k * 1000)} h`,
  }));
  const equivalent = loads
    .map(({ name, sortedW }) => {
      const needed = hoursAtLeast(sortedW, 1);
      return `${name}: needed in ${figure(needed)} of ${figure(hours)} hours, at most ${figure(sortedW[0] / 1000, 1)} kW, half of that or more in ${figure(hoursAtLeast(sortedW, sortedW[0] / 2))} hours.`;
    })
    .join(' ');
  return drawing(top + height + 26, equivalent, [
    gridAtLeft(ticks, y, 'kW'),
    ...curves.flat(),
    edgeBelow(kilohours, x, top + height, 'start'),
  ]);
}
