// Heat into a building and out of it, as streams to one scale: in from the left, largest first, the
// building as an upright bar, out or stored at the right.

import { type Stream, streams } from '../balance.ts';
import { figure } from '../figures.ts';
import { type Markup, markup } from '../markup.ts';
import { box, drawing, path, px, sheet, words } from './svg.ts';

const names: Readonly<Record<Stream, string>> = {
  solar: 'Sun through glass',
  gains: 'People and equipment',
  heating: 'Heating',
  cooling: 'Cooling',
  opaque: 'Walls, roofs and floors',
  glazing: 'Window glass',
  ground: 'Ground',
  infiltration: 'Air through gaps',
  ventilation: 'Ventilation',
  rooms: 'Other rooms',
  storage: 'Given back by fabric',
  residual: 'Does not add up',
};

/** For the heads of a table. */
export const shortNames: Readonly<Record<Stream, string>> = {
  ...names,
  solar: 'Sun',
  gains: 'Gains',
  opaque: 'Opaque',
  glazing: 'Glass',
  infiltration: 'Gaps',
  ventilation: 'Vent.',
  rooms: 'Rooms',
  storage: 'Stored',
  residual: 'Rest',
};

const nameOf = (key: Stream, isOut: boolean) =>
  key === 'storage' && isOut ? 'Taken up by fabric' : names[key];

const kindOf = (key: Stream, isOut: boolean) => {
  if (key === 'storage' || key === 'residual') return 'stream-stored';
  if (key === 'solar') return 'stream-sun';
  return isOut ? 'stream-out' : 'stream-in';
};

const barHeight = 150;
const barX = (sheet.left + sheet.right) / 2 - 10;
const barWidth = 20;
const reach = 120;
const gap = 9;
const labelPitch = 17;
const top = 40;

interface Laid {
  readonly key: Stream;
  readonly shown: number;
  readonly width: number;
  readonly outerY: number;
  readonly innerY: number;
  readonly labelY: number;
}

function laySide(parts: readonly { key: Stream; shown: number }[], sum: number): Laid[] {
  const sorted = [...parts].sort((a, b) => b.shown - a.shown);
  const perUnit = sum > 0 ? barHeight / sum : 0;
  let outer = top - (gap * Math.max(0, sorted.length - 1)) / 2;
  let inner = top;
  let lastLabel = -Infinity;
  return sorted.map(({ key, shown }) => {
    const width = shown * perUnit;
    const labelY = Math.max(outer + width / 2, lastLabel + labelPitch);
    const stream = { key, shown, width, outerY: labelY - width / 2, innerY: inner, labelY };
    outer = stream.outerY + width + gap;
    inner += width;
    lastLabel = labelY;
    return stream;
  });
}

/** Outline of a stream: two level curves from its outer end to the bar. */
function outline(x0: number, y0: number, x1: number, y1: number, width: number): string {
  const mid = px((x0 + x1) / 2);
  const [a, b, c, d] = [y0, y1, y1 + width, y0 + width].map(px);
  return `M${px(x0)} ${a}C${mid} ${a} ${mid} ${b} ${px(x1)} ${b}V${c}C${mid} ${c} ${mid} ${d} ${px(x0)} ${d}Z`;
}

export type WholeBalance = Readonly<Record<Stream, number>>;

/** `balance` is in whole kWh and adds up to nought. */
export function flowPicture(balance: WholeBalance): Markup {
  const parts = streams.map((key) => ({ key, shown: balance[key] }));
  const into = parts.filter(({ shown }) => shown > 0);
  const out = parts
    .filter(({ shown }) => shown < 0)
    .map(({ key, shown }) => ({ key, shown: -shown }));
  const sum = into.reduce((total, { shown }) => total + shown, 0);
  const sides = [laySide(into, sum), laySide(out, sum)] as const;
  const all = sides.flat();
  const lift = Math.max(0, top - 8 - Math.min(...all.map((s) => Math.min(s.outerY, s.labelY - 8))));
  const bottom = Math.max(
    top + barHeight + 4,
    ...all.map((s) => Math.max(s.outerY + s.width, s.labelY + 8)),
  );
  const streamsOf = (side: readonly Laid[], isOut: boolean) => {
    const inner = isOut ? barX + barWidth : barX;
    const outer = isOut ? inner + reach : inner - reach;
    const turn = isOut ? 1 : -1;
    const align = isOut ? '' : 'end ';
    return side.map(({ key, shown, width, outerY, innerY, labelY }) => [
      path(outline(outer, outerY, inner, innerY, Math.max(0.7, width)), kindOf(key, isOut)),
      words(outer + turn * 8, labelY + 4, figure(shown), `${align}strong`),
      words(outer + turn * 54, labelY + 4, nameOf(key, isOut), align),
    ]);
  };
  const list = (side: readonly Laid[], isOut: boolean) =>
    side.map(({ key, shown }) => `${nameOf(key, isOut)} ${figure(shown)} kWh`).join(', ');
  const equivalent = `In: ${list(sides[0], false)}. Out or stored: ${list(sides[1], true)}. Both sides: ${figure(sum)} kWh.`;
  return drawing(bottom + lift + 6, equivalent, [
    words(barX - reach - 8, 14, 'In over the year, kWh', 'end'),
    words(barX + barWidth + reach + 8, 14, 'Out, or stored, kWh'),
    markup`<g transform="translate(0 ${px(lift)})">${streamsOf(sides[0], false)}${streamsOf(sides[1], true)}${box(barX, top, barWidth, barHeight, 'bar-building')}${words(barX + barWidth / 2, top - 8, figure(sum), 'middle strong')}</g>`,
  ]);
}
