import { useApp } from '../state/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

export function AboutDialog() {
  const app = useApp();
  const close = () => app.set({ dialog: null });
  return (
    <SheetDialog label="About" className="site-dialog" onClose={close}>
      <div className="guard">
        <div className="dialog-head">
          <h2>Inglenook {app.files?.version ?? ''}</h2>
          <button type="button" className="button" onClick={close}>
            Close
          </button>
        </div>
        <p>
          Rooms as thermal networks, driven hour by hour by a year of weather. Works without the
          internet; nothing leaves this computer.
        </p>
        {app.files && <p className="note">{app.files.parts}</p>}
        <p>
          <b>Estimates for design decisions.</b> Where people could come to harm (frost, heat
          stress, an undersized heater, damp and mould, combustion air) results are no proof of
          safety. Follow the local code and ask a licensed practitioner.
        </p>
      </div>
    </SheetDialog>
  );
}
