// Unsaved work is in the way of what the user wants to do.

import { useApp, useAppState } from '../state/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

export function GuardDialog() {
  const app = useApp();
  const guarded = useAppState((state) => state.guarded);
  const file = useAppState((state) => state.project?.file ?? 'this house');
  if (!guarded) return null;
  const close = () => app.set({ guarded: null });
  const go = () => {
    app.set({ guarded: null });
    guarded.go();
  };
  return (
    <SheetDialog label="Unsaved changes" className="site-dialog" onClose={close}>
      <div className="guard">
        <h2>Unsaved changes</h2>
        <p className="quiet">
          {file} has changes that no file holds. Save them before {guarded.words}?
        </p>
        <div className="dialog-foot">
          <button type="button" className="button" onClick={close}>
            Stay here
          </button>
          <button type="button" className="button" onClick={go}>
            Drop the changes
          </button>
          <button
            type="button"
            className="button is-filled"
            onClick={() =>
              void app.save().then((isSaved) => {
                if (isSaved) go();
                else close();
              })
            }
          >
            Save
          </button>
        </div>
      </div>
    </SheetDialog>
  );
}
