// Month by month: heating (and cooling) stand on the month edge, hours above the band hang below it.

import { monthsOf } from '../calendar.ts';
import { figure } from '../figures.ts';
import type { Markup } from '../markup.ts';
import { edgeBelow, gridAtLeft } from './edge.ts';
import { linear, roundTicks } from './scale.ts';
import { box, drawing, hatch, hatched, path, px, sheet, words } from './svg.ts';

export interface MonthFigures {
  readonly hours: number;
  readonly heatingKWh: readonly number[];
  readonly coolingKWh: readonly number[];
  /** Occupied hours above the band, all rooms. */
  readonly hoursAbove: readonly number[];
}

const kilowattHours = { name: 'kWh', kWh: 1, decimals: 0 } as const;
const megawattHours = { name: 'MWh', kWh: 1000, decimals: 1 } as const;

const top = 26;
const standing = 150;
const hanging = 84;

export function monthPicture(of: MonthFigures): Markup {
  const months = monthsOf(of.hours);
  const x = linear(0, of.hours, sheet.left, sheet.right);
  const hasCooling = of.coolingKWh.some((kWh) => kWh >= 0.5);
  const most = Math.max(...of.heatingKWh, ...of.coolingKWh, 1);
  // Two bars a month leave room for three characters each.
  const unit = most >= (hasCooling ? 1000 : 10_000) ? megawattHours : kilowattHours;
  const ticks = roundTicks(0, most / unit.kWh, 3);
  const foot = top + standing;
  const y = linear(0, ticks.at(-1) ?? 1, foot, top);
  const wide = hasCooling ? 19 : 34;
  const middle = (i: number) => x(((months[i]?.firstHour ?? 0) + (months[i]?.endHour ?? 0)) / 2);
  const bars = (values: readonly number[], shift: number, kind: string) =>
    values.flatMap((kWh, i) => {
      const text = figure(kWh / unit.kWh, unit.decimals);
      if (!/[1-9]/.test(text)) return [];
      const left = middle(i) + shift - wide / 2;
      const head = y(kWh / unit.kWh);
      return [
        box(left, head, wide, foot - head, kind),
        words(left + wide / 2, head - 5, text, 'middle strong small'),
      ];
    });
  const ceiling = foot + 25;
  const mostAbove = Math.max(...of.hoursAbove, 1);
  const fall = linear(0, mostAbove, 0, hanging - 30);
  const hang = of.hoursAbove.flatMap((hours, i) => {
    if (hours < 0.5) return [];
    const left = middle(i) - wide / 2;
    const d = `M${px(left)} ${px(ceiling)}h${wide}v${px(fall(hours))}h-${wide}Z`;
    return [
      path(d, 'bar-above'),
      hatched(d, 'hatch-months'),
      words(middle(i), ceiling + fall(hours) + 14, `${figure(hours)} h`, 'middle strong small'),
    ];
  });
  const sum = (values: readonly number[]) => figure(values.reduce((a, b) => a + b, 0));
  const isNone = hang.length === 0;
  const shift = hasCooling ? wide / 2 + 1 : 0;
  const equivalent =
    `By month: heating ${sum(of.heatingKWh)} kWh in the year${hasCooling ? `, cooling ${sum(of.coolingKWh)} kWh` : ''}, ` +
    `${sum(of.hoursAbove)} occupied hours above the band in all rooms.`;
  return drawing(ceiling + (isNone ? 24 : hanging), equivalent, [
    hatch('hatch-months'),
    gridAtLeft(ticks, y, unit.name),
    ...bars(of.heatingKWh, -shift, 'bar-heat'),
    ...bars(of.coolingKWh, shift, 'bar-cool'),
    words(sheet.right + 8, top + 12, 'Heating', 'room-words'),
    ...(hasCooling ? [words(sheet.right + 8, top + 28, 'Cooling', 'cool-words')] : []),
    edgeBelow(
      months.map(({ name, firstHour, endHour }) => ({
        from: firstHour,
        to: endHour,
        label: name.slice(0, 3),
      })),
      x,
      foot,
    ),
    ...hang,
    ...(isNone
      ? [words(sheet.left, ceiling + 14, 'No occupied hour lies above the band.')]
      : [
          words(sheet.right + 8, ceiling + 14, 'Above the band', 'room-words'),
          words(sheet.right + 8, ceiling + 29, 'all rooms'),
        ]),
  ]);
}
