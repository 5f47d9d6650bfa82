// Where the shell has no dialog of its own: a folder of those that this window may use, and a name.

import { type FormEvent, useId, useState } from 'react';
import { useApp, useAppState } from '../state/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

const ending = '.inglenook.json';

export function SaveAsDialog() {
  const app = useApp();
  const file = useAppState((state) => state.project?.file ?? 'house');
  const id = useId();
  const folders = app.files?.folders ?? [];
  const [folder, setFolder] = useState(folders[0] ?? '');
  const [name, setName] = useState(file.replace(ending, ''));
  const [isThere, setThere] = useState(false);
  const close = () => app.set({ dialog: null });
  const isNamed = /^[^\\/:*?"<>|.][^\\/:*?"<>|]*$/.test(name.trim());

  async function submit(event: FormEvent) {
    event.preventDefault();
    if (!isNamed) return;
    const whole = `${name.trim()}${ending}`;
    const path = folder === '' ? null : `${folder}/${whole}`;
    if (await app.saveTo(path, whole, isThere ? 'anything' : undefined)) close();
    else setThere(true);
  }

  return (
    <SheetDialog label="Save as" className="site-dialog" onClose={close}>
      <form onSubmit={(event) => void submit(event)}>
        <h2>Save as</h2>
        <p className="quiet">The file is written whole, or the old one is left as it is.</p>
        {folders.length > 1 && (
          <div className="field">
            <label htmlFor={`${id}-folder`}>Folder</label>
            <select
              id={`${id}-folder`}
              className="wide"
              value={folder}
              onChange={(event) => setFolder(event.target.value)}
            >
              {folders.map((one) => (
                <option key={one}>{one}</option>
              ))}
            </select>
          </div>
        )}
        <div className="field">
          <label htmlFor={id}>Name</label>
          <input
            id={id}
            className="wide"
            value={name}
            aria-describedby={`${id}-note`}
            onChange={(event) => {
              setName(event.target.value);
              setThere(false);
            }}
          />
        </div>
        <p id={`${id}-note`} className={isThere ? 'field-wrong' : 'note'} role="status">
          {isThere
            ? 'A file of that name is there, or has been changed. Saving again replaces it; what it holds is kept among the earlier versions.'
            : `${folder === '' ? '' : `in ${folder}, `}ends in ${ending}`}
        </p>
        <div className="dialog-foot">
          <button type="button" className="button" onClick={close}>
            Leave
          </button>
          <button type="submit" className="button is-filled" disabled={!isNamed}>
            {isThere ? 'Replace it' : 'Save'}
          </button>
        </div>
      </form>
    </SheetDialog>
  );
}
