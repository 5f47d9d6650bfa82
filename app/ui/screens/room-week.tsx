// A week of the room: operative temperature against its band, its air and the outside air.

import { useMemo } from 'react';
import { ChartBox, type Point } from '../chart/chart-box.tsx';
import { Drawing } from '../chart/drawing.tsx';
import { HourSlider } from '../chart/hour-slider.tsx';
import { useInk } from '../chart/ink.ts';
import { clearestEnd } from '../chart/label-place.ts';
import { dayUnits } from '../chart/measured-edge.ts';
import {
  bandArea,
  beyondBand,
  endLabels,
  gridLines,
  hourMark,
  measuredEdge,
  note,
  unitLines,
} from '../chart/painter.ts';
import { roundTicks } from '../chart/ticks.ts';
import {
  type Calendar,
  clock,
  dayText,
  figure,
  hourSpan,
  plain,
  quantity,
} from '../format/index.ts';
import type { Week } from '../series/year.ts';
import type { RoomSeries, Simulation } from '../simulation.ts';
import type { HourMark } from '../state/index.ts';

export interface RoomTimeProps {
  readonly series: RoomSeries;
  readonly week: Week;
  readonly calendar: Calendar;
  readonly mark: HourMark | null;
  readonly onHover: (hour: number | null) => void;
  readonly onPin: (hour: number) => void;
  readonly onLetGo: () => void;
}

/** `35.9 °C, 10.9 K above; outside 29.8` */
export function hourText(series: RoomSeries, outdoorC: Float64Array | null, hour: number): string {
  const t = series.operativeC[hour];
  const above = t - series.bandHighC[hour];
  const below = series.bandLowC[hour] - t;
  const where =
    above > 0
      ? `, ${figure(above, 1)} K above`
      : below > 0
        ? `, ${figure(below, 1)} K below`
        : series.occupied[hour]
          ? ', inside the band'
          : ', nobody in';
  const outside = outdoorC ? `; outside ${figure(outdoorC[hour], 1)}` : '';
  return `${plain(quantity.temperatureC(t))}${where}${outside}`;
}

/** About the width of the band's label on a plot of usual width. */
const labelHours = 34;

const minOf = (...series: Float64Array[]) => Math.min(...series.map((one) => Math.min(...one)));
const maxOf = (...series: Float64Array[]) => Math.max(...series.map((one) => Math.max(...one)));

