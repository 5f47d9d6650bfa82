// The first sheet: what the tool answers, four ways to begin, and a section of a house that names
// the ways heat comes and goes in the words used everywhere else.

import { clockText } from '../format/index.ts';
import { useApp, useAppState } from '../state/index.ts';
import { HouseSection } from './house-section.tsx';

const steps = [
  ['Place and weather', 'Any hourly table. It is checked before it is used.'],
  ['Rooms', 'Each with its surfaces, openings and neighbours.'],
  ['Fabric', 'Walls, windows and roof, layer by layer.'],
  ['Use and plant', 'Who is in when, set-points, heater and chiller.'],
  ['Findings', 'Energy, peaks and hours outside the comfort band.'],
] as const;

export function Welcome() {
  const app = useApp();
  const drafts = useAppState((state) => state.drafts);
  const ways = [
    {
      title: 'Draw a new house',
      text: 'Starts with one room, ready to run with any weather table.',
      keys: 'Alt N',
      act: () => app.newProject(),
    },
    {
      title: 'Open a project',
      text: 'Any file that ends in .inglenook.json, with its weather table.',
      keys: 'Ctrl O',
      act: () => app.openProject(),
    },
    {
      title: 'Read a weather table',
      text: 'Choose it here, or drop a file anywhere in this window.',
      keys: 'Ctrl I',
      act: () => app.openWeather(),
    },
  ];
  return (
    <div className="welcome">
      {drafts.map(({ id, name, path, changedAt }) => (
        <section key={id} className="quiet-note" aria-label="Unsaved work">
          <span>
            <b>Unsaved work.</b> {name}
            {path === null ? ', never saved' : ''}, last changed {clockText(changedAt)}.
          </span>
          <button type="button" className="button" onClick={() => void app.openDraft(id)}>
            Open it
          </button>
          <button type="button" className="button" onClick={() => void app.dropDraft(id)}>
            Drop it
          </button>
        </section>
      ))}
      <div className="welcome-top">
        <div className="welcome-words">
          <h1>
            How warm, how much,
            <br />
            and what would change it
          </h1>
          <p>
            Give rooms their walls, windows and use, and read a whole year, hour by hour. Every
            number shows where it comes from.
          </p>
          <button type="button" className="way is-filled" onClick={() => void app.openDemo()}>
            <span>Open the example house</span>
            <small>An invented house and an invented year of weather.</small>
          </button>
          {ways.map((way) => (
            <button key={way.title} type="button" className="way" onClick={() => void way.act()}>
              <span>
                {way.title} <kbd>{way.keys}</kbd>
              </span>
              <small>{way.text}</small>
            </button>
          ))}
        </div>
        <HouseSection />
      </div>
      <h2>From table to answer</h2>
      <ol className="welcome-steps">
        {steps.map(([title, text]) => (
          <li key={title}>
            <b>{title}</b>
            <span>{text}</span>
          </li>
        ))}
      </ol>
      <p className="note welcome-care">
        Results are estimates for design decisions. Where people could come to harm (frost, heat
        stress, damp, combustion air) ask a licensed practitioner and follow the local code.
      </p>
    </div>
  );
}
