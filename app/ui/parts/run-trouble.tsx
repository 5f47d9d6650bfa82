// What stands on the sheet when a run gave no result, or when there is none yet: one sentence and
// what to do. The last result, if there is one, stays below it.

import { jumpTo } from '../problems/jump.ts';
import { asksForSite, useApp, useAppState, useProject } from '../state/index.ts';
import { FaultList } from './fault-list.tsx';

export function RunTrouble() {
  const app = useApp();
  const run = useAppState((state) => state.run);
  const isSite = useAppState(asksForSite);
  const hasWeather = useAppState((state) => state.weather !== null);
  const { form } = useProject();
  const isEdited = form !== null;
  const again = (
    <button type="button" className="button" onClick={() => void app.runYear()}>
      Run the year
    </button>
  );
  if (run.kind === 'refused') {
    return (
      <section className="stop" aria-label="Not run" role="alert">
        <p>
          <b>Not run.</b> Put these right
          {isEdited ? '; the year runs again by itself' : ' in the file and open it again'}.
        </p>
        <FaultList faults={run.faults} jumpOf={(fault) => jumpTo(app, form, fault)} />
        <div className="row-of-buttons">
          {!hasWeather && (
            <button type="button" className="button" onClick={() => void app.openWeather()}>
              Read a weather table
            </button>
          )}
          {isSite && (
            <button type="button" className="button" onClick={() => app.set({ dialog: 'site' })}>
              Give the site
            </button>
          )}
          <button type="button" className="button" onClick={() => void app.openProject()}>
            Open a project
          </button>
        </div>
      </section>
    );
  }
  if (run.kind === 'broken') {
    return (
      <section className="stop" aria-label="Run broke off" role="alert">
        <p>
          <b>The run broke off.</b> {run.reason} The project is unharmed.
        </p>
        <div className="row-of-buttons">{again}</div>
      </section>
    );
  }
  if (run.kind === 'cancelled') {
    return (
      <section className="quiet-note" aria-label="Run cancelled">
        <span>Cancelled. Nothing was changed.</span> {again}
      </section>
    );
  }
  return null;
}