export function RoomWeek(props: RoomTimeProps & { readonly simulation: Simulation }) {
  const { simulation, series, week, calendar, mark, onHover, onPin, onLetGo } = props;
  const ink = useInk();
  const { firstHour, endHour } = week;
  const cut = (all: Float64Array) => all.subarray(firstHour, endHour);
  const operative = cut(series.operativeC);
  const air = cut(series.airC);
  const outside = cut(simulation.outdoorC);
  const low = cut(series.bandLowC);
  const high = cut(series.bandHighC);
  const points = useMemo(() => {
    // A mean over an hour stands in the hour's middle.
    const of = (values: Float64Array): Point[] =>
      Array.from(values, (y, i) => ({ x: firstHour + i + 0.5, y }));
    const slice = (all: Float64Array) => of(all.subarray(firstHour, endHour));
    return {
      operative: slice(series.operativeC),
      air: slice(series.airC),
      outside: slice(simulation.outdoorC),
    };
  }, [series, simulation, firstHour, endHour]);

  const hasBand = low.some((value) => !Number.isNaN(value));
  const limits = hasBand
    ? [low, high].map((edge) => edge.filter((value) => !Number.isNaN(value)))
    : [];
  const ticks = roundTicks(
    minOf(operative, outside, ...limits),
    maxOf(operative, air, outside, ...limits),
    5,
  );
  const days = dayUnits(calendar, firstHour, endHour);
  const isInside = mark !== null && mark.hour >= firstHour && mark.hour < endHour;
  const markedDay = isInside ? Math.floor((mark.hour - firstHour) / 24) : -1;
  const lastOf = (values: Float64Array) => values[values.length - 1];
  const bandWords = bandText(limits);
  const bandAt = clearestEnd(low, [operative, outside], labelHours);
  const isAirApart = air.some((t, i) => Math.abs(t - operative[i]) > 0.3);

  return (
    <Drawing
      title={`Week of ${dayText(calendar, firstHour)}`}
      note="hourly means; operative temperature"
      equivalent={`In the week of ${dayText(calendar, firstHour)} the room is between ${figure(Math.min(...operative), 1)} and ${figure(Math.max(...operative), 1)} °C, outside between ${figure(Math.min(...outside), 1)} and ${figure(Math.max(...outside), 1)} °C. ${bandWords}`}
      table={{
        columns: ['Hour', 'Operative, °C', 'Air, °C', 'Outside, °C', 'Band, °C'],
        rows: () =>
          Array.from(operative, (t, i) => [
            `${dayText(calendar, firstHour + i)} ${clock(firstHour + i)}`,
            figure(t, 1),
            figure(air[i], 1),
            figure(outside[i], 1),
            Number.isNaN(low[i]) ? 'nobody in' : `${figure(low[i], 1)} to ${figure(high[i], 1)}`,
          ]),
      }}
    >
      <HourSlider
        label={`Hour of the week, ${series.name}`}
        min={0}
        max={calendar.hours - 1}
        hour={mark?.hour ?? firstHour}
        text={
          mark
            ? `${hourSpan(calendar, mark.hour)}: ${hourText(series, simulation.outdoorC, mark.hour)}`
            : 'no hour chosen'
        }
        onMove={onPin}
        onLetGo={onLetGo}
      >
        <ChartBox
          height={248}
          top={24}
          bottom={24}
          x={{ min: firstHour, max: endHour }}
          y={{ min: ticks[0] ?? 0, max: ticks.at(-1) ?? 1 }}
          layers={[
            { kind: 'line', points: points.outside, color: (i) => i.air, width: 1.3 },
            { kind: 'line', points: points.air, color: (i) => i['heat-in'], width: 1 },
            { kind: 'line', points: points.operative, color: (i) => i['heat-in'], width: 2.4 },
          ]}
          under={[
            bandArea(firstHour, low, high),
            gridLines(ticks, (tick) => figure(tick), '°C'),
            unitLines(days),
            beyondBand(firstHour, operative, low, high),
          ]}
          over={[
            ...(hasBand
              ? [
                  note(
                    bandWords,
                    {
                      x: firstHour + bandAt + 1,
                      y: low[bandAt] + ((ticks.at(-1) ?? 1) - (ticks[0] ?? 0)) * 0.018,
                      align: 'right',
                    },
                    (i) => i['band-ink'],
                    (i) => i.band,
                  ),
                ]
              : []),
            measuredEdge(days, markedDay),
            endLabels([
              {
                text: 'Room',
                value: lastOf(operative),
                color: ink['heat-in'],
                isStrong: true,
              },
              ...(isAirApart ? [{ text: 'Air', value: lastOf(air), color: ink['heat-in'] }] : []),
              { text: 'Outside', value: lastOf(outside), color: ink['ink-2'] },
            ]),
            ...(isInside
              ? [
                  hourMark(
                    mark.hour + 0.5,
                    hourText(series, simulation.outdoorC, mark.hour),
                    mark.isPinned,
                    series.operativeC[mark.hour],
                  ),
                ]
              : []),
          ]}
          onHover={(x) => onHover(x === null ? null : Math.min(Math.floor(x), endHour - 1))}
          onPick={(x) => onPin(Math.min(Math.floor(x), endHour - 1))}
        />
      </HourSlider>
    </Drawing>
  );
}

/** `comfort band 20 to 26 °C`, with ranges where its edges move within the week. */
function bandText(limits: readonly Float64Array[]): string {
  const [low, high] = limits;
  if (!low?.length || !high?.length) return 'nobody is in, so there is no band';
  const edge = (values: Float64Array) => {
    const least = Math.min(...values);
    const most = Math.max(...values);
    const text = (value: number) => figure(value, Number.isInteger(value) ? 0 : 1);
    return most - least < 0.05 ? text(least) : `${text(least)}\u2013${text(most)}`;
  };
  return `comfort band ${edge(low)} to ${edge(high)} °C`;
}
