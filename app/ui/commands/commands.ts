import type { UnitSystem } from '../format/index.ts';
import { type AppState, asksForSite, type Scheme, type Screen } from '../state/index.ts';
import type { Command } from './command.ts';
import { documentCommands, editCommands } from './document-commands.ts';

const always = () => true;
const hasProject = (state: AppState) => state.project !== null;
const hasResult = (state: AppState) => state.simulation !== null;
const isRunning = (state: AppState) => state.run.kind === 'running';

const scheme = (name: Scheme, label: string): Command => ({
  id: `scheme-${name}`,
  label,
  menu: 'View',
  keys: '',
  isOn: (state) => state.scheme === name,
  isEnabled: always,
  run: (app) => app.set({ scheme: name }),
});

const units = (system: UnitSystem, label: string): Command => ({
  id: `units-${system}`,
  label,
  menu: 'View',
  keys: '',
  isOn: (state) => state.units === system,
  isEnabled: always,
  run: (app) => app.set({ units: system }),
});

const show = (screen: Screen, label: string, keys: string): Command => ({
  id: `show-${screen}`,
  label,
  menu: 'View',
  keys,
  isOn: (state) => state.screen === screen,
  isEnabled: hasProject,
  run: (app) => app.go(screen),
});

export const commands: readonly Command[] = [
  ...documentCommands,
  {
    id: 'open-demo',
    label: 'Open the example house',
    menu: 'File',
    keys: '',
    isEnabled: always,
    run: (app) => void app.openDemo(),
  },
  {
    id: 'open-project',
    label: 'Open a project…',
    menu: 'File',
    keys: 'Ctrl+O',
    isEnabled: always,
    run: (app) => void app.openProject(),
  },
  {
    id: 'open-weather',
    label: 'Read a weather table…',
    menu: 'File',
    keys: 'Ctrl+I',
    isEnabled: always,
    run: (app) => void app.openWeather(),
  },
  {
    id: 'give-site',
    label: 'Give the site of the table…',
    menu: 'File',
    keys: '',
    isEnabled: asksForSite,
    run: (app) => app.set({ dialog: 'site' }),
  },
  {
    id: 'close-project',
    label: 'Close the project',
    menu: 'File',
    keys: '',
    isEnabled: hasProject,
    run: (app) => app.closeProject(),
  },
  ...editCommands,
  {
    id: 'show-site',
    label: 'Site and weather',
    menu: 'View',
    keys: 'Alt+1',
    isOn: (state) => state.screen === 'site',
    isEnabled: (state) => hasProject(state) || state.weather !== null,
    run: (app) => app.go('site'),
  },
  {
    id: 'show-house',
    label: 'Whole house',
    menu: 'View',
    keys: 'Alt+2',
    isOn: (state) => state.screen === 'house',
    isEnabled: hasProject,
    run: (app) => app.go('house'),
  },
  {
    id: 'show-room',
    label: 'Room by room',
    menu: 'View',
    keys: 'Alt+3',
    isOn: (state) => state.screen === 'room',
    isEnabled: hasResult,
    run: (app) => app.go('room'),
  },
  show('plan', 'Plan', 'Alt+4'),
  show('rooms', 'Rooms', 'Alt+5'),
  show('fabric', 'Fabric', 'Alt+6'),
  show('use', 'Use', 'Alt+7'),
  show('plant', 'Plant', 'Alt+8'),
  show('methods', 'Methods', 'Alt+9'),
  {
    id: 'show-findings',
    label: 'Findings beside the sheet',
    menu: 'View',
    keys: 'Alt+F',
    isOn: (state) => state.isDrawerOpen,
    isEnabled: hasResult,
    run: (app) => app.set({ isDrawerOpen: !app.store.getState().isDrawerOpen }),
  },
  scheme('system', 'Colours as the system'),
  scheme('light', 'Light'),
  scheme('dark', 'Dark'),
  units('SI', 'SI units'),
  units('IP', 'Inch-pound units in fields'),
  {
    id: 'run-year',
    label: 'Run the year',
    menu: 'Run',
    keys: 'F9',
    isEnabled: (state) => hasProject(state) && !isRunning(state),
    run: (app) => void app.runYear(),
  },
  {
    id: 'cancel-run',
    label: 'Cancel the run',
    menu: 'Run',
    keys: 'Alt+C',
    isEnabled: isRunning,
    run: (app) => app.cancel(),
  },
  {
    id: 'take-as-base',
    label: 'Set the findings against the house as it is now',
    menu: 'Run',
    keys: '',
    isEnabled: hasResult,
    run: (app) => app.takeAsBase(),
  },
  {
    id: 'find',
    label: 'Find or do…',
    menu: 'Help',
    keys: 'Ctrl+K',
    isEnabled: always,
    run: (app) => app.set({ dialog: 'commands' }),
  },
  {
    id: 'shortcuts',
    label: 'Shortcuts',
    menu: 'Help',
    keys: '?',
    isEnabled: always,
    run: (app) => app.set({ dialog: 'shortcuts' }),
  },
  {
    id: 'about',
    label: 'About and cautions',
    menu: 'Help',
    keys: '',
    isEnabled: always,
    run: (app) => app.set({ dialog: 'about' }),
  },
];
