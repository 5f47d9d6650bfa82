// One room: the week answers when, the year how often, the flow picture why; one hour links them.

import { useMemo } from 'react';
import { Drawing } from '../chart/drawing.tsx';
import { FlowPicture, flowRows, flowText } from '../chart/flow-picture.tsx';
import { figure, hourSpan } from '../format/index.ts';
import { flowsOfHour, weekAt, weeksOf, worstWeek } from '../series/year.ts';
import type { Simulation } from '../simulation.ts';
import { type RoomResult, useApp, useAppState, useCalendar } from '../state/index.ts';
import { LoadDuration } from './load-duration.tsx';
import { MonthStrip } from './month-strip.tsx';
import { RoomWeek } from './room-week.tsx';
import { RoomYear } from './room-year.tsx';
import { WeekPicker } from './week-picker.tsx';

export interface RoomProps {
  readonly simulation: Simulation;
  readonly room: RoomResult;
}

export function Room({ simulation, room }: RoomProps) {
  const app = useApp();
  const calendar = useCalendar(simulation);
  const mark = useAppState((state) => state.mark);
  const chosenWeek = useAppState((state) => state.weeks[room.series.id]);
  const { series, totals } = room;
  const weeks = useMemo(
    () => weeksOf(calendar.hours, calendar.firstWeekday),
    [calendar.hours, calendar.firstWeekday],
  );
  const worst = useMemo(() => worstWeek(series, weeks), [series, weeks]);
  const weekIndex = chosenWeek ?? worst;
  const week = weeks[weekIndex] ?? { firstHour: 0, endHour: 168 };

  function chooseWeek(index: number) {
    const weeksNow = app.store.getState().weeks;
    app.set({ weeks: { ...weeksNow, [series.id]: index } });
  }

  /** Under the pointer an hour is only shown; a pinned one stays until it is let go. */
  const hover = (hour: number | null) => {
    if (mark?.isPinned) return;
    app.set({ mark: hour === null ? null : { hour, isPinned: false } });
  };
  const pin = (hour: number) => {
    app.set({ mark: { hour, isPinned: true } });
    chooseWeek(weekAt(weeks, hour));
  };
  const letGo = () => app.set({ mark: null });

  const flows = mark ? flowsOfHour(series, mark.hour) : totals.balanceKWh;
  const unit = mark ? 'W' : 'kWh';
  const occupied =
    totals.occupiedHours > 0 ? `occupied ${figure(totals.occupiedHours)} h a year` : 'not occupied';

  return (
    <>
      <div className="sheet-head">
        <h1>{series.name}</h1>
        <span className="quiet">
          {figure(series.floorAreaM2, 1)} m², {occupied}
        </span>
        <WeekPicker
          weeks={weeks}
          chosen={weekIndex}
          worst={worst}
          calendar={calendar}
          onChoose={chooseWeek}
        />
      </div>
      <RoomWeek
        simulation={simulation}
        series={series}
        week={week}
        calendar={calendar}
        mark={mark}
        onHover={hover}
        onPin={pin}
        onLetGo={letGo}
      />
      <RoomYear
        series={series}
        week={week}
        calendar={calendar}
        mark={mark}
        onHover={hover}
        onPin={pin}
        onLetGo={letGo}
      />
      <Drawing
        title={mark ? 'Heat in this hour' : 'Heat in the year'}
        note={
          mark
            ? `${hourSpan(calendar, mark.hour)}; widths to scale`
            : 'kWh; widths to scale. Point at an hour above to see its heat.'
        }
        equivalent={flowText(flows, unit)}
        table={{ columns: ['Stream', unit], rows: () => flowRows(flows) }}
        aside={
          mark?.isPinned && (
            <button type="button" className="text-button" onClick={letGo}>
              Show the year
            </button>
          )
        }
      >
        <FlowPicture flows={flows} unit={unit} name={series.name} />
      </Drawing>
      <MonthStrip calendar={calendar} rooms={[series]} totals={totals} mark={mark} />
      <LoadDuration series={series} totals={totals} mark={mark} hours={calendar.hours} />
    </>
  );
}
