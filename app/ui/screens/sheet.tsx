import { RunProgress } from '../parts/run-progress.tsx';
import { RunTrouble } from '../parts/run-trouble.tsx';
import { roomResult, useApp, useAppState } from '../state/index.ts';
import { House } from './house.tsx';
import { Room } from './room.tsx';
import { SiteWeather } from './site-weather.tsx';
import { Waiting } from './waiting.tsx';
import { Welcome } from './welcome.tsx';

/** The middle of the window: the screen that was chosen, or why it cannot be drawn yet. */
export function Sheet() {
  const app = useApp();
  const screen = useAppState((state) => state.screen);
  const simulation = useAppState((state) => state.simulation);
  const roomId = useAppState((state) => state.roomId);
  const isStale = useAppState((state) => state.isStale);
  if (screen === 'welcome') return <Welcome />;
  const room = simulation && roomResult(simulation, roomId);
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
