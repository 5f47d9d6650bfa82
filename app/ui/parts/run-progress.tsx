// A run that takes longer than a moment: how far it is, and a way out.

import { useEffect, useState } from 'react';
import { figure } from '../format/index.ts';
import { useApp, useAppState } from '../state/index.ts';

/** True once `isOn` has been true for `delayMs` without a break. */
export function useAfter(isOn: boolean, delayMs: number): boolean {
  const [isLate, setLate] = useState(false);
  useEffect(() => {
    if (!isOn) return setLate(false);
    const timer = setTimeout(() => setLate(true), delayMs);
    return () => clearTimeout(timer);
  }, [isOn, delayMs]);
  return isOn && isLate;
}

export function RunProgress() {
  const app = useApp();
  const run = useAppState((state) => state.run);
  const isLate = useAfter(run.kind === 'running', 400);
  if (run.kind !== 'running' || !isLate) return null;
  const percent = Math.round(run.share * 100);
  return (
    <section className="progress" aria-label="Run">
      <div>
        <strong>Running the year</strong>
        <button type="button" className="button" onClick={() => app.cancel()}>
          Cancel
        </button>
      </div>
      <div
        className="progress-bar"
        role="progressbar"
        aria-label="Share of the run that is done"
        aria-valuemin={0}
        aria-valuemax={100}
        aria-valuenow={percent}
      >
        <span style={{ width: `${percent}%` }} />
      </div>
      <div className="note">
        <span>{run.stage.charAt(0).toUpperCase() + run.stage.slice(1)}</span>
        <span>{figure(percent)} %</span>
      </div>
    </section>
  );
}
