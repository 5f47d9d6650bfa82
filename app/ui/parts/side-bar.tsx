import { figure } from '../format/index.ts';
import { type Screen, useApp, useAppState } from '../state/index.ts';
import { BuildingRows } from './building-rows.tsx';
import { Group, Row } from './side-row.tsx';

export function SideBar() {
  const app = useApp();
  const screen = useAppState((state) => state.screen);
  const isOpen = useAppState((state) => state.project !== null || state.weather !== null);
  const isOn = (name: Screen) => screen === name;
  return (
    <nav className="side" aria-label="Project" tabIndex={-1} data-region="side">
      {isOpen ? (
        <ProjectRows />
      ) : (
        <>
          <Group title="Start">
            <Row label="Welcome" isOn={isOn('welcome')} onGo={() => app.go('welcome')} />
          </Group>
          <RecentRows />
          <Group title="Learn">
            <Row
              label="Shortcuts"
              aside="?"
              isOn={false}
              onGo={() => app.set({ dialog: 'shortcuts' })}
            />
          </Group>
        </>
      )}
    </nav>
  );
}

function RecentRows() {
  const app = useApp();
  const recent = useAppState((state) => state.recent);
  if (recent.length === 0) {
    return (
      <>
        <h2>Recent</h2>
        <p className="side-note">Projects that you open will be listed here.</p>
      </>
    );
  }
  return (
    <Group title="Recent">
      {recent.slice(0, 8).map((project) => (
        <Row
          key={`${project.file} ${project.note}`}
          label={project.file}
          isOn={false}
          onGo={() => void app.openRecent(project)}
        />
      ))}
    </Group>
  );
}

function ProjectRows() {
  const app = useApp();
  const screen = useAppState((state) => state.screen);
  const roomId = useAppState((state) => state.roomId);
  const simulation = useAppState((state) => state.simulation);
  const hasProject = useAppState((state) => state.project !== null);
  const rooms = simulation?.findings.rooms ?? [];
  return (
    <>
      <Group title="Building">
        <Row
          label="Site and weather"
          {...(simulation ? { aside: simulation.findings.weather.place } : {})}
          isOn={screen === 'site'}
          onGo={() => app.go('site')}
        />
        <BuildingRows />
      </Group>
      <Group title="Answers">
        <Row
          label="Whole house"
          isOn={screen === 'house'}
          isOff={!hasProject}
          onGo={() => app.go('house')}
        />
        <Row
          label="Room by room"
          {...(simulation ? { aside: figure(rooms.length) } : {})}
          isOn={screen === 'room' && rooms.length === 0}
          isOff={!simulation}
          onGo={() => app.go('room')}
        />
        {rooms.map((room) => (
          <Row
            key={room.id}
            label={room.name}
            {...(room.occupiedHours > 0
              ? { aside: `${figure(room.hoursAboveBand + room.hoursBelowBand)} h` }
              : {})}
            isChild
            isOn={screen === 'room' && room.id === roomId}
            onGo={() => app.go('room', room.id)}
          />
        ))}
      </Group>
    </>
  );
}
