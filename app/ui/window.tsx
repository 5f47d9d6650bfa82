// The window: title bar, side bar, sheet, findings, status bar; keys and dropped files for all of it.

import { useEffect } from 'react';
import { commands, isPressed, mayActWhileTyping } from './commands/index.ts';
import { sortFiles } from './desk/index.ts';
import { AboutDialog } from './parts/about-dialog.tsx';
import { CommandField } from './parts/command-field.tsx';
import { AnswerStrip, FindingsColumn } from './parts/findings-column.tsx';
import { GuardDialog } from './parts/guard-dialog.tsx';
import { SaveAsDialog } from './parts/save-as-dialog.tsx';
import { ShortcutList } from './parts/shortcut-list.tsx';
import { SideBar } from './parts/side-bar.tsx';
import { SiteDialog } from './parts/site-dialog.tsx';
import { StatusBar } from './parts/status-bar.tsx';
import { StepsDialog } from './parts/steps-dialog.tsx';
import { TitleBar } from './parts/title-bar.tsx';
import { VersionsDialog } from './parts/versions-dialog.tsx';
import { Sheet } from './screens/sheet.tsx';
import { type App, AppContext, type Scheme, useAppState } from './state/index.ts';

export function Window({ app }: { app: App }) {
  return (
    <AppContext value={app}>
      <Frame app={app} />
    </AppContext>
  );
}

/** Puts the chosen colours in force, and follows the system where that is what was chosen. */
function useScheme(scheme: Scheme) {
  useEffect(() => {
    const dark = matchMedia('(prefers-color-scheme: dark)');
    const apply = () => {
      const isDark = scheme === 'dark' || (scheme === 'system' && dark.matches);
      document.documentElement.dataset.scheme = isDark ? 'dark' : 'light';
    };
    apply();
    dark.addEventListener('change', apply);
    return () => dark.removeEventListener('change', apply);
  }, [scheme]);
}

function moveToRegion(step: number) {
  const regions = [...document.querySelectorAll<HTMLElement>('[data-region]')].filter(
    (region) => region.offsetParent !== null,
  );
  const at = regions.findIndex((region) => region.contains(document.activeElement));
  regions[(at + step + regions.length) % regions.length]?.focus();
}

function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.matches('input, textarea, select');
}

function useKeys(app: App) {
  useEffect(() => {
    function press(event: KeyboardEvent) {
      const state = app.store.getState();
      if (event.key === 'F6') {
        event.preventDefault();
        return moveToRegion(event.shiftKey ? -1 : 1);
      }
      if (event.key === 'Escape' && state.isDrawerOpen) return app.set({ isDrawerOpen: false });
      if (state.dialog || state.guarded) return;
      const command = commands.find(
        ({ keys, isEnabled }) => isPressed(keys, event) && isEnabled(state),
      );
      if (!command || (isTyping(event.target) && !mayActWhileTyping(command.keys))) return;
      event.preventDefault();
      command.run(app);
    }
    document.addEventListener('keydown', press);
    return () => document.removeEventListener('keydown', press);
  }, [app]);
}

/** A project or a weather table may be dropped anywhere. */
function useDrops(app: App) {
  useEffect(() => {
    const allow = (event: DragEvent) => event.preventDefault();
    async function drop(event: DragEvent) {
      event.preventDefault();
      app.take(await sortFiles([...(event.dataTransfer?.files ?? [])]));
    }
    const hear = (event: DragEvent) => void drop(event);
    document.addEventListener('dragover', allow);
    document.addEventListener('drop', hear);
    return () => {
      document.removeEventListener('dragover', allow);
      document.removeEventListener('drop', hear);
    };
  }, [app]);
}

function Frame({ app }: { app: App }) {
  const scheme = useAppState((state) => state.scheme);
  const dialog = useAppState((state) => state.dialog);
  const simulation = useAppState((state) => state.simulation);
  const screen = useAppState((state) => state.screen);
  const isGuarded = useAppState((state) => state.guarded !== null);
  useScheme(scheme);
  useKeys(app);
  useDrops(app);
  const hasFindings = simulation !== null && screen !== 'welcome';

  return (
    <div className={hasFindings ? 'window' : 'window is-wide'}>
      <TitleBar />
      <SideBar />
      <main className="sheet" tabIndex={-1} data-region="sheet">
        {hasFindings && <AnswerStrip simulation={simulation} />}
        <Sheet />
      </main>
      {hasFindings && <FindingsColumn simulation={simulation} />}
      <StatusBar />
      {dialog === 'commands' && <CommandField />}
      {dialog === 'shortcuts' && <ShortcutList />}
      {dialog === 'site' && <SiteDialog />}
      {dialog === 'save-as' && <SaveAsDialog />}
      {dialog === 'steps' && <StepsDialog />}
      {dialog === 'versions' && <VersionsDialog />}
      {dialog === 'about' && <AboutDialog />}
      {isGuarded && <GuardDialog />}
    </div>
  );
}
