import { type AppState, isDirty } from '../state/index.ts';
import type { Command } from './command.ts';

const always = () => true;
const hasDocument = (state: AppState) => state.document !== null;
const lowerFirst = (name: string) => name.charAt(0).toLowerCase() + name.slice(1);

/** Undone is the step that led to the present document; redone the one after it. */
const stepBack = ({ document }: AppState) =>
  document && document.story.past.length > 0 ? document.story.now.name : null;
const stepOn = ({ document }: AppState) => document?.story.future[0]?.name ?? null;
const withStep = (verb: string, name: string | null) =>
  name === null ? verb : `${verb}: ${lowerFirst(name)}`;

export const documentCommands: readonly Command[] = [
  {
    id: 'new-project',
    label: 'New house, one room',
    menu: 'File',
    keys: 'Alt+N',
    isEnabled: always,
    run: (app) => app.newProject(),
  },
  {
    id: 'save',
    label: 'Save',
    menu: 'File',
    keys: 'Ctrl+S',
    isEnabled: (state) => hasDocument(state) && (isDirty(state) || state.document?.path === null),
    run: (app) => void app.save(),
  },
  {
    id: 'save-as',
    label: 'Save as…',
    menu: 'File',
    keys: 'Ctrl+Shift+S',
    isEnabled: hasDocument,
    run: (app) => {
      if (app.files?.hasDialogs) void app.saveTo(null, app.store.getState().project?.file ?? '');
      else app.set({ dialog: 'save-as' });
    },
  },
  {
    id: 'versions',
    label: 'Earlier versions…',
    menu: 'File',
    keys: '',
    isEnabled: ({ document }) => document !== null && document.path !== null,
    run: (app) => app.set({ dialog: 'versions' }),
  },
];

export const editCommands: readonly Command[] = [
  {
    id: 'undo',
    label: 'Undo',
    labelNow: (state) => withStep('Undo', stepBack(state)),
    menu: 'Edit',
    keys: 'Ctrl+Z',
    isEnabled: (state) => stepBack(state) !== null,
    run: (app) => app.undo(),
  },
  {
    id: 'redo',
    label: 'Redo',
    labelNow: (state) => withStep('Redo', stepOn(state)),
    menu: 'Edit',
    keys: 'Ctrl+Y',
    isEnabled: (state) => stepOn(state) !== null,
    run: (app) => app.redo(),
  },
  {
    id: 'redo-too',
    label: 'Redo, the other key',
    menu: 'Edit',
    keys: 'Ctrl+Shift+Z',
    isEnabled: (state) => stepOn(state) !== null,
    run: (app) => app.redo(),
  },
  {
    id: 'steps',
    label: 'Steps so far…',
    menu: 'Edit',
    keys: 'Ctrl+H',
    isEnabled: hasDocument,
    run: (app) => app.set({ dialog: 'steps' }),
  },
];
