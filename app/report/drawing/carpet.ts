// The year as a carpet: a day across, an hour upward, coloured by how warm it is against the band.

import type { RoomHours } from '../../../engine/index.ts';
import { monthsOf } from '../calendar.ts';
import { figure } from '../figures.ts';
import { type Markup, markup } from '../markup.ts';
import { edgeBelow } from './edge.ts';
import { linear } from './scale.ts';
import { box, drawing, hatch, hatched, path, px, sheet, words } from './svg.ts';
import { stepNames, warmSteps } from './warm-step.ts';

const top = 8;
const hourHeight = 6;
const keyWidth = 68.75;
const firstAbove = 5;

/** What the steps have in common, over the first of them. */
const groups = [
  ['below the band', 0],
  ['inside', 3],
  ['above', 5],
] as const;

const keyLeft = (step: number) => sheet.left + step * (keyWidth + 0.75);

/** One path a step: runs of days of the same step, hour by hour. */
function runs(steps: Uint8Array, days: number, wanted: number, x: (day: number) => number): string {
  let d = '';
  for (let hour = 0; hour < 24; hour++) {
    const y = px(top + (23 - hour) * hourHeight);
    for (let day = 0; day < days; day++) {
      if (steps[day * 24 + hour] !== wanted) continue;
      const from = day;
      while (day + 1 < days && steps[(day + 1) * 24 + hour] === wanted) day++;
      d += `M${px(x(from))} ${y}H${px(x(day + 1))}v${hourHeight}H${px(x(from))}Z`;
    }
  }
  return d;
}

interface MarkedWeek {
  readonly firstHour: number;
  readonly endHour: number;
  /** Words under its bracket; no bracket without them. */
  readonly name: string;
}

/** Null where nobody is ever in the room. */
export function carpet(room: RoomHours, hours: number, week: MarkedWeek): Markup | null {
  const steps = warmSteps(room.operativeC, room.bandLowC, room.bandHighC);
  if (!steps) return null;
  const days = Math.floor(hours / 24);
  const x = linear(0, days, sheet.left, sheet.right);
  const foot = top + 24 * hourHeight;
  const occupied = stepNames.map((_, step) =>
    steps.reduce((n, one, h) => n + (one === step && room.occupied[h] ? 1 : 0), 0),
  );
  const layers = stepNames.flatMap((_, step) => {
    const d = runs(steps, days, step, x);
    if (d === '') return [];
    const plain = markup`<path d="${d}" class="warm-${step} crisp"/>`;
    return step >= firstAbove ? [plain, hatched(d, 'hatch-carpet')] : [plain];
  });
  const hourWords = [0, 6, 12, 18, 24].map((hour) =>
    words(
      sheet.left - 12,
      foot - hour * hourHeight + 4,
      `${hour}${hour === 24 ? ' h' : ''}`,
      'end',
    ),
  );
  const hourEdge = [0, 1, 2, 3].map((k) =>
    box(
      sheet.left - 6,
      foot - (k + 1) * 6 * hourHeight,
      4,
      6 * hourHeight,
      k % 2 === 0 ? 'edge-full' : 'edge-open',
    ),
  );
  const months = monthsOf(hours).map(({ name, firstHour, endHour }) => ({
    from: firstHour / 24,
    to: endHour / 24,
    label: name.slice(0, 3),
  }));
  const [weekLeft, weekRight] = [x(week.firstHour / 24), x(week.endHour / 24)];
  const bracket = `M${px(weekLeft)} ${foot + 26}v5H${px(weekRight)}v-5`;
  const keyTop = foot + 72;
  const key = stepNames.flatMap((name, step) => {
    const left = keyLeft(step);
    const d = `M${px(left)} ${keyTop}h${keyWidth}v10h-${keyWidth}Z`;
    return [
      markup`<path d="${d}" class="warm-${step} crisp"/>`,
      ...(step >= firstAbove ? [hatched(d, 'hatch-carpet')] : []),
      words(left, keyTop + 24, name, 'small'),
      words(left, keyTop + 39, `${figure(occupied[step] ?? 0)} h`, 'strong small'),
    ];
  });
  const equivalent =
    `${room.name}, every hour of the year against its band; occupied hours: ` +
    `${occupied.slice(0, 3).reduce((a, b) => a + b, 0)} below, ${occupied[3]} and ${occupied[4]} in the lower and upper half, ` +
    `${occupied.slice(firstAbove).reduce((a, b) => a + b, 0)} above.`;
  return drawing(keyTop + 46, equivalent, [
    hatch('hatch-carpet'),
    ...layers,
    ...hourWords,
    ...hourEdge,
    edgeBelow(months, x, foot + 2),
    ...(week.name === ''
      ? []
      : [
          path(bracket, 'bracket'),
          words((weekLeft + weekRight) / 2, foot + 44, week.name, 'middle small'),
        ]),
    words(sheet.right + 8, keyTop + 39, 'occupied hours', 'small'),
    ...groups.map(([name, step]) => words(keyLeft(step), keyTop - 6, name, 'small')),
    ...key,
  ]);
}
