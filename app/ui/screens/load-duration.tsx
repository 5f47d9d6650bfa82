// How long the heating (and cooling) runs at how much: hours of the year sorted by size.

import { useMemo } from 'react';
import { ChartBox, type Point } from '../chart/chart-box.tsx';
import { Drawing } from '../chart/drawing.tsx';
import { evenUnits } from '../chart/measured-edge.ts';
import { gridLines, hourMark, measuredEdge, type Painter, words } from '../chart/painter.ts';
import { roundTicks, tickDecimals } from '../chart/ticks.ts';
import { figure, plain, quantity, stampText } from '../format/index.ts';
import { byDuration } from '../series/year.ts';
import type { RoomSeries, RoomTotals } from '../simulation.ts';
import type { HourMark } from '../state/index.ts';

export interface LoadDurationProps {
  readonly series: RoomSeries;
  readonly totals: RoomTotals;
  readonly hours: number;
  readonly mark: HourMark | null;
}

const shownHours = [1, 10, 50, 100, 250, 500, 1000, 2000, 4000, 8000];

/** One point an hour is more than the screen has pixels: keep every fourth, and the first hundred. */
function pointsOf(curve: Float64Array): Point[] {
  const points: Point[] = [];
  curve.forEach((w, i) => {
    if (w > 0 && (i < 100 || i % 4 === 0)) points.push({ x: i, y: w / 1000 });
  });
  return points;
}

/** Hours of a falling curve before it reaches nought. */
function hoursOn(curve: Float64Array): number {
  const end = curve.findIndex((w) => w <= 0);
  return end < 0 ? curve.length : end;
}

export function LoadDuration({ series, totals, hours, mark }: LoadDurationProps) {
  const heating = useMemo(() => byDuration(series.heatingW), [series]);
  const cooling = useMemo(() => byDuration(series.coolingW), [series]);
  const heatingPoints = useMemo(() => pointsOf(heating), [heating]);
  const coolingPoints = useMemo(() => pointsOf(cooling), [cooling]);
  const heatingOn = useMemo(() => hoursOn(heating), [heating]);
  const coolingOn = useMemo(() => hoursOn(cooling), [cooling]);
  const most = Math.max(heating[0] ?? 0, cooling[0] ?? 0) / 1000;
  const ticks = roundTicks(0, most || 1, 4);
  const decimals = tickDecimals(ticks);
  const units = evenUnits(0, hours, 1000);

  const nameCurve =
    (name: string, curve: Float64Array, on: number, color: 'heat-in' | 'heat-out'): Painter =>
    (view) => {
      if (on === 0) return;
      const at = Math.round(on * 0.28);
      const text = `${name}, on for ${figure(on)} h`;
      words(view, text, view.x(at) + 10, view.y(curve[at] / 1000) - 6, view.ink[color], {
        weight: 600,
        halo: view.ink.sheet,
      });
    };
  /** The marked hour at its place in the order. */
  const heatNow = mark ? series.heatingW[mark.hour] : 0;
  const place = heatNow > 0 ? heating.findIndex((w) => w <= heatNow) : -1;
  const marked =
    mark && place >= 0
      ? [hourMark(place, plain(quantity.roomPowerW(heatNow)), mark.isPinned, heatNow / 1000)]
      : [];
  const hourWords: Painter = (view) => {
    units.forEach((unit, i) => {
      if (i % 2) return;
      const text = i === 0 ? '0' : `${figure(unit.from)}${i === 8 ? ' h' : ''}`;
      words(view, text, view.x(unit.from), view.bottom + 20, view.ink['ink-2'], {
        align: 'center',
      });
    });
  };
  const peaks = [
    totals.peakHeatingW > 0
      ? `Peak heating ${plain(quantity.roomPowerW(totals.peakHeatingW))}, ${stampText(totals.peakHeatingAt)}`
      : 'No heating called for',
    totals.peakCoolingW > 0
      ? `peak cooling ${plain(quantity.roomPowerW(totals.peakCoolingW))}, ${stampText(totals.peakCoolingAt)}`
      : '',
  ]
    .filter(Boolean)
    .join('; ');

  return (
    <Drawing
      title="Load duration"
      note={peaks}
      equivalent={`${peaks}. Heating is on for ${figure(heatingOn)} hours, cooling for ${figure(coolingOn)}.`}
      table={{
        columns: ['Hours of the year', 'Heating at least, kW', 'Cooling at least, kW'],
        rows: () =>
          shownHours.map((h) => [
            figure(h),
            figure((heating[h - 1] ?? NaN) / 1000, 2),
            figure((cooling[h - 1] ?? NaN) / 1000, 2),
          ]),
      }}
    >
      <ChartBox
        height={176}
        top={20}
        x={{ min: 0, max: hours }}
        y={{ min: 0, max: ticks.at(-1) ?? 1 }}
        layers={[
          { kind: 'line', points: coolingPoints, color: (ink) => ink['heat-out'], width: 2.4 },
          { kind: 'line', points: heatingPoints, color: (ink) => ink['heat-in'], width: 2.4 },
        ]}
        under={[gridLines(ticks, (tick) => figure(tick, decimals), 'kW')]}
        over={[
          nameCurve('Heating', heating, heatingOn, 'heat-in'),
          nameCurve('Cooling', cooling, coolingOn, 'heat-out'),
          measuredEdge(units),
          ...marked,
          hourWords,
        ]}
      />
    </Drawing>
  );
}
