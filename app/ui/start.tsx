// Puts the window on the page. The entry brings the desk and the way to run a year.

import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import type { Desk } from './desk/index.ts';
import { createApp, type RunYear } from './state/index.ts';
import { Window } from './window.tsx';
import './look/index.css';

const schemeKey = 'inglenook-scheme';

function savedScheme() {
  const saved = localStorage.getItem(schemeKey);
  return saved === 'light' || saved === 'dark' ? saved : 'system';
}

export function startWindow(desk: Desk, runYear: RunYear) {
  const place = document.getElementById('window');
  if (!place) throw new Error('The page has no place for the window.');
  const app = createApp(desk, runYear, { scheme: savedScheme() });
  app.store.subscribe((now, before) => {
    if (now.scheme !== before.scheme) localStorage.setItem(schemeKey, now.scheme);
  });
  const readRecent = () =>
    void desk.recent().then(
      (recent) => app.set({ recent }),
      () => app.set({ notice: 'The list of recent projects could not be read.' }),
    );
  readRecent();
  app.store.subscribe((now, before) => {
    if (now.project !== before.project) readRecent();
  });
  createRoot(place).render(
    <StrictMode>
      <Window app={app} />
    </StrictMode>,
  );
  return app;
}
