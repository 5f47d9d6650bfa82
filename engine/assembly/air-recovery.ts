// Ventilation with heat recovery, bypass and frost limit: what it leaves of the difference to outdoors.
import type { AirUnit, Building, Room } from '../building/index.ts';
import { bypassedEffectiveness, frostLimitedEffectiveness } from '../physics/index.ts';
import { feelsRoom, openShare } from './air-control.ts';
import type { AirSite } from './air-site.ts';
import { scheduleValues } from './schedule-values.ts';

type Ventilation = Room['ventilation'][number];
type Recovery = Pick<AirUnit, 'heatRecovery' | 'bypassAboveSupplyC' | 'leastExhaustC'>;

/**
 * Effectiveness in use: the frost limit, then the bypass, where they are given.
 *
 * @param extractC air that the unit takes out of the rooms
 * @param supplyPerExtract flow of the supply over that of the extract
 */
export function effectivenessInUse(
  unit: Recovery,
  extractC: number,
  outdoorC: number,
  supplyPerExtract: number,
): number {
  let share = unit.heatRecovery;
  if (unit.leastExhaustC !== undefined)
    share = frostLimitedEffectiveness(
      share,
      extractC,
      outdoorC,
      unit.leastExhaustC,
      supplyPerExtract,
    );
  if (unit.bypassAboveSupplyC !== undefined)
    share = bypassedEffectiveness(share, extractC, outdoorC, unit.bypassAboveSupplyC);
  return share;
}

/** Air that a ventilation takes out at schedule value 1 [m³/s]. */
export function extractOf(one: Ventilation): number {
  return one.extractM3PerS ?? one.flowM3PerS;
}

/** Whether its share of the flow or of recovery follows the room's temperature. */
export function ventilationFeelsRoom(one: Ventilation): boolean {
  return (
    feelsRoom(one.control) ||
    (one.heatRecovery > 0 &&
      (one.bypassAboveSupplyC !== undefined || one.leastExhaustC !== undefined))
  );
}

/** Share of the full flow in each step, by the schedule and the limits of the weather alone. */
export function flowShare(
  building: Building,
  one: Pick<Ventilation, 'schedule' | 'control'>,
  site: AirSite,
): Float64Array {
  const { clock } = site;
  const values =
    one.schedule === undefined
      ? new Float64Array(clock.count).fill(1)
      : scheduleValues(building, one.schedule, clock).slice();
  if (one.control && !feelsRoom(one.control)) {
    const share = openShare(building, one.control, site);
    for (let k = 0; k < values.length; k++) values[k] *= share(k, 0, site.outdoorC[k]);
  }
  return values;
}
