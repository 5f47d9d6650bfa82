// The measured edge: a bar of units, filled and open in turn, that frames every drawing.

import { axisDay, type Calendar, type Month } from '../format/index.ts';

export interface EdgeUnit {
  readonly from: number;
  readonly to: number;
  readonly label: string;
}

/** Twelve months over the hours of the year. */
export function monthUnits(months: readonly Month[]): EdgeUnit[] {
  return months.map((m) => ({ from: m.firstHour, to: m.endHour, label: m.short }));
}

/** The days from one hour to another. */
export function dayUnits(calendar: Calendar, firstHour: number, endHour: number): EdgeUnit[] {
  const units: EdgeUnit[] = [];
  for (let hour = firstHour; hour < endHour; hour += 24) {
    units.push({ from: hour, to: Math.min(hour + 24, endHour), label: axisDay(calendar, hour) });
  }
  return units;
}

/** Equal units, each labelled at its start by the caller. */
export function evenUnits(from: number, to: number, size: number): EdgeUnit[] {
  const count = Math.max(1, Math.ceil((to - from) / size - 1e-9));
  return Array.from({ length: count }, (_, i) => ({
    from: from + i * size,
    to: Math.min(to, from + (i + 1) * size),
    label: '',
  }));
}

/** The edge in pixels: unit i is filled when i is even. */
export function edgeBars(units: readonly EdgeUnit[], toPixel: (value: number) => number) {
  return units.map((unit, i) => {
    const x = toPixel(unit.from);
    return { x, width: toPixel(unit.to) - x, isFilled: i % 2 === 0, label: unit.label };
  });
}
