// Outdoor air of a room on the design day, as a conductance.
import type { Building, Room, Scheduled } from '../building/index.ts';
import { designInfiltrationM3PerH, designVentilationWPerK } from '../physics/index.ts';

/** Wind shield for more than one exposed face, moderate shelter. Source: EN 12831:2003, Table D.8 (from memory). */
export const shieldFactor = 0.03;
export const heightFactor = 1;

export interface AirScene {
  readonly building: Building;
  readonly leastAirChangesPerH: number;
  /** Mean over the coldest day of a scheduled value. */
  readonly onColdestDay: (value: Scheduled) => number;
}

/** Leaks and least air, whichever is more, and what fans bring in beside, less heat recovery. */
export function ventilationWPerK(scene: AirScene, room: Room): number {
  const { leakage, infiltration, ventilation, volumeM3 } = room;
  const scheduleShare = (schedule: string | undefined) =>
    schedule === undefined ? 1 : scene.onColdestDay({ schedule });
  const leaksM3PerH =
    infiltration.airChangesPerH * volumeM3 * scheduleShare(infiltration.schedule) +
    (leakage ? designInfiltrationM3PerH(volumeM3, leakage.n50PerH, shieldFactor, heightFactor) : 0);
  const fans = ventilation.filter((one) => one.control === undefined);
  const fansM3PerH = fans.reduce(
    (sum, one) => sum + one.flowM3PerS * 3600 * scheduleShare(one.schedule),
    0,
  );
  const fansLosingM3PerH = fans.reduce(
    (sum, one) =>
      sum + one.flowM3PerS * 3600 * scheduleShare(one.schedule) * (1 - one.heatRecovery),
    0,
  );
  const units = scene.building.airUnits.reduce(
    (sum, unit) => {
      const supply = unit.supply.find((one) => one.room === room.id);
      const flow = (supply?.flowM3PerS ?? 0) * 3600 * scheduleShare(unit.schedule);
      return { whole: sum.whole + flow, losing: sum.losing + flow * (1 - unit.heatRecovery) };
    },
    { whole: 0, losing: 0 },
  );
  const leastM3PerH = Math.max(0, scene.leastAirChangesPerH * volumeM3 - fansM3PerH - units.whole);
  return (
    designVentilationWPerK(leaksM3PerH, leastM3PerH) +
    designVentilationWPerK(fansLosingM3PerH + units.losing, 0)
  );
}
