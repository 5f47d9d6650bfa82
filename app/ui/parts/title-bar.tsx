import { useApp, useAppState } from '../state/index.ts';
import { MenuBar } from './menu-bar.tsx';

export function TitleBar() {
  const app = useApp();
  const project = useAppState((state) => state.project);
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
