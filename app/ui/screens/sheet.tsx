import { RunProgress } from '../parts/run-progress.tsx';
import { RunTrouble } from '../parts/run-trouble.tsx';
import { roomResult, type Screen, useApp, useAppState, useProject } from '../state/index.ts';
import { Fabric } from './fabric/fabric.tsx';
import { House } from './house.tsx';
import { Methods } from './methods.tsx';
import { Plan } from './plan/plan.tsx';
import { Plant } from './plant.tsx';
import { Room } from './room.tsx';
import { Rooms } from './rooms.tsx';
import { SiteWeather } from './site-weather.tsx';
import { Use } from './use/use.tsx';
import { Waiting } from './waiting.tsx';
import { Welcome } from './welcome.tsx';

const editors: Partial<Record<Screen, () => React.ReactNode>> = {
  plan: Plan,
  rooms: Rooms,
  fabric: Fabric,
  use: Use,
  plant: Plant,
  methods: Methods,
};

/** The middle of the window: the screen that was chosen, or why it cannot be drawn yet. */
export function Sheet() {
  const app = useApp();
  const screen = useAppState((state) => state.screen);
  const simulation = useAppState((state) => state.simulation);
  const roomId = useAppState((state) => state.roomId);
  const isStale = useAppState((state) => state.isStale);
  const hasWeather = useAppState((state) => state.weather !== null);
  const hasForm = useProject().form !== null;
  if (screen === 'welcome') return <Welcome />;
  const room = simulation && roomResult(simulation, roomId);
  const Editor = editors[screen];
  if (Editor) {
    return (
      <>
        <RunTrouble />
        {!hasWeather && hasForm && (
          <section className="quiet-note" aria-label="No weather yet">
            <span>No weather yet, so nothing is run.</span>
            <button type="button" className="link" onClick={() => void app.openWeather()}>
              Read a weather table
            </button>
          </section>
        )}
        {hasForm ? <Editor /> : <Unreadable />}
      </>
    );
  }
  return (
    <>
      <RunTrouble />
      <RunProgress />
      {!simulation && <Waiting screen={screen} onWeather={() => void app.openWeather()} />}
      {simulation && (
        <div className={isStale ? 'is-old' : ''}>
          {screen === 'site' && <SiteWeather simulation={simulation} />}
          {screen === 'house' && <House simulation={simulation} />}
          {screen === 'room' && room && (
            <Room key={room.series.id} simulation={simulation} room={room} />
          )}
        </div>
      )}
    </>
  );
}

/** A file that does not fit the form cannot be edited here. */
function Unreadable() {
  const hasProject = useAppState((state) => state.project !== null);
  return (
    <p className="quiet">
      {hasProject
        ? 'The file does not have the form of a project, so that it cannot be edited here. The faults are listed above; put them right in the file and open it again.'
        : 'No project is open.'}
    </p>
  );
}
