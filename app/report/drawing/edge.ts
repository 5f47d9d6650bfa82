// The measured edge: a bar of units, filled and open in turn, that frames every drawing.

import { figure } from '../figures.ts';
import { type Markup, markup } from '../markup.ts';
import { type Scale, tickDecimals } from './scale.ts';
import { box, px, sheet, words } from './svg.ts';

export interface EdgeUnit {
  readonly from: number;
  readonly to: number;
  readonly label: string;
}

const thick = 5;

/** Along the bottom, its upper side at `y`; labels in the middle of the units, or at their starts. */
export function edgeBelow(
  units: readonly EdgeUnit[],
  x: Scale,
  y: number,
  at: 'middle' | 'start' = 'middle',
): Markup {
  const parts = units.map((unit, i) => {
    const [left, right] = [x(unit.from), x(unit.to)];
    const label =
      at === 'middle'
        ? words((left + right) / 2, y + thick + 13, unit.label, 'middle')
        : words(left, y + thick + 13, unit.label, i === 0 ? '' : 'middle');
    const bar = box(left, y, right - left, thick, i % 2 === 0 ? 'edge-full' : 'edge-open');
    return [bar, unit.label === '' ? [] : label];
  });
  return markup`<g>${parts}</g>`;
}

/** Hairlines at round values with their figures at the left; the top one carries the unit. */
export function gridAtLeft(ticks: readonly number[], y: Scale, unit: string): Markup {
  const decimals = tickDecimals(ticks);
  const parts = ticks.map((value, i) => {
    const isTop = i === ticks.length - 1;
    const text = `${figure(value, decimals)}${isTop ? ` ${unit}` : ''}`;
    const d = `M${sheet.left} ${px(y(value))}H${sheet.right}`;
    return markup`<path d="${d}" class="grid"/>${words(sheet.left - 8, y(value) + 4, text, 'end')}`;
  });
  return markup`<g>${parts}</g>`;
}
