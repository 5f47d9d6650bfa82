import { clockText } from '../format/index.ts';
import { isDirty, useApp, useAppState } from '../state/index.ts';
import { MenuBar } from './menu-bar.tsx';

export function TitleBar() {
  const app = useApp();
  const project = useAppState((state) => state.project);
  const isUnsaved = useAppState(isDirty);
  const document = useAppState((state) => state.document);
  const others = useAppState((state) => state.others);
  const isChanged = useAppState((state) => state.isChangedOnDisk);
  const name = useAppState((state) => state.simulation?.findings.project);
  return (
    <header className="bar">
      <b>Inglenook</b>
      <MenuBar />
      <span className="document">
        {project ? (
          <>
            <strong>{name ?? project.file}</strong>
            {name && <span className="document-file">{project.file}</span>}
            <span
              className={others > 0 || isChanged ? 'document-state is-warning' : 'document-state'}
            >
              {isChanged
                ? 'changed on disk by another program'
                : others > 0
                  ? 'open in another window too'
                  : isUnsaved
                    ? 'not saved'
                    : document?.savedAt
                      ? `saved ${clockText(document.savedAt).split(', ')[1]}`
                      : ''}
            </span>
          </>
        ) : (
          'No project open'
        )}
      </span>
      <button type="button" className="find" onClick={() => app.set({ dialog: 'commands' })}>
        <span>Find or do…</span>
        <kbd>Ctrl K</kbd>
      </button>
    </header>
  );
}
