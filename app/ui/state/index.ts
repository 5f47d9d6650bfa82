export {
  type App,
  createApp,
  type RunInput,
  type RunOutcome,
  type RunYear,
  type Watch,
} from './app.ts';
export type {
  AppState,
  Dialog,
  FigureKey,
  HourMark,
  RunState,
  Scheme,
  Screen,
} from './app-state.ts';
export { asksForSite } from './app-state.ts';
export {
  AppContext,
  type RoomResult,
  roomResult,
  useApp,
  useAppState,
  useCalendar,
} from './use-app.ts';
