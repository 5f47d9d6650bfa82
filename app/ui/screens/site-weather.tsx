// What was read of the weather: where, which form, how many hours; what was mended and assumed; the
// year of the outside air.

import { useMemo } from 'react';
import { ChartBox, type Point } from '../chart/chart-box.tsx';
import { Drawing } from '../chart/drawing.tsx';
import type { InkName } from '../chart/ink.ts';
import { monthUnits } from '../chart/measured-edge.ts';
import { gridLines, measuredEdge, type Painter } from '../chart/painter.ts';
import { noNames, PlotMarginContext } from '../chart/plot-margin.ts';
import { RampKey } from '../chart/ramp-key.tsx';
import { roundTicks } from '../chart/ticks.ts';
import { stepByCuts } from '../chart/warm-step.ts';
import { YearCarpet } from '../chart/year-carpet.tsx';
import { figure, hourText } from '../format/index.ts';
import type { Simulation } from '../simulation.ts';
import { useApp, useAppState, useCalendar } from '../state/index.ts';
import { ReadingFacts, ReadingNotes } from './reading.tsx';

const cutsC = [-10, -5, 0, 5, 10, 15, 20, 25, 30, 35] as const;
const steps: readonly InkName[] = [
  'chill-5',
  'chill-4',
  'chill-3',
  'chill-2',
  'chill-1',
  'amount-0',
  'amount-1',
  'amount-2',
  'amount-3',
  'amount-4',
  'amount-5',
];

function daysOf(outdoorC: Float64Array, days: number) {
  return Array.from({ length: days }, (_, day) => {
    const cut = outdoorC.subarray(day * 24, day * 24 + 24);
    return { low: Math.min(...cut), high: Math.max(...cut) };
  });
}

export function SiteWeather({ simulation }: { simulation: Simulation }) {
  const app = useApp();
  const calendar = useCalendar(simulation);
  const weather = useAppState((state) => state.weather);
  const { outdoorC } = simulation;
  const days = useMemo(() => daysOf(outdoorC, calendar.days), [outdoorC, calendar.days]);
  const months = useMemo(
    () =>
      calendar.months.map((month) => {
        const cut = outdoorC.subarray(month.firstHour, month.endHour);
        const mean = cut.reduce((sum, t) => sum + t, 0) / cut.length;
        return { month, low: Math.min(...cut), mean, high: Math.max(...cut) };
      }),
    [outdoorC, calendar.months],
  );
  const coldest = outdoorC.indexOf(Math.min(...outdoorC));
  const hottest = outdoorC.indexOf(Math.max(...outdoorC));
  const mean = outdoorC.reduce((sum, t) => sum + t, 0) / outdoorC.length;
  const ticks = roundTicks(outdoorC[coldest], outdoorC[hottest], 4);
  const rows = () =>
    months.map(({ month, ...t }) => [
      month.name,
      figure(t.low, 1),
      figure(t.mean, 1),
      figure(t.high, 1),
    ]);
  const table = { columns: ['Month', 'Lowest, °C', 'Mean, °C', 'Highest, °C'], rows };
  const words = `Coldest ${figure(outdoorC[coldest], 1)} °C on ${hourText(calendar, coldest)}, mean ${figure(mean, 1)}, hottest ${figure(outdoorC[hottest], 1)} °C on ${hourText(calendar, hottest)}`;
  const ranges: Painter = ({ ctx, x, y, ink }) => {
    ctx.fillStyle = ink['ink-2'];
    days.forEach(({ low, high }, day) => {
      const width = Math.max(1.2, (x(24) - x(0)) * 0.62);
      ctx.fillRect(x(day * 24 + 12) - width / 2, y(high), width, Math.max(1, y(low) - y(high)));
    });
  };
  const means: Point[] = months.map(({ month, mean: t }) => ({
    x: (month.firstHour + month.endHour) / 2,
    y: t,
  }));

  return (
    <PlotMarginContext value={noNames}>
      <div className="sheet-head">
        <h1>Site and weather</h1>
        <span className="quiet">{weather?.file}</span>
        <span className="sheet-acts">
          <button type="button" className="button" onClick={() => void app.openWeather()}>
            Read another table
          </button>
        </span>
      </div>
      <ReadingFacts simulation={simulation} />
      <Drawing
        title="Outside air over the year"
        note="each hour"
        equivalent={`${words}.`}
        table={table}
        aside={
          <RampKey
            steps={steps}
            labels={cutsC.map((cut) => figure(cut))}
            unit="°C"
            before=""
            after=""
            band={null}
          />
        }
      >
        <YearCarpet
          calendar={calendar}
          stepOf={(h) => steps[stepByCuts(outdoorC[h], cutsC)] ?? 'amount-0'}
          version={outdoorC}
          week={null}
          hour={null}
          rowHeight={6}
        />
      </Drawing>
      <Drawing title="Daily range" note={words} equivalent={`${words}.`} table={table}>
        <ChartBox
          height={156}
          x={{ min: 0, max: calendar.hours }}
          y={{ min: ticks[0] ?? 0, max: ticks.at(-1) ?? 1 }}
          layers={[{ kind: 'line', points: means, color: (ink) => ink['heat-out'], width: 0 }]}
          under={[gridLines(ticks, (tick) => figure(tick), '°C'), ranges]}
          over={[measuredEdge(monthUnits(calendar.months))]}
        />
      </Drawing>
      <ReadingNotes simulation={simulation} />
    </PlotMarginContext>
  );
}
