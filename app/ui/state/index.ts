export { type App, createApp } from './app.ts';
export type {
  Answered,
  AppState,
  Base,
  Dialog,
  FigureKey,
  Guarded,
  HourMark,
  OpenDocument,
  RunState,
  Scheme,
  Screen,
} from './app-state.ts';
export { asksForSite, isDirty } from './app-state.ts';
export type { RunInput, RunOutcome, RunYear, Watch } from './runs.ts';
export {
  AppContext,
  type RoomResult,
  roomResult,
  useApp,
  useAppState,
  useCalendar,
} from './use-app.ts';
export {
  type EditedProject,
  explainedOf,
  type ReadProject,
  readProject,
  useEditedProject,
  useProject,
} from './use-project.ts';
