// When blinds and night insulation are drawn: a share of the glass for every step, from the weather,
// schedules and, with the temperatures of an earlier pass, from the room.
import type { Building, CoveringControl } from '../building/index.ts';
import type { Outdoors } from './outdoors.ts';
import { scheduleValues } from './schedule-values.ts';
import type { FaceSun } from './shading.ts';
import type { StepClock } from './step-clock.ts';

/** Shares are kept in steps, so that the light of like states is followed once; finer by temperature. */
const grain = 20;
const grainByRoom = 100;

/** What one covering's control gives. */
export interface Drawn {
  /** 0 to 1 in each step. */
  readonly share: Float64Array;
  /** The same before the room's temperature is asked, mean of each hour; null where it is not. */
  readonly allowedHours: Float64Array | null;
}

/**
 * Share that is drawn in each step. All conditions hold together (they multiply); the sun's has
 * hysteresis from step to step.
 *
 * @param byRoom share that the room's temperature asks for in each hour, from an earlier pass; without
 *   it a covering that asks for the room's temperature stays up
 */
export function drawnShare(
  building: Building,
  control: CoveringControl,
  sun: FaceSun,
  outside: Outdoors,
  clock: StepClock,
  byRoom: Float64Array | undefined,
): Drawn {
  const { sunAboveWPerM2: above, outdoorAboveC, roomAboveC, atNight } = control;
  const below = control.sunBelowWPerM2 ?? above;
  const planned =
    control.schedule === undefined ? null : scheduleValues(building, control.schedule, clock);
  const perHour = 3600 / clock.stepS;
  const share = new Float64Array(clock.count);
  const allowed = roomAboveC === undefined ? null : new Float64Array(clock.count / perHour);
  const steps = allowed ? grainByRoom : grain;
  let held = false;
  for (let k = 0; k < clock.count; k++) {
    let s = planned ? Math.min(1, Math.max(0, planned[k])) : 1;
    if (above !== undefined && below !== undefined) {
      const now = sun.beamWPerM2[k] + sun.diffuseWPerM2[k];
      held = held ? now >= below && now > 0 : now > above;
      if (!held) s = 0;
    }
    if (outdoorAboveC !== undefined && outside.airC[k] <= outdoorAboveC) s = 0;
    if (atNight && outside.sun.sunlitShare[k] > 0.5) s = 0;
    const hour = Math.floor(k / perHour);
    if (allowed) {
      allowed[hour] += s / perHour;
      s *= byRoom ? byRoom[hour] : 0;
    }
    share[k] = Math.round(s * steps) / steps;
  }
  return { share, allowedHours: allowed };
}
