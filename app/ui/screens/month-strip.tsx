// Month by month: heating (and cooling) stand on the month edge, hours above the band hang below it.

import { useMemo } from 'react';
import { ChartBox, type Layer } from '../chart/chart-box.tsx';
import { Drawing } from '../chart/drawing.tsx';
import { monthUnits } from '../chart/measured-edge.ts';
import { gridLines, hourMark, measuredEdge, type Painter, words } from '../chart/painter.ts';
import { usePlotMargin } from '../chart/plot-margin.ts';
import { roundTicks } from '../chart/ticks.ts';
import { type Calendar, figure } from '../format/index.ts';
import { monthlyHours } from '../series/year.ts';
import type { RoomSeries, Totals } from '../simulation.ts';
import type { HourMark } from '../state/index.ts';

export interface MonthStripProps {
  readonly calendar: Calendar;
  readonly rooms: readonly RoomSeries[];
  readonly totals: Totals;
  readonly mark: HourMark | null;
}

const atLeft =
  (lines: readonly string[], from: 'top' | 'bottom'): Painter =>
  (view) =>
    lines.forEach((line, i) => {
      const y =
        from === 'top' ? view.top + 12 + i * 14 : view.bottom - 4 - (lines.length - 1 - i) * 14;
      words(view, line, 0, y, view.ink['ink-2']);
    });

export function MonthStrip({ calendar, rooms, totals, mark }: MonthStripProps) {
  const { months, hours } = calendar;
  const margin = usePlotMargin();
  const marked: Painter[] = mark ? [hourMark(mark.hour + 0.5, '', mark.isPinned)] : [];
  const heating = totals.heatingByMonthKWh;
  const cooling = totals.coolingByMonthKWh;
  const above = useMemo(() => monthlyHours(rooms, months, 1), [rooms, months]);
  const below = useMemo(() => monthlyHours(rooms, months, -1), [rooms, months]);
  const hasCooling = cooling.some((kWh) => kWh > 0);
  const ticks = roundTicks(0, Math.max(...heating, ...cooling, 1), 3);
  const mostHours = Math.max(...above, ...below, 1);
  const bars = (values: readonly number[], color: Layer['color'], shift: number): Layer => ({
    kind: 'bar',
    width: hasCooling ? 20 : 40,
    color,
    points: months
      .map((month, i) => ({
        x: (month.firstHour + month.endHour) / 2 + shift,
        y: values[i] ?? 0,
      }))
      .filter(({ y }) => y > 0),
  });
  const half = hasCooling ? 150 : 0;
  const sum = (values: readonly number[]) => figure(values.reduce((all, one) => all + one, 0));
  const hourLabels: Painter = (view) =>
    above.forEach((value, i) => {
      const month = months[i];
      if (!month || value === 0) return;
      const x = view.x((month.firstHour + month.endHour) / 2);
      words(view, `${figure(value)} h`, x, view.y(value) + 13, view.ink.ink, { align: 'center' });
    });
  const baseLine: Painter = ({ ctx, left, right, top, ink }) => {
    ctx.fillStyle = ink.ink;
    ctx.fillRect(left, top, right - left, 1);
  };
  const isNoneAbove = above.every((value) => value === 0);

  return (
    <Drawing
      title="Month by month"
      note={hasCooling ? 'heating left, cooling right of each pair' : 'heating'}
      equivalent={`Heating ${sum(heating)} kWh${hasCooling ? `, cooling ${sum(cooling)} kWh` : ''} and ${sum(above)} occupied hours above the band, by month.`}
      table={{
        columns: [
          'Month',
          'Heating, kWh',
          'Cooling, kWh',
          'Below the band, h',
          'Above the band, h',
        ],
        rows: () =>
          months.map((month, i) => [
            month.name,
            figure(heating[i] ?? NaN),
            figure(cooling[i] ?? NaN),
            figure(below[i] ?? NaN),
            figure(above[i] ?? NaN),
          ]),
      }}
    >
      <ChartBox
        height={138}
        top={12}
        bottom={24}
        x={{ min: 0, max: hours }}
        y={{ min: 0, max: ticks.at(-1) ?? 1 }}
        layers={[
          bars(heating, (ink) => ink['heat-in'], -half),
          ...(hasCooling ? [bars(cooling, (ink) => ink['heat-out'], half)] : []),
        ]}
        under={[gridLines(ticks.slice(1), (tick) => figure(tick), 'kWh')]}
        over={[
          atLeft(hasCooling ? ['Heating,', 'cooling'] : ['Heating'], 'bottom'),
          measuredEdge(monthUnits(months)),
          ...marked,
        ]}
      />
      {isNoneAbove ? (
        <p className="note" style={{ marginLeft: margin.left }}>
          No occupied hour above the band.
        </p>
      ) : (
        <ChartBox
          height={84}
          top={6}
          bottom={18}
          x={{ min: 0, max: hours }}
          y={{ min: 0, max: mostHours, isHanging: true }}
          layers={[bars(above, (ink) => ink['amount-4'], 0)]}
          under={[]}
          over={[atLeft(['Above', 'the band'], 'top'), baseLine, hourLabels]}
        />
      )}
    </Drawing>
  );
}
