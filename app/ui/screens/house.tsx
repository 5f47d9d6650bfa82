// The whole house: the rooms ranked by the finding shown, the months, and the heat of the year.

import { Drawing } from '../chart/drawing.tsx';
import { FlowPicture, flowRows, flowText } from '../chart/flow-picture.tsx';
import { noNames, PlotMarginContext } from '../chart/plot-margin.ts';
import { figureKinds } from '../findings/index.ts';
import { figure, hourSpan } from '../format/index.ts';
import { houseFlowsOfHour } from '../series/year.ts';
import type { Simulation } from '../simulation.ts';
import { useApp, useAppState, useCalendar } from '../state/index.ts';
import { FigureTabs } from './figure-tabs.tsx';
import { MonthStrip } from './month-strip.tsx';
import { RoomRanking } from './room-ranking.tsx';

export function House({ simulation }: { simulation: Simulation }) {
  const app = useApp();
  const calendar = useCalendar(simulation);
  const figureKey = useAppState((state) => state.figure);
  const mark = useAppState((state) => state.mark);
  const kind = figureKinds.find((one) => one.key === figureKey) ?? figureKinds[0];
  const { building, rooms } = simulation.findings;
  const pinned = mark?.isPinned ? mark.hour : null;
  const flows =
    pinned === null ? { ...building.balanceKWh, rooms: 0 } : houseFlowsOfHour(simulation, pinned);
  const unit = pinned === null ? 'kWh' : 'W';
  if (!kind) return null;

  return (
    <PlotMarginContext value={noNames}>
      <div className="sheet-head">
        <h1>Whole house</h1>
        <span className="quiet">
          {figure(rooms.length)} rooms, {figure(building.floorAreaM2, 1)} m²
        </span>
      </div>
      <FigureTabs
        kinds={figureKinds}
        chosen={kind.key}
        onChoose={(key) => app.set({ figure: key })}
      />
      <div role="tabpanel" id="figure-panel" aria-labelledby={`tab-${kind.key}`}>
        <RoomRanking kind={kind} rooms={rooms} series={simulation.rooms} />
      </div>
      <MonthStrip
        calendar={calendar}
        rooms={simulation.rooms}
        totals={building}
        mark={mark?.isPinned ? mark : null}
      />
      <Drawing
        title={pinned === null ? 'Heat in the year' : 'Heat in this hour'}
        note={
          pinned === null
            ? 'the whole house; widths to scale, kWh'
            : `${hourSpan(calendar, pinned)}; widths to scale`
        }
        equivalent={flowText(flows, unit)}
        table={{ columns: ['Stream', unit], rows: () => flowRows(flows) }}
        aside={
          pinned !== null && (
            <button type="button" className="text-button" onClick={() => app.set({ mark: null })}>
              Show the year
            </button>
          )
        }
      >
        <FlowPicture flows={flows} unit={unit} name="Whole house" wordsInto="Into the house" />
      </Drawing>
    </PlotMarginContext>
  );
}
