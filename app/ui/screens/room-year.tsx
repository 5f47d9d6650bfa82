// The room's year, hour by hour, coloured against its own band.

import { useMemo } from 'react';
import { Drawing } from '../chart/drawing.tsx';
import { HourSlider } from '../chart/hour-slider.tsx';
import type { InkName } from '../chart/ink.ts';
import { RampKey } from '../chart/ramp-key.tsx';
import { beyondK, type CarpetBand, carpetBand, stepByCuts, warmStep } from '../chart/warm-step.ts';
import { YearCarpet } from '../chart/year-carpet.tsx';
import { difference, figure, hourSpan } from '../format/index.ts';
import { outsideBand } from '../series/year.ts';
import { hourText, type RoomTimeProps } from './room-week.tsx';

const steps = [0, 1, 2, 3, 4, 5, 6, 7].map((i) => `warm-${i}` as InkName);

/** Where nobody is ever in there is no band: fixed steps, said so in the key. */
const plainCutsC = [5, 10, 16, 20, 24, 27, 30] as const;

function keyLabels(band: CarpetBand | null): string[] {
  const text = (value: number) => figure(value, Number.isInteger(value) ? 0 : 1);
  if (!band) return plainCutsC.map((cut) => text(cut));
  const [near, far] = beyondK;
  if (band.constant) {
    const { lowC, highC } = band.constant;
    const cuts = [
      lowC - far,
      lowC - near,
      lowC,
      (lowC + highC) / 2,
      highC,
      highC + near,
      highC + far,
    ];
    return cuts.map(text);
  }
  return [
    difference(-far),
    difference(-near),
    'low',
    'middle',
    'high',
    difference(near),
    difference(far),
  ];
}

export function RoomYear(props: RoomTimeProps) {
  const { series, week, calendar, mark, onHover, onPin, onLetGo } = props;
  const band = useMemo(() => carpetBand(series.bandLowC, series.bandHighC), [series]);
  const stepOf = (h: number): InkName => {
    const t = series.operativeC[h];
    const step = band ? warmStep(t, band.lowC[h], band.highC[h]) : stepByCuts(t, plainCutsC);
    return steps[step] ?? 'warm-3';
  };
  const unit = band && !band.constant ? 'K' : '°C';
  const occupied = useMemo(() => {
    const count = { below: 0, inside: 0, above: 0 };
    for (let h = 0; h < series.occupied.length; h++) {
      if (!series.occupied[h]) continue;
      const side = outsideBand(series, h);
      count[side < 0 ? 'below' : side > 0 ? 'above' : 'inside']++;
    }
    return count;
  }, [series]);

  return (
    <Drawing
      title="The year"
      note="each hour, operative temperature"
      equivalent={`The year of the room, hour of day upward and days across, shaded by temperature against the band. Occupied hours: ${figure(occupied.below)} below, ${figure(occupied.inside)} inside, ${figure(occupied.above)} above.`}
      aside={
        <RampKey
          steps={steps}
          labels={keyLabels(band)}
          unit={unit}
          before={band ? 'below band' : 'colder'}
          after={band ? 'above' : 'warmer'}
          band={band ? [3, 5] : null}
        />
      }
      table={{
        columns: ['Month', 'Lowest, °C', 'Mean, °C', 'Highest, °C', 'Below, h', 'Above, h'],
        rows: () =>
          calendar.months.map((month) => {
            const cut = series.operativeC.subarray(month.firstHour, month.endHour);
            let below = 0;
            let above = 0;
            for (let h = month.firstHour; h < month.endHour; h++) {
              const side = outsideBand(series, h);
              if (side < 0) below++;
              if (side > 0) above++;
            }
            const mean = cut.reduce((sum, t) => sum + t, 0) / cut.length;
            const range = [Math.min(...cut), mean, Math.max(...cut)].map((t) => figure(t, 1));
            return [month.name, ...range, figure(below), figure(above)];
          }),
      }}
    >
      <HourSlider
        label={`Hour of the year, ${series.name}`}
        min={0}
        max={calendar.hours - 1}
        hour={mark?.hour ?? week.firstHour}
        text={
          mark
            ? `${hourSpan(calendar, mark.hour)}: ${hourText(series, null, mark.hour)}`
            : 'no hour chosen'
        }
        onMove={onPin}
        onLetGo={onLetGo}
      >
        <YearCarpet
          calendar={calendar}
          stepOf={stepOf}
          version={series}
          week={week}
          hour={mark?.hour ?? null}
          onHover={onHover}
          onPick={onPin}
        />
      </HourSlider>
    </Drawing>
  );
}
