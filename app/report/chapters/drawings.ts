// The chapters that are a drawing with a sentence: worst week, months, year, load, heat balance.

import { roundedBalance, streams } from '../balance.ts';
import { dateText, dayLabel, monthsOf } from '../calendar.ts';
import { carpet } from '../drawing/carpet.ts';
import { flowPicture, shortNames } from '../drawing/flow-picture.ts';
import { byDuration, type Load, loadPicture } from '../drawing/load-picture.ts';
import { monthPicture } from '../drawing/month-picture.ts';
import { weekPicture } from '../drawing/week-picture.ts';
import { figure } from '../figures.ts';
import { markup } from '../markup.ts';
import type { ChapterMaker } from '../report.ts';
import { sideOfBand, subjectOf } from '../subject.ts';
import { table } from '../table.ts';

export const worstWeek: ChapterMaker = ({ simulation }) => {
  const { findings, hours, side, week } = subjectOf(simulation);
  const worst = side === 'below' ? findings.worstWeekBelow : findings.worstWeekAbove;
  const from = dayLabel(week.firstHour, simulation);
  const sentence =
    side === 'none' || !worst
      ? `No occupied hour lies outside a comfort band. The days around the warmest hour, in ${findings.name}, from ${from}:`
      : `${findings.name} is furthest ${side} its comfort band. Its worst seven days begin on ${dateText(worst.from)}, with ${figure(worst.degreeHours)} of the year’s ${figure(side === 'above' ? findings.degreeHoursAbove : findings.degreeHoursBelow)} K·h ${side}. The band is drawn in occupied hours.`;
  return {
    id: 'worst-week',
    title: side === 'none' ? 'The warmest days' : 'The worst week',
    html: markup`<p>${sentence}</p>\n${weekPicture({ room: hours, outdoorC: simulation.outdoorC, ...week, hours: simulation.hours, year: simulation.year })}`,
  };
};

export const months: ChapterMaker = ({ simulation }) => {
  const { building } = simulation.findings;
  const hoursAbove = monthsOf(simulation.hours).map(({ firstHour, endHour }) => {
    let count = 0;
    for (const room of simulation.rooms)
      for (let h = firstHour; h < endHour; h++) if (sideOfBand(room, h) === 1) count++;
    return count;
  });
  return {
    id: 'months',
    title: 'Month by month',
    html: monthPicture({
      hours: simulation.hours,
      heatingKWh: building.heatingByMonthKWh,
      coolingKWh: building.coolingByMonthKWh,
      hoursAbove,
    }),
  };
};

export const year: ChapterMaker = ({ simulation }) => {
  const { hours, side, week } = subjectOf(simulation);
  const drawn = carpet(hours, simulation.hours, {
    ...week,
    name: side === 'none' ? '' : 'worst week',
  });
  if (!drawn) return null;
  return {
    id: 'year',
    title: `The year in ${hours.name}`,
    html: markup`<p>A day across, an hour upward. Hours when nobody is in are coloured too, but not counted.</p>\n${drawn}`,
  };
};

export const load: ChapterMaker = ({ simulation }) => {
  const total = (of: 'heatingW' | 'coolingW') => {
    const sum = new Float64Array(simulation.hours);
    for (const room of simulation.rooms) for (let h = 0; h < sum.length; h++) sum[h] += room[of][h];
    return byDuration(sum);
  };
  const loads: Load[] = [
    { name: 'Heating' as const, sortedW: total('heatingW') },
    { name: 'Cooling' as const, sortedW: total('coolingW') },
  ].filter(({ sortedW }) => sortedW[0] > 0);
  if (loads.length === 0) return null;
  return {
    id: 'load',
    title: 'Load duration',
    html: markup`<p>In how many hours of the year a power was reached or passed, whole building. A power that is cut off by a heater’s limit is not the need.</p>\n${loadPicture(loads, simulation.hours)}`,
  };
};

export const balance: ChapterMaker = ({ simulation }) => {
  const { findings } = simulation;
  const whole = roundedBalance(findings.building.balanceKWh);
  const rows = findings.rooms.map(({ name, balanceKWh }) => ({
    name,
    ...roundedBalance(balanceKWh),
  }));
  const all = rows.length > 1 ? [...rows, { name: 'Building', ...whole }] : rows;
  const shown = streams.filter((key) => all.some((row) => row[key] !== 0));
  return {
    id: 'balance',
    title: 'Heat balance',
    html: markup`${flowPicture(whole)}
${table<(typeof all)[number]>(
  [
    { head: 'kWh', of: (row) => row.name },
    ...shown.map((key) => ({ head: shortNames[key], of: (row: (typeof all)[number]) => row[key] })),
  ],
  all,
  rows.length > 1 ? 1 : 0,
)}<p class="note">Heat into the room over the year; what leaves is negative, and so is what the fabric took up. Each line adds up to nought. Every figure is rounded so that it does, and may differ by 1 kWh from the same one rounded by itself.</p>\n`,
  };
};
