export { bridgeDesk, weatherNamed } from './bridge-desk.ts';
export { browserDesk, sortFiles } from './browser-desk.ts';
export type {
  Desk,
  DeskFiles,
  Draft,
  DraftNote,
  OpenedDraft,
  OpenedFile,
  OpenedProject,
  RecentProject,
  SaveAnswer,
} from './desk.ts';
