// What the file held before each of the last saves, what differs from now, and a way back.

import { useEffect, useState } from 'react';
import { type DifferenceLine, differences, readDocument } from '../../project/index.ts';
import { clockText } from '../format/index.ts';
import { useApp, useAppState } from '../state/index.ts';
import { SheetDialog } from './sheet-dialog.tsx';

interface Version {
  readonly id: string;
  readonly savedAt: number;
}
const mostLines = 60;

export function VersionsDialog() {
  const app = useApp();
  const document = useAppState((state) => state.document);
  const [versions, setVersions] = useState<readonly Version[] | null>(null);
  const [shown, setShown] = useState<{ id: string; text: string } | null>(null);
  const path = document?.path ?? null;
  const close = () => app.set({ dialog: null });

  useEffect(() => {
    if (path === null || !app.files) return setVersions([]);
    app.files.versions(path).then(setVersions, () => setVersions([]));
  }, [app, path]);

  if (!document || path === null) return null;
  const now = document.story.now.document;
  const then = shown && readDocument(shown.text);
  const lines = then === null ? [] : differences(then, now);

  return (
    <SheetDialog label="Earlier versions" className="versions-dialog" onClose={close}>
      <div className="dialog-head">
        <h2>Earlier versions</h2>
        <button type="button" className="button" onClick={close}>
          Close
        </button>
      </div>
      {versions?.length === 0 && (
        <p className="quiet">None yet: what a file held is kept whenever it is saved over.</p>
      )}
      <ul className="steps">
        {versions?.map(({ id, savedAt }) => (
          <li key={id}>
            <button
              type="button"
              aria-current={shown?.id === id ? 'true' : undefined}
              onClick={() =>
                void app.files?.readVersion(path, id).then((text) => setShown({ id, text }))
              }
            >
              <span>until {clockText(savedAt)}</span>
            </button>
          </li>
        ))}
      </ul>
      {shown && then !== null && (
        <>
          <Differences lines={lines} />
          <div className="dialog-foot">
            <button
              type="button"
              className="button is-filled"
              disabled={lines.length === 0}
              onClick={() => {
                app.goBackTo(then, `Back to the version until ${clockText(Number(shown.id))}`);
                close();
              }}
            >
              Go back to it
            </button>
          </div>
        </>
      )}
    </SheetDialog>
  );
}

function Differences({ lines }: { lines: readonly DifferenceLine[] }) {
  if (lines.length === 0) return <p className="quiet">The same as now.</p>;
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a scrolled region must take the arrow keys
    <section className="differences" tabIndex={0} aria-label="What differs from now">
      <table>
        <thead>
          <tr>
            <th scope="col">Where</th>
            <th scope="col">Then</th>
            <th scope="col">Now</th>
          </tr>
        </thead>
        <tbody>
          {lines.slice(0, mostLines).map(({ path, before, after }) => (
            <tr key={path}>
              <th scope="row">{path}</th>
              <td>{before}</td>
              <td>{after}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {lines.length > mostLines && <p className="note">and {lines.length - mostLines} more</p>}
    </section>
  );
}
