// How components reach the store.

import { createContext, useContext, useMemo } from 'react';
import { useStore } from 'zustand';
import { type Calendar, makeCalendar } from '../format/index.ts';
import type { RoomSeries, RoomTotals, Simulation } from '../simulation.ts';
import type { App } from './app.ts';
import type { AppState } from './app-state.ts';

export const AppContext = createContext<App | null>(null);

export function useApp(): App {
  const app = useContext(AppContext);
  if (!app) throw new Error('A component was drawn outside the window.');
  return app;
}

export function useAppState<T>(select: (state: AppState) => T): T {
  return useStore(useApp().store, select);
}

export function useCalendar(simulation: Simulation | null): Calendar {
  const hours = simulation?.hours ?? 8760;
  const year = simulation?.year;
  return useMemo(() => makeCalendar(hours, year), [hours, year]);
}

/** A room's hours together with its totals. */
export interface RoomResult {
  readonly series: RoomSeries;
  readonly totals: RoomTotals;
}

export function roomResult(simulation: Simulation, roomId: string | null): RoomResult | null {
  const series = simulation.rooms.find((room) => room.id === roomId);
  const totals = simulation.findings.rooms.find((room) => room.id === roomId);
  return series && totals ? { series, totals } : null;
}
