// The findings at the right: always the same order, of the house or of the room that is shown.

import {
  type Against,
  type Answer,
  type Caution,
  findAnswers,
  findCautions,
  setAgainst,
} from '../findings/index.ts';
import { plain, quantity } from '../format/index.ts';
import type { RoomTotals, Simulation } from '../simulation.ts';
import { roomResult, useApp, useAppState } from '../state/index.ts';
import { AnswerRow } from './answer-row.tsx';
import { useAfter } from './run-progress.tsx';

export function FindingsColumn({ simulation }: { simulation: Simulation }) {
  const app = useApp();
  const screen = useAppState((state) => state.screen);
  const roomId = useAppState((state) => state.roomId);
  const isStale = useAppState((state) => state.isStale);
  const isDrawerOpen = useAppState((state) => state.isDrawerOpen);
  const run = useAppState((state) => state.run);
  const isWaiting = useAfter(run.kind === 'running', 150);
  const room = roomResult(simulation, roomId);
  const isRoom = screen === 'room' && room !== null;
  const { rooms } = simulation.findings;
  const answersOf = (one: Simulation) => {
    const its = isRoom ? roomResult(one, roomId) : null;
    return its
      ? findAnswers(its.totals, [])
      : findAnswers(one.findings.building, one.findings.rooms);
  };
  const answers = answersOf(simulation);
  const against = useAgainst(answersOf);
  const concerned = isRoom ? [room.totals] : rooms;
  const cautions = findCautions(concerned);

  return (
    <aside
      className={`findings${isDrawerOpen ? ' is-open' : ''}`}
      aria-label="Findings"
      tabIndex={-1}
      data-region="findings"
      aria-busy={run.kind === 'running'}
    >
      {isWaiting && run.kind === 'running' && (
        <div
          className="hairline"
          aria-hidden="true"
          style={{ width: `${Math.max(4, run.share * 100)}%` }}
        />
      )}
      <div className="findings-head">
        <h2>{isRoom ? `Findings, ${room.totals.name}` : 'Findings'}</h2>
        <button
          type="button"
          className="text-button drawer-only"
          onClick={() => app.set({ isDrawerOpen: false })}
        >
          Close
        </button>
      </div>
      <p className="quiet">{isStale ? 'From before the last change' : <FindingsLine />}</p>
      <p className="unseen" role="status">
        {run.kind === 'running'
          ? 'Running the year'
          : `${answers[0]?.name ?? ''}: ${plain(answers[0]?.quantity ?? quantity.energyKWh(NaN))}`}
      </p>
      <div className={isStale ? 'is-stale' : ''}>
        {answers.map((answer) => (
          <AnswerRow key={answer.key} answer={answer} against={against.get(answer.key)} />
        ))}
      </div>
      <Cautions cautions={cautions} onOpen={isRoom ? null : (id) => app.go('room', id)} />
      {!isRoom && room && <SelectedRoom room={room.totals} />}
    </aside>
  );
}

/** What the figures are of, and what they are set against. */
function FindingsLine() {
  const place = useAppState((state) => state.simulation?.findings.weather.place ?? '');
  const base = useAppState((state) => state.base);
  const now = useAppState((state) => state.document?.story.now);
  const isCoarse = useAppState((state) => state.answered.full === null);
  const step = isCoarse ? '; hour steps, finer ones follow' : '';
  if (!base || !now || base.document === now.document) return `${place}, one year${step}`;
  return `${now.name}, against the house ${base.name}${step}`;
}

/** Nothing to compare with while the house is its own base. */
function useAgainst(answersOf: (simulation: Simulation) => readonly Answer[]) {
  const base = useAppState((state) => state.base);
  const now = useAppState((state) => state.answered);
  const document = useAppState((state) => state.document?.story.now.document);
  const isSame = !base || base.document === document;
  return isSame ? new Map<string, Against>() : setAgainst({ now, base }, answersOf);
}

interface CautionsProps {
  readonly cautions: readonly Caution[];
  /** `null` on the room's own sheet. */
  readonly onOpen: ((roomId: string) => void) | null;
}

function Cautions({ cautions, onOpen }: CautionsProps) {
  return cautions.map((caution) => (
    <p key={caution.kind} className="caution">
      <svg width="14" height="13" aria-hidden="true">
        <path d="M7 1.5L13 12H1Z" fill="none" stroke="currentColor" strokeWidth="1.5" />
      </svg>
      <b>{caution.title}</b> {caution.text}{' '}
      {onOpen && (
        <button type="button" className="link" onClick={() => onOpen(caution.roomId)}>
          Open room
        </button>
      )}
    </p>
  ));
}

function SelectedRoom({ room }: { room: RoomTotals }) {
  const app = useApp();
  const isOccupied = room.occupiedHours > 0;
  const rows = [
    ['Heating', plain(quantity.energyKWh(room.heatingKWh))],
    ['Peak heating', plain(quantity.roomPowerW(room.peakHeatingW))],
    [
      'Hours below the band',
      isOccupied ? plain(quantity.hours(room.hoursBelowBand)) : 'nobody is in',
    ],
    [
      'Hours above the band',
      isOccupied ? plain(quantity.hours(room.hoursAboveBand)) : 'nobody is in',
    ],
  ];
  return (
    <section className="selected" aria-label={`${room.name}, selected`}>
      <div className="findings-head">
        <h2>{room.name}, selected</h2>
        <button type="button" className="link" onClick={() => app.go('room', room.id)}>
          Open room
        </button>
      </div>
      <dl>
        {rows.map(([name, value]) => (
          <div key={name}>
            <dt>{name}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

/** The four main answers under the title, where the findings are a drawer. */
export function AnswerStrip({ simulation }: { simulation: Simulation }) {
  const app = useApp();
  const screen = useAppState((state) => state.screen);
  const roomId = useAppState((state) => state.roomId);
  const isStale = useAppState((state) => state.isStale);
  const room = screen === 'room' ? roomResult(simulation, roomId) : null;
  const { building, rooms } = simulation.findings;
  const answers = room ? findAnswers(room.totals, []) : findAnswers(building, rooms);
  return (
    <section className={isStale ? 'strip is-stale' : 'strip'} aria-label="Main findings">
      {answers
        .filter((answer) => answer.isMain)
        .map((answer) => (
          <div key={answer.key}>
            <span>{answer.name}</span>
            <b>
              {answer.quantity.figure} <i>{answer.quantity.unit}</i>
            </b>
          </div>
        ))}
      <button type="button" className="button" onClick={() => app.set({ isDrawerOpen: true })}>
        Show findings
      </button>
    </section>
  );
}
