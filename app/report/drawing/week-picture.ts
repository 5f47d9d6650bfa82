// One room's week: its operative temperature against its band, with the outside air.

import type { RoomHours } from '../../../engine/index.ts';
import { dayLabel, hourSpan } from '../calendar.ts';
import { figure } from '../figures.ts';
import { type Markup, markup } from '../markup.ts';
import { edgeBelow, gridAtLeft } from './edge.ts';
import { linear, roundTicks } from './scale.ts';
import {
  apart,
  cut,
  drawing,
  hatch,
  hatched,
  path,
  polyline,
  px,
  sheet,
  widthOf,
  words,
} from './svg.ts';

export interface WeekSubject {
  readonly room: RoomHours;
  readonly outdoorC: Float64Array;
  readonly firstHour: number;
  readonly endHour: number;
  readonly hours: number;
  readonly year: number;
}

const bandText = (low: number, high: number) => `Band ${figure(low)} to ${figure(high)} °C`;

const top = 22;
const height = 210;

export function weekPicture(of: WeekSubject): Markup {
  const { room, outdoorC, firstHour, endHour } = of;
  const week = <A extends Float64Array | Uint8Array>(values: A) =>
    Array.from(values.subarray(firstHour, endHour));
  const inside = week(room.operativeC);
  const outside = week(outdoorC);
  const low = week(room.bandLowC);
  const high = week(room.bandHighC);
  const all = [...inside, ...outside, ...low, ...high].filter(Number.isFinite);
  const ticks = roundTicks(Math.min(...all), Math.max(...all), 4);
  const [first = 0, last = 1] = [ticks[0], ticks.at(-1)];
  const y = linear(first, last, top + height, top);
  const x = linear(0, endHour - firstHour, sheet.left, sheet.right);
  const points = (values: readonly number[]) =>
    polyline(values.map((t, i) => [x(i + 0.5), y(t)] as const));

  const occupied = week(room.occupied);
  const isPeopled = (i: number) =>
    occupied[i] === 1 && Number.isFinite(low[i]) && Number.isFinite(high[i]);
  const eachHour = (from: (i: number) => number, to: (i: number) => number) =>
    inside
      .map((_, i) =>
        isPeopled(i) ? `M${px(x(i))} ${px(from(i))}H${px(x(i + 1))}V${px(to(i))}H${px(x(i))}Z` : '',
      )
      .join('');
  const band = eachHour(
    (i) => y(high[i] ?? NaN),
    (i) => y(low[i] ?? NaN),
  );
  const overBand = eachHour(
    () => top,
    (i) => y(high[i] ?? NaN),
  );
  const underBand = eachHour(
    (i) => y(low[i] ?? NaN),
    () => top + height,
  );
  const line = points(inside);
  const closed = (to: number) =>
    `${line}L${px(x(inside.length - 0.5))} ${px(to)}L${px(x(0.5))} ${px(to)}Z`;

  const peak = inside.indexOf(Math.max(...inside));
  const peakText = `${figure(inside[peak] ?? NaN, 1)} °C on ${hourSpan(firstHour + peak, of)}`;
  const leftward = x(peak) + widthOf(peakText) + 8 > sheet.right;
  const peopled = low.findLastIndex((_, i) => isPeopled(i));
  const [lowC = NaN, highC = NaN] = [low[peopled], high[peopled]];
  const labels = [
    { text: cut(room.name, 14), y: y(inside.at(-1) ?? 0), kind: 'room-words' },
    { text: 'Outside air', y: y(outside.at(-1) ?? 0), kind: 'air-words' },
    ...(peopled < 0
      ? []
      : [{ text: bandText(lowC, highC), y: y((lowC + highC) / 2), kind: 'band-words' }]),
  ];
  const heights = apart(
    labels.map((label) => label.y),
    16,
  );
  const units = Array.from({ length: Math.ceil(inside.length / 24) }, (_, d) => ({
    from: d * 24,
    to: Math.min(inside.length, d * 24 + 24),
    label: dayLabel(firstHour + d * 24, of),
  }));
  const equivalent =
    `${room.name}, ${dayLabel(firstHour, of)} to ${dayLabel(endHour - 24, of)}: operative temperature ` +
    `${figure(Math.min(...inside), 1)} to ${figure(Math.max(...inside), 1)} °C, highest ${peakText}; ` +
    `outside air ${figure(Math.min(...outside), 1)} to ${figure(Math.max(...outside), 1)} °C.`;
  return drawing(top + height + 26, equivalent, [
    hatch('hatch-week'),
    markup`<defs><clipPath id="over-band"><path d="${overBand}"/></clipPath><clipPath id="under-band"><path d="${underBand}"/></clipPath></defs>`,
    path(band, 'band'),
    markup`<g clip-path="url(#over-band)">${path(closed(top + height), 'above')}${hatched(closed(top + height), 'hatch-week')}</g>`,
    markup`<g clip-path="url(#under-band)">${path(closed(top), 'below')}</g>`,
    gridAtLeft(ticks, y, '°C'),
    path(points(outside), 'air-line'),
    path(line, 'halo'),
    path(line, 'room-line'),
    markup`<circle cx="${px(x(peak + 0.5))}" cy="${px(y(inside[peak] ?? NaN))}" r="3.5" class="ring"/>`,
    words(
      x(peak + 0.5) + (leftward ? 0 : -4),
      y(inside[peak] ?? NaN) - 9,
      peakText,
      leftward ? 'end strong' : 'strong',
    ),
    ...labels.map(({ text, kind }, i) => words(sheet.right + 8, (heights[i] ?? 0) + 4, text, kind)),
    edgeBelow(units, x, top + height),
  ]);
}
