// A sheet before its first result: the axes are drawn, with one sentence on what will fill them.

import { ChartBox } from '../chart/chart-box.tsx';
import { Drawing } from '../chart/drawing.tsx';
import { monthUnits } from '../chart/measured-edge.ts';
import { gridLines, measuredEdge } from '../chart/painter.ts';
import { figure, makeCalendar } from '../format/index.ts';
import { type Screen, useAppState } from '../state/index.ts';

const titles: Readonly<Record<Screen, string>> = {
  welcome: 'Welcome',
  site: 'Site and weather',
  plan: 'Plan',
  rooms: 'Rooms',
  fabric: 'Fabric',
  use: 'Use',
  plant: 'Plant',
  methods: 'Methods',
  house: 'Whole house',
  room: 'Room by room',
};

export function Waiting({ screen, onWeather }: { screen: Screen; onWeather: () => void }) {
  const run = useAppState((state) => state.run);
  const project = useAppState((state) => state.project);
  const weather = useAppState((state) => state.weather);
  const sentence =
    run.kind === 'running'
      ? 'The year is being computed; the drawing fills when it is done.'
      : run.kind === 'refused'
        ? 'Not run. The faults are listed above.'
        : project === null
          ? 'No project yet, so no findings.'
          : weather === null
            ? 'No weather yet, so no findings.'
            : 'No result yet. Run the year to fill this.';
  const calendar = makeCalendar(8760);
  return (
    <>
      <h1>{titles[screen]}</h1>
      {weather && project === null && <p className="quiet">{weather.file} is held ready.</p>}
      <Drawing title="Month by month" equivalent={sentence}>
        <div className="empty">
          <ChartBox
            height={180}
            layers={[]}
            x={{ min: 0, max: calendar.hours }}
            y={{ min: 0, max: 1000 }}
            under={[gridLines([0, 500, 1000], (tick) => figure(tick), 'kWh')]}
            over={[measuredEdge(monthUnits(calendar.months))]}
          />
          <p>
            {sentence}
            {weather === null && project !== null && run.kind !== 'running' && (
              <button type="button" className="link" onClick={onWeather}>
                Read a weather table
              </button>
            )}
          </p>
        </div>
      </Drawing>
    </>
  );
}
