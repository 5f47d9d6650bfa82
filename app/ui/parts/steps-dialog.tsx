// Every step since the document was opened; choosing one goes back, or forward, to it.

import { useApp, useAppState } from '../state/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

export function StepsDialog() {
  const app = useApp();
  const story = useAppState((state) => state.document?.story);
  const close = () => app.set({ dialog: null });
  if (!story) return null;
  const steps = [...story.past, story.now, ...story.future];
  const at = story.past.length;
  return (
    <SheetDialog label="Steps so far" className="steps-dialog" onClose={close}>
      <div className="dialog-head">
        <h2>Steps so far</h2>
        <button type="button" className="button" onClick={close}>
          Close
        </button>
      </div>
      <ol className="steps">
        {steps
          .map((step, i) => ({ step, i }))
          .reverse()
          .map(({ step, i }) => (
            <li key={i}>
              <button
                type="button"
                aria-current={i === at ? 'step' : undefined}
                onClick={() => app.goToStep(i)}
              >
                <span>{step.name}</span>
                <i>{i === at ? 'now' : i > at ? 'undone' : ''}</i>
              </button>
            </li>
          ))}
      </ol>
    </SheetDialog>
  );
}
