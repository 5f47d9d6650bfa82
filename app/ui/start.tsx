// Puts the window on the page. The entry brings the desk and the way to run a year.

import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import type { Desk } from './desk/index.ts';
import { type App, createApp, isDirty, type RunYear } from './state/index.ts';
import { Window } from './window.tsx';
import './look/index.css';

const schemeKey = 'inglenook-scheme';

function savedScheme() {
  const saved = localStorage.getItem(schemeKey);
  return saved === 'light' || saved === 'dark' ? saved : 'system';
}

const unitsKey = 'inglenook-units';

export function startWindow(desk: Desk, runYear: RunYear) {
  const place = document.getElementById('window');
  if (!place) throw new Error('The page has no place for the window.');
  const app = createApp(desk, runYear, {
    scheme: savedScheme(),
    units: localStorage.getItem(unitsKey) === 'IP' ? 'IP' : 'SI',
  });
  app.store.subscribe((now, before) => {
    if (now.scheme !== before.scheme) localStorage.setItem(schemeKey, now.scheme);
    if (now.units !== before.units) localStorage.setItem(unitsKey, now.units);
  });
  const readRecent = () =>
    void desk.recent().then(
      (recent) => app.set({ recent }),
      () => app.set({ notice: 'The list of recent projects could not be read.' }),
    );
  readRecent();
  keepWatch(app);
  app.store.subscribe((now, before) => {
    if (now.project?.file !== before.project?.file) readRecent();
  });
  createRoot(place).render(
    <StrictMode>
      <Window app={app} />
    </StrictMode>,
  );
  return app;
}

const everyMs = 4000;

/** Tells the host what is open here, and hears of other windows and programs on the same file. */
function keepWatch(app: App) {
  const { files, store } = app;
  window.addEventListener('beforeunload', (event) => {
    if (isDirty(store.getState())) event.preventDefault();
  });
  if (!files) return;
  const look = async () => {
    const { document } = store.getState();
    try {
      const seen = await files.watch(document?.path ?? null);
      const now = store.getState().document;
      if (now?.path !== (document?.path ?? null) && now) return;
      const isChanged =
        now !== null && now.path !== null && now.sha256 !== null && seen.sha256 !== now.sha256;
      if (store.getState().others !== seen.others) app.set({ others: seen.others });
      if (store.getState().isChangedOnDisk !== isChanged) app.set({ isChangedOnDisk: isChanged });
    } catch {
      // the host is gone: saving will say so
    }
  };
  const readDrafts = () =>
    void files.drafts().then(
      (drafts) => app.set({ drafts }),
      () => {},
    );
  void look().then(readDrafts);
  setInterval(() => void look(), everyMs);
  store.subscribe((now, before) => {
    if (now.document?.path !== before.document?.path) void look();
  });
}
